import { LiveAnnouncer } from '@angular/cdk/a11y';
import { CdkDrag, CdkDropList, CdkDropListGroup, type CdkDragDrop } from '@angular/cdk/drag-drop';
import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  effect,
  ElementRef,
  inject,
  Injector,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { LEAD_STAGE_NAMES } from '@bookmatch/common/leads/lead-stages';
import { BOARD_CLOSED_DAYS, type LeadStage } from '@bookmatch/common/leads/leads-contract';
import { Store } from '@ngrx/store';
import { injectListAddress } from '../../platform/lists/list-address';
import { injectCan } from '../../platform/session/ability';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { LeadCard } from '../lead-card/lead-card';
import { LeadMoves } from '../lead-moves';
import { LeadFilters } from '../lead-views/lead-filters';
import { LeadViews } from '../lead-views/lead-views';
import { movesFrom, neighborStage } from '../stage-moves';
import { LeadsPage } from '../state/leads.actions';
import { selectLeadBoard, type LeadCardRow } from '../state/leads.selectors';
import { cardBeside, type CardStep } from './card-walk';

/** Leads by stage. Cards are dragged, moved by their menu, or pushed with Shift and the arrow keys. */
@Component({
  selector: 'bm-lead-board',
  imports: [
    CdkDrag,
    CdkDropList,
    CdkDropListGroup,
    EmptyState,
    LeadCard,
    LeadFilters,
    LeadViews,
    MatButton,
    MatIcon,
    MoneyPipe,
    PageHead,
    ProblemNote,
    RouterLink,
    Skeleton,
  ],
  templateUrl: './lead-board.html',
  styleUrl: './lead-board.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(keydown)': 'walk($event)' },
})
export class LeadBoard {
  private readonly store = inject(Store);
  private readonly moves = inject(LeadMoves);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly injector = inject(Injector);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  protected readonly can = injectCan();
  protected readonly address = injectListAddress('nextStep', 'source');
  protected readonly board = this.store.selectSignal(selectLeadBoard);

  protected readonly stageNames = LEAD_STAGE_NAMES;
  protected readonly closedDays = BOARD_CLOSED_DAYS;
  /** The column a phone shows. */
  protected readonly shown = signal<LeadStage>('new');
  /** A finger that rests takes the card up; one that moves scrolls. */
  protected readonly takeUpAfter = { touch: 300, mouse: 0 };
  protected readonly skeletonColumns = [
    [40, 90, 75, 85],
    [55, 80, 90],
    [45, 85, 70],
    [60, 90],
    [35, 80],
  ];

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    this.store.dispatch(LeadsPage.boardOpened({ query: this.address.query() }));
  }

  protected readonly mayEnter = ({ data }: CdkDrag<LeadCardRow>, { data: stage }: CdkDropList<LeadStage>) =>
    stage === data.stage || movesFrom(data.stage).some(({ to }) => to === stage);

  protected dropped({ item, container }: CdkDragDrop<LeadStage, LeadStage, LeadCardRow>): void {
    if (container.data !== item.data.stage) this.move(item.data, container.data);
  }

  protected move(lead: LeadCardRow, to: LeadStage): void {
    this.moves.move(lead, to);
    // Won and lost ask first and tell by themselves.
    if (to === 'won' || to === 'lost') return;
    void this.announcer.announce(`${lead.title} moved to ${LEAD_STAGE_NAMES[to]}`);
    this.focusCard(lead.id);
  }

  /** Arrows walk from card to card; with Shift they push the card itself one stage on or back. */
  protected walk(event: KeyboardEvent): void {
    const [, id] = /^lead-(.+)$/.exec((event.target as HTMLElement).id) ?? [];
    const step = STEPS[event.key];
    if (!id || !step) return;
    event.preventDefault();
    if (event.shiftKey) this.push(id, step);
    else this.focusCard(cardBeside(this.board().columns, id, step));
  }

  private push(id: string, step: CardStep): void {
    const lead = this.board()
      .columns.flatMap(({ rows }) => rows)
      .find((row) => row.id === id);
    const to = lead && step.column !== 0 ? neighborStage(lead.stage, step.column) : null;
    if (lead && to && !lead.busy && this.can('update', 'Lead')) this.move(lead, to);
  }

  /** After the board was drawn anew, since a card that moved is another element. */
  private focusCard(id: string | null): void {
    if (id === null) return;
    const focus = () => this.host.querySelector<HTMLElement>(`#lead-${id}`)?.focus();
    afterNextRender(focus, { injector: this.injector });
  }
}

const STEPS: Record<string, CardStep> = {
  ArrowUp: { column: 0, row: -1 },
  ArrowDown: { column: 0, row: 1 },
  ArrowLeft: { column: -1, row: 0 },
  ArrowRight: { column: 1, row: 0 },
};
