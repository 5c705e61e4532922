import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { ROLE_NAMES } from '@bookmatch/common/access/roles';
import type { Invitation } from '@bookmatch/common/shops/members-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { Confirm } from '../../ui/confirm/confirm';
import { Cell } from '../../ui/data-table/cell';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { MembersPage } from '../state/members.actions';
import { membersFeature } from '../state/members.state';

/** The invitations nobody has taken up yet. Not there while there are none. */
@Component({
  selector: 'bm-open-invitations',
  imports: [
    Cell,
    DataTable,
    DateTextPipe,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    StatusChip,
  ],
  templateUrl: './open-invitations.html',
  styles: `
    h2 {
      margin-bottom: 12px;
    }

    .row-menu {
      margin-block: -12px;
      vertical-align: middle;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OpenInvitations {
  private readonly store = inject(Store);
  private readonly confirm = inject(Confirm);
  protected readonly can = injectCan();
  protected readonly invitations = this.store.selectSignal(membersFeature.selectInvitationList);
  protected readonly columns: readonly Column<Invitation>[] = [
    { key: 'email', header: 'Invited', text: ({ email }) => email, width: '30%' },
    { key: 'role', header: 'Role', text: ({ role }) => ROLE_NAMES[role] },
    { key: 'invitedBy', header: 'By', text: ({ invitedBy }) => invitedBy, phone: 'hidden' },
    { key: 'sentAt', header: 'Sent', align: 'end', phone: 'hidden' },
    { key: 'expiresAt', header: 'Works until', align: 'end' },
    { key: 'menu', header: 'Actions', align: 'end', phone: 'side' },
  ];

  protected isOver({ expiresAt }: Invitation): boolean {
    return Date.parse(expiresAt) <= Date.now();
  }

  protected resend({ id }: Invitation): void {
    this.store.dispatch(MembersPage.resendPressed({ id }));
  }

  protected withdraw({ id, email }: Invitation): void {
    const question = {
      title: `Withdraw the invitation of ${email}?`,
      text: 'The link in the letter stops working.',
      action: 'Withdraw',
    };
    this.confirm.ask(question).subscribe((answer) => {
      if (answer) this.store.dispatch(MembersPage.withdrawalConfirmed({ id }));
    });
  }
}
