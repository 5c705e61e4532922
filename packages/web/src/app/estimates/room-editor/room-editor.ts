import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  Injector,
  input,
  viewChild,
  type OnInit,
} from '@angular/core';
import { CdkDrag, CdkDropList, type CdkDragDrop } from '@angular/cdk/drag-drop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { DraftEditor } from '../draft/draft-editor';
import type { RoomForm } from '../draft/draft-form';
import { roomParts } from '../draft/price-rows';
import { LineRow } from '../line-row/line-row';

/** A room of the draft: its name, its lines, what it comes to. Lines are dragged within it and from room to room. */
@Component({
  selector: 'bm-room-editor',
  imports: [
    CdkDrag,
    CdkDropList,
    ErrorOf,
    LineRow,
    MatButton,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    MoneyPipe,
    ReactiveFormsModule,
  ],
  templateUrl: './room-editor.html',
  styleUrl: './room-editor.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RoomEditor implements OnInit {
  readonly room = input.required<RoomForm>();
  /** Counted from 0. */
  readonly at = input.required<number>();
  readonly last = input(false);
  readonly operations = input.required<readonly Operation[]>();

  protected readonly editor = inject(DraftEditor);
  private readonly injector = inject(Injector);
  private readonly name = viewChild.required<ElementRef<HTMLInputElement>>('name');
  protected readonly amountCents = computed(() => roomParts(this.editor.content())[this.at()]?.cents ?? 0);

  ngOnInit(): void {
    if (this.editor.added() !== this.room().controls.id.value) return;
    afterNextRender(() => this.name().nativeElement.select(), { injector: this.injector });
  }

  protected drop({ previousContainer, previousIndex, currentIndex }: CdkDragDrop<RoomForm, RoomForm>): void {
    this.editor.moveLine(previousContainer.data, previousIndex, this.room(), currentIndex);
  }

  /** Past the first or last line, a line goes on into the next room. */
  protected step(line: number, by: -1 | 1): void {
    const room = this.room();
    const to = line + by;
    if (to >= 0 && to < room.controls.lines.length) this.editor.moveLine(room, line, room, to);
    else this.editor.carryLine(this.at(), line, by);
  }
}
