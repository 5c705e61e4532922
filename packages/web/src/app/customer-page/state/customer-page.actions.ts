import type {
  AcceptEstimate,
  CustomerDecline,
  CustomerEstimate,
  CustomerPage,
} from '@bookmatch/common/customer-page/customer-page-contract';
import type { Question } from '@bookmatch/common/customer-page/questions-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createActionGroup, props } from '@ngrx/store';

/** What the customer did. */
export const CustomerScreen = createActionGroup({
  source: 'Customer Screen',
  events: {
    opened: props<{ token: string }>(),
    accepted: props<{ token: string; acceptance: AcceptEstimate }>(),
    declined: props<{ token: string; refusal: CustomerDecline }>(),
    asked: props<{ token: string; body: string }>(),
  },
});

/** What the server said. */
export const CustomerPageApi = createActionGroup({
  source: 'Customer Page API',
  events: {
    loaded: props<{ page: CustomerPage }>(),
    loadFailed: props<{ problem: Problem }>(),
    answered: props<{ estimate: CustomerEstimate }>(),
    answerFailed: props<{ problem: Problem }>(),
    questionKept: props<{ question: Question }>(),
    questionFailed: props<{ problem: Problem }>(),
  },
});
