import { systemStamp } from '../../platform/database/stamp.js';
import type { GlobalScope } from '../../platform/database/scope.js';
import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import type { OutboxHandler } from '../../platform/outbox/outbox.js';
import {
  RESEND_CONFIRMATION,
  SIGN_UP,
  type AccountsService,
  type SignUpRequest,
} from './accounts-service.js';
import { RESET_PASSWORD, type PasswordsService } from './passwords-service.js';

type Parts = { accounts: AccountsService; passwords: PasswordsService; work: UnitOfWork; clock: () => Date };
type ToAddress = { email: string };

/** What anonymous requests left to be done where nobody can time it. */
export function accountsOutbox({ accounts, passwords, work, clock }: Parts): Record<string, OutboxHandler> {
  const inTransaction =
    <Payload>(act: (scope: GlobalScope, payload: Payload) => Promise<void>) =>
    (payload: Payload, { id }: { id: string }) =>
      work.transaction(systemStamp(id, clock()), (scope) => act(scope, payload));
  return {
    [SIGN_UP]: inTransaction<SignUpRequest>((scope, request) => accounts.signUp(scope, request)),
    [RESEND_CONFIRMATION]: inTransaction<ToAddress>((scope, { email }) =>
      accounts.resendConfirmation(scope, email),
    ),
    [RESET_PASSWORD]: inTransaction<ToAddress>((scope, { email }) => passwords.sendReset(scope, email)),
  };
}
