import { inject, Injectable } from '@angular/core';
import type { Punched } from '@bookmatch/common/time/clock-contract';
import { firstValueFrom } from 'rxjs';
import { toProblem } from '../../platform/api/api-problem';
import { TimeApiClient } from '../time-api';
import type { KeptPunch } from './punch';
import { PunchStore } from './punch-store';
import { afterFailure, withRefusal, without, type Waiting } from './settle-punches';

/** What became of the first punch that waits; `punches` are those that wait now. */
export type Sent =
  | { type: 'taken'; answer: Punched; punches: KeptPunch[] }
  | { type: 'refused'; punches: KeptPunch[] }
  | { type: 'waits'; why: Waiting }
  | { type: 'nothing' };

/** Sends what waits, one punch at a time and in order: a refused one holds up the rest until it is settled. */
@Injectable({ providedIn: 'root' })
export class PunchSender {
  private readonly store = inject(PunchStore);
  private readonly api = inject(TimeApiClient);

  /** @param asked a person asked for it, so that a session that ended may be renewed in place */
  next(asked: boolean): Promise<Sent> {
    return this.store.alone(async () => {
      const [first] = await this.store.read();
      return !first || first.refused !== null ? { type: 'nothing' } : this.send(first, asked);
    });
  }

  private async send(punch: KeptPunch, asked: boolean): Promise<Sent> {
    try {
      const answer = await firstValueFrom(this.api.send(punch, asked ? 'renew' : 'fail'));
      return { type: 'taken', answer, punches: await this.store.change(without(punch.order)) };
    } catch (error) {
      const problem = toProblem(error);
      const outcome = afterFailure(problem);
      if (outcome !== 'refused') return { type: 'waits', why: outcome };
      const punches = await this.store.change(withRefusal(punch.order, problem.detail));
      return { type: 'refused', punches };
    }
  }
}
