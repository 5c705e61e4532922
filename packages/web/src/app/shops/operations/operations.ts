import {
  CdkDrag,
  CdkDragHandle,
  CdkDropList,
  moveItemInArray,
  type CdkDragDrop,
} from '@angular/cdk/drag-drop';
import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  inject,
  afterNextRender,
  Injector,
} from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { COST_CATEGORY_NAMES } from '@bookmatch/common/estimates/cost-categories';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { Confirm } from '../../ui/confirm/confirm';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { OperationsPage } from '../state/operations.actions';
import { operationsFeature } from '../state/operations.state';
import { OperationDialog } from './operation-dialog';

/** The kinds of work a shop plans and clocks, in the order the work goes through them. */
@Component({
  selector: 'bm-operations',
  imports: [
    CdkDrag,
    CdkDragHandle,
    CdkDropList,
    MatButton,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    MoneyPipe,
    PageHead,
    Panel,
    ProblemNote,
    Skeleton,
  ],
  templateUrl: './operations.html',
  styleUrl: './operations.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Operations {
  private readonly store = inject(Store);
  private readonly dialog = inject(MatDialog);
  private readonly confirm = inject(Confirm);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly injector = inject(Injector);
  protected readonly can = injectCan();
  protected readonly categoryNames = COST_CATEGORY_NAMES;
  protected readonly inUse = this.store.selectSignal(operationsFeature.selectInUse);
  protected readonly archived = this.store.selectSignal(operationsFeature.selectArchived);
  protected readonly loaded = this.store.selectSignal(operationsFeature.selectLoaded);
  protected readonly problem = this.store.selectSignal(operationsFeature.selectProblem);

  constructor() {
    this.load();
  }

  protected load(): void {
    this.store.dispatch(OperationsPage.opened());
  }

  protected open(data: Operation | null): void {
    this.dialog.open(OperationDialog, { data, width: '480px', disableClose: true });
  }

  protected dropped({ previousIndex, currentIndex }: CdkDragDrop<unknown>): void {
    this.move(previousIndex, currentIndex);
  }

  /** Up and Down on the handle carry the operation along; the focus goes with it. */
  protected moveByKey(event: KeyboardEvent, index: number): void {
    const by = { ArrowUp: -1, ArrowDown: 1 }[event.key];
    if (by === undefined) return;
    event.preventDefault();
    if (!this.move(index, index + by)) return;
    afterNextRender(
      () => {
        const handles = this.host.nativeElement.querySelectorAll<HTMLElement>('.handle');
        handles[index + by]?.focus();
      },
      { injector: this.injector },
    );
  }

  protected setArchived(operation: Operation, archived: boolean): void {
    if (!archived) {
      this.store.dispatch(OperationsPage.archiveSet({ operation, archived }));
      return;
    }
    const question = {
      title: `Archive ${operation.name}?`,
      text: 'It takes no new time and stays on every job and report it was used for. You can bring it back.',
      action: 'Archive',
    };
    this.confirm.ask(question).subscribe((answer) => {
      if (answer) this.store.dispatch(OperationsPage.archiveSet({ operation, archived }));
    });
  }

  private move(from: number, to: number): boolean {
    const inUse = this.inUse().map(({ id }) => id);
    if (from === to || to < 0 || to >= inUse.length) return false;
    moveItemInArray(inUse, from, to);
    const operationIds = [...inUse, ...this.archived().map(({ id }) => id)];
    this.store.dispatch(OperationsPage.moved({ operationIds }));
    return true;
  }
}
