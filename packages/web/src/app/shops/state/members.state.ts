import type { Problem } from '@bookmatch/common/problems/problem';
import type { Invitation, Member } from '@bookmatch/common/shops/members-contract';
import { createEntityAdapter, type EntityState } from '@ngrx/entity';
import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import { MembersApi, MembersPage } from './members.actions';

export type MembersState = {
  members: EntityState<Member>;
  invitations: EntityState<Invitation>;
  loaded: boolean;
  problem: Problem | null;
  /** The one dialog that can be open. */
  dialog: SaveState;
};

export const memberRows = createEntityAdapter<Member>({
  sortComparer: (a, b) => a.joinedAt.localeCompare(b.joinedAt),
});
export const invitationRows = createEntityAdapter<Invitation>({
  sortComparer: (a, b) => a.email.localeCompare(b.email),
});

export const initialMembers: MembersState = {
  members: memberRows.getInitialState(),
  invitations: invitationRows.getInitialState(),
  loaded: false,
  problem: null,
  dialog: notSaved,
};

export const membersFeature = createFeature({
  name: 'members',
  reducer: createReducer(
    initialMembers,
    on(MembersPage.opened, (state): MembersState => ({ ...state, problem: null })),
    on(MembersApi.membersLoaded, (state, { members }): MembersState => ({
      ...state,
      loaded: true,
      members: memberRows.setAll(members, state.members),
    })),
    on(MembersApi.invitationsLoaded, (state, { invitations }): MembersState => ({
      ...state,
      invitations: invitationRows.setAll(invitations, state.invitations),
    })),
    on(MembersApi.loadFailed, (state, { problem }): MembersState => ({ ...state, problem })),
    on(MembersPage.dialogOpened, (state): MembersState => ({ ...state, dialog: notSaved })),
    on(
      MembersPage.roleChosen,
      MembersPage.laborCostSet,
      MembersPage.inviteSubmitted,
      (state): MembersState => ({ ...state, dialog: saving }),
    ),
    on(MembersApi.memberSaved, (state, { member }): MembersState => ({
      ...state,
      members: memberRows.setOne(member, state.members),
      dialog: saved,
    })),
    on(MembersApi.invited, (state, { invitation }): MembersState => ({
      ...state,
      invitations: invitationRows.setOne(invitation, state.invitations),
      dialog: saved,
    })),
    on(MembersApi.resent, (state, { invitation }): MembersState => ({
      ...state,
      invitations: invitationRows.setOne(invitation, state.invitations),
    })),
    on(MembersApi.memberRemoved, (state, { id }): MembersState => ({
      ...state,
      members: memberRows.removeOne(id, state.members),
    })),
    on(MembersApi.withdrawn, (state, { id }): MembersState => ({
      ...state,
      invitations: invitationRows.removeOne(id, state.invitations),
    })),
    on(MembersApi.dialogFailed, (state, { problem }): MembersState => ({
      ...state,
      dialog: saveFailed(problem),
    })),
  ),
  extraSelectors: ({ selectMembers, selectInvitations }) => ({
    selectMemberList: createSelector(selectMembers, memberRows.getSelectors().selectAll),
    selectInvitationList: createSelector(selectInvitations, invitationRows.getSelectors().selectAll),
  }),
});
