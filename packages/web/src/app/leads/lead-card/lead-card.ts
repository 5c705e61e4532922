import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { LEAD_STAGE_NAMES } from '@bookmatch/common/leads/lead-stages';
import type { LeadStage } from '@bookmatch/common/leads/leads-contract';
import { injectCan } from '../../platform/session/ability';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { LeadMoves } from '../lead-moves';
import { StepDate } from '../next-step/step-date';
import { movesFrom } from '../stage-moves';
import type { LeadCardRow } from '../state/leads.selectors';

/** A lead on the board, with the menu that does what dragging does. */
@Component({
  selector: 'bm-lead-card',
  imports: [MatIcon, MatIconButton, MatMenu, MatMenuItem, MatMenuTrigger, MoneyPipe, RouterLink, StepDate],
  templateUrl: './lead-card.html',
  styleUrl: './lead-card.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[class.busy]': 'lead().busy' },
})
export class LeadCard {
  readonly lead = input.required<LeadCardRow>();
  readonly picked = output<LeadStage>();

  private readonly leadMoves = inject(LeadMoves);
  protected readonly can = injectCan();
  protected readonly moves = computed(() =>
    movesFrom(this.lead().stage).map(({ to }) => ({ to, name: MENU_NAMES[to] })),
  );

  protected reopen(): void {
    this.leadMoves.reopen(this.lead());
  }
}

const MENU_NAMES: Record<LeadStage, string> = {
  ...LEAD_STAGE_NAMES,
  won: 'Won…',
  lost: 'Lost…',
};
