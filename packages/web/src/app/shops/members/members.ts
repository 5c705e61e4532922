import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { ROLE_NAMES } from '@bookmatch/common/access/roles';
import type { Member } from '@bookmatch/common/shops/members-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { CurrentShop } from '../../platform/session/current-shop';
import { Confirm } from '../../ui/confirm/confirm';
import { Cell } from '../../ui/data-table/cell';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { MembersPage } from '../state/members.actions';
import { membersFeature } from '../state/members.state';
import { InviteDialog } from './invite-dialog';
import { LaborCostDialog } from './labor-cost-dialog';
import { OpenInvitations } from './open-invitations';
import { RoleDialog } from './role-dialog';

/** Who belongs to the shop, as what, and who is invited. */
@Component({
  selector: 'bm-members',
  imports: [
    Cell,
    DataTable,
    DateTextPipe,
    MatButton,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    MoneyPipe,
    OpenInvitations,
    PageHead,
    StatusChip,
  ],
  templateUrl: './members.html',
  styleUrl: './members.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Members {
  private readonly store = inject(Store);
  private readonly dialog = inject(MatDialog);
  private readonly confirm = inject(Confirm);
  private readonly here = inject(CurrentShop).membership;
  protected readonly can = injectCan();
  protected readonly members = this.store.selectSignal(membersFeature.selectMemberList);
  protected readonly loaded = this.store.selectSignal(membersFeature.selectLoaded);
  protected readonly problem = this.store.selectSignal(membersFeature.selectProblem);
  /** Removing somebody stays open to a lapsed shop: who left must be locked out, paid or not. */
  protected readonly mayRemove = computed(() => this.here()?.role === 'owner');
  protected readonly columns = computed((): Column<Member>[] => [
    { key: 'name', header: 'Name', width: '30%' },
    { key: 'role', header: 'Role', text: ({ role }) => ROLE_NAMES[role], phone: 'line' },
    { key: 'email', header: 'E-mail', text: ({ email }) => email },
    ...(this.can('read', 'Member', 'money')
      ? [{ key: 'cost', header: 'Cost of an hour', align: 'end' as const }]
      : []),
    { key: 'joinedAt', header: 'Since', align: 'end', phone: 'hidden' },
    ...(this.mayRemove()
      ? [{ key: 'menu', header: 'Actions', align: 'end' as const, phone: 'side' as const }]
      : []),
  ]);

  constructor() {
    this.load();
  }

  protected load(): void {
    this.store.dispatch(MembersPage.opened({ withInvitations: this.can('read', 'Invitation') }));
  }

  protected isMe({ id }: Member): boolean {
    return id === this.here()?.memberId;
  }

  protected invite(): void {
    this.dialog.open(InviteDialog, { width: '560px', disableClose: true });
  }

  protected changeRole(data: Member): void {
    this.dialog.open(RoleDialog, { data, width: '560px' });
  }

  protected setCost(data: Member): void {
    this.dialog.open(LaborCostDialog, { data, width: '480px', disableClose: true });
  }

  protected remove(member: Member): void {
    const question = this.isMe(member)
      ? {
          title: 'Leave this shop?',
          text: 'You are out at once and come back only by an invitation.',
          action: 'Leave',
        }
      : {
          title: `Remove ${member.name}?`,
          text: 'They are out at once, wherever they are signed in. Their time and everything they did stays.',
          action: 'Remove',
        };
    this.confirm.ask({ ...question, tone: 'harm' }).subscribe((answer) => {
      if (answer) this.store.dispatch(MembersPage.removalConfirmed({ member }));
    });
  }
}
