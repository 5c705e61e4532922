import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import type { LeadRow, LeadStage } from '@bookmatch/common/leads/leads-contract';
import { Store } from '@ngrx/store';
import { Confirm } from '../ui/confirm/confirm';
import { LeadLoss } from './lead-loss/lead-loss';
import { LeadsPage } from './state/leads.actions';

type MovedLead = Pick<LeadRow, 'id' | 'version' | 'title' | 'stage'>;

/** Takes a lead to another stage: at once, after asking, or with a reason, as the stage demands. */
@Injectable()
export class LeadMoves {
  private readonly store = inject(Store);
  private readonly confirm = inject(Confirm);
  private readonly dialog = inject(MatDialog);

  move(lead: MovedLead, to: LeadStage): void {
    if (to === 'won') this.win(lead);
    else if (to === 'lost') this.dialog.open(LeadLoss, { data: lead, width: '480px', disableClose: true });
    else this.store.dispatch(LeadsPage.stagePicked({ lead, stage: to }));
  }

  reopen(lead: MovedLead): void {
    this.store.dispatch(LeadsPage.reopenPressed({ lead }));
  }

  private win(lead: MovedLead): void {
    const question = {
      title: `Is ${lead.title} won?`,
      text: 'Say so when the work was agreed without an estimate. A lead is won by itself when its customer accepts one. A won lead stays won.',
      action: 'It is won',
    };
    this.confirm.ask(question).subscribe((answer) => {
      if (answer) this.store.dispatch(LeadsPage.winConfirmed({ lead }));
    });
  }
}
