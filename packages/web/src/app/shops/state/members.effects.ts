import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import type { Action } from '@ngrx/store';
import { concatMap, exhaustMap, filter, map, switchMap, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { isStale } from '../../platform/api/problem-kinds';
import { Notices } from '../../platform/page/notices';
import { ShopsApiClient } from '../shops-api';
import { MembersApi, MembersPage } from './members.actions';

export const loadMembers = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(MembersPage.opened),
      switchMap(() =>
        api.members().pipe(
          map(({ rows }) => MembersApi.membersLoaded({ members: rows })),
          catchProblem((problem) => MembersApi.loadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadInvitations = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(MembersPage.opened),
      filter(({ withInvitations }) => withInvitations),
      switchMap(() =>
        api.invitations().pipe(
          map(({ rows }) => MembersApi.invitationsLoaded({ invitations: rows })),
          catchProblem((problem) => MembersApi.loadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const changeRole = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(MembersPage.roleChosen),
      exhaustMap(({ member, role }) =>
        api.changeRole(member, role).pipe(
          map((changed) => MembersApi.memberSaved({ member: changed })),
          catchProblem((problem) => MembersApi.dialogFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const setLaborCost = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(MembersPage.laborCostSet),
      exhaustMap(({ member, laborCostCentsPerHour }) =>
        api.setLaborCost(member, laborCostCentsPerHour).pipe(
          map((changed) => MembersApi.memberSaved({ member: changed })),
          catchProblem((problem) => MembersApi.dialogFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const invite = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(MembersPage.inviteSubmitted),
      exhaustMap(({ invite: invited }) =>
        api.invite(invited).pipe(
          map((invitation) => MembersApi.invited({ invitation })),
          catchProblem((problem) => MembersApi.dialogFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const removeMember = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(MembersPage.removalConfirmed),
      concatMap(({ member }) =>
        api.removeMember(member).pipe(
          map(() => MembersApi.memberRemoved({ id: member.id })),
          catchProblem((problem) => MembersApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const resend = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(MembersPage.resendPressed),
      concatMap(({ id }) =>
        api.resend(id).pipe(
          map((invitation) => MembersApi.resent({ invitation })),
          catchProblem((problem) => MembersApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const withdraw = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(MembersPage.withdrawalConfirmed),
      concatMap(({ id }) =>
        api.withdraw(id).pipe(
          map(() => MembersApi.withdrawn({ id })),
          catchProblem((problem) => MembersApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** Somebody else changed a member meanwhile: the list shows how they stand now. */
export const reloadMembersAfterConflict = createEffect(
  (actions$ = inject(Actions)) =>
    actions$.pipe(
      ofType(MembersApi.dialogFailed, MembersApi.commandFailed),
      filter(({ problem }) => isStale(problem)),
      map(() => MembersPage.opened({ withInvitations: false })),
    ),
  { functional: true },
);

const DONE: Record<string, string> = {
  [MembersApi.memberSaved.type]: 'Member changed.',
  [MembersApi.memberRemoved.type]: 'Member removed.',
  [MembersApi.invited.type]: 'Invitation sent.',
  [MembersApi.resent.type]: 'Invitation sent again.',
  [MembersApi.withdrawn.type]: 'Invitation withdrawn.',
};

export const sayMemberDone = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      map(({ type }: Action) => DONE[type]),
      filter((message) => message !== undefined),
      tap((message) => notices.say(message)),
    ),
  { functional: true, dispatch: false },
);

export const sayMemberProblem = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(MembersApi.commandFailed),
      tap(({ problem }) => notices.problem(problem)),
    ),
  { functional: true, dispatch: false },
);
