import type { Role } from '@bookmatch/common/access/roles';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { Invitation, Invite, Member } from '@bookmatch/common/shops/members-contract';
import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { RowRef } from '../shops-api';

export const MembersPage = createActionGroup({
  source: 'Members Page',
  events: {
    opened: props<{ withInvitations: boolean }>(),
    dialogOpened: emptyProps(),
    roleChosen: props<{ member: RowRef; role: Role }>(),
    laborCostSet: props<{ member: RowRef; laborCostCentsPerHour: number | null }>(),
    removalConfirmed: props<{ member: RowRef }>(),
    inviteSubmitted: props<{ invite: Invite }>(),
    resendPressed: props<{ id: string }>(),
    withdrawalConfirmed: props<{ id: string }>(),
  },
});

export const MembersApi = createActionGroup({
  source: 'Members API',
  events: {
    membersLoaded: props<{ members: Member[] }>(),
    invitationsLoaded: props<{ invitations: Invitation[] }>(),
    loadFailed: props<{ problem: Problem }>(),
    memberSaved: props<{ member: Member }>(),
    memberRemoved: props<{ id: string }>(),
    invited: props<{ invitation: Invitation }>(),
    resent: props<{ invitation: Invitation }>(),
    withdrawn: props<{ id: string }>(),
    /** What was typed in a dialog was refused. */
    dialogFailed: props<{ problem: Problem }>(),
    /** A command without a form of its own was refused. */
    commandFailed: props<{ problem: Problem }>(),
  },
});
