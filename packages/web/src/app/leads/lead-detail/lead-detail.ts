import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import { LEAD_STAGE_NAMES } from '@bookmatch/common/leads/lead-stages';
import { LEAD_SOURCE_NAMES, LOST_REASON_NAMES } from '@bookmatch/common/leads/lead-words';
import { isOpenLead } from '@bookmatch/common/leads/lead-stages';
import { OPEN_LEAD_STAGES, type Lead, type LeadStage } from '@bookmatch/common/leads/leads-contract';
import { Store } from '@ngrx/store';
import { addressLines } from '../../customers/customers-public';
import { injectCan } from '../../platform/session/ability';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { StageTrack } from '../../ui/stage-track/stage-track';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { warnBeforeUnload, type HasUnsavedChanges } from '../../ui/unsaved-changes/unsaved-changes';
import { LeadConversion } from '../lead-conversion/lead-conversion';
import { LeadMoves } from '../lead-moves';
import { NextStepPanel } from '../next-step/next-step-panel';
import { movesFrom, STAGE_TONES } from '../stage-moves';
import { StartEstimateForm } from '../start-estimate/start-estimate';
import { LeadsPage } from '../state/leads.actions';
import { selectLead, selectMoving, selectOpenProblem, selectTimeline } from '../state/leads.selectors';
import { Timeline } from '../timeline/timeline';

@Component({
  selector: 'bm-lead-detail',
  imports: [
    DateTextPipe,
    MatButton,
    MoneyPipe,
    NextStepPanel,
    PageHead,
    Panel,
    ProblemNote,
    RouterLink,
    Skeleton,
    StageTrack,
    StatusChip,
    Timeline,
  ],
  templateUrl: './lead-detail.html',
  styleUrl: './lead-detail.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeadDetail implements HasUnsavedChanges {
  /** From the address. */
  readonly id = input.required<string>();

  private readonly store = inject(Store);
  private readonly dialog = inject(MatDialog);
  protected readonly moves = inject(LeadMoves);
  protected readonly can = injectCan();
  protected readonly addressLines = addressLines;
  protected readonly sourceNames = LEAD_SOURCE_NAMES;
  protected readonly reasonNames = LOST_REASON_NAMES;
  protected readonly stageNames = LEAD_STAGE_NAMES;
  protected readonly stageTones = STAGE_TONES;
  protected readonly stages = [...OPEN_LEAD_STAGES, 'won' as const].map((key) => ({
    key,
    name: LEAD_STAGE_NAMES[key],
  }));

  private readonly selected = computed(() => this.store.selectSignal(selectLead(this.id())));
  protected readonly lead = computed(() => this.selected()());
  private readonly timeline = computed(() => this.store.selectSignal(selectTimeline(this.id())));
  protected readonly entries = computed(() => this.timeline()());
  protected readonly problem = this.store.selectSignal(selectOpenProblem);
  private readonly moving = this.store.selectSignal(selectMoving);
  protected readonly busy = computed(() => this.moving().includes(this.id()));
  protected readonly open = computed(() => isOpenLead(this.lead()?.stage ?? 'new'));
  protected readonly reachable = computed(() => {
    const lead = this.lead();
    if (!lead || this.busy() || !this.open() || !this.can('update', 'Lead')) return [];
    return movesFrom(lead.stage).map(({ to }) => to);
  });
  protected readonly newestEstimate = computed(() => this.lead()?.estimates.at(-1) ?? null);
  private readonly notes = viewChild(Timeline);

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => this.load());
  }

  /** A note that was begun and not added. */
  hasUnsavedChanges(): boolean {
    return this.notes()?.hasUnsavedChanges() ?? false;
  }

  protected load(): void {
    const id = this.id();
    untracked(() => this.store.dispatch(LeadsPage.leadOpened({ id })));
  }

  protected pick(lead: Lead, stage: string): void {
    this.moves.move(lead, stage as LeadStage);
  }

  protected convert(lead: Lead): void {
    this.dialog.open(LeadConversion, { data: lead, width: '640px', disableClose: true });
  }

  protected startEstimate(lead: Lead): void {
    this.dialog.open(StartEstimateForm, { data: lead, width: '480px', disableClose: true });
  }
}
