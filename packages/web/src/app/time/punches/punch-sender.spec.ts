import { TestBed } from '@angular/core/testing';
import { of, throwError, type Observable } from 'rxjs';
import type { Punched } from '@bookmatch/common/time/clock-contract';
import { ApiProblem } from '../../platform/api/api-problem';
import { buildClock, buildIn, buildOpenEntry, buildOut } from '../testing/build-punch';
import { TimeApiClient } from '../time-api';
import { memoryPunchBox } from './punch-box';
import { PunchSender } from './punch-sender';
import { PunchStore } from './punch-store';
import type { KeptPunch } from './punch';

const answer: Punched = { entry: buildOpenEntry(), clock: buildClock({ open: buildOpenEntry() }) };
const refusal = (status: number, code: string, detail = 'No.') =>
  throwError(() => new ApiProblem({ type: '', title: '', status, code, detail }));

async function setUp(punches: KeptPunch[], reply: () => Observable<Punched>) {
  const box = memoryPunchBox();
  await box.change('me', () => punches);
  const send = jest.fn(reply);
  const store = {
    read: () => box.read('me'),
    change: (to: Parameters<PunchStore['change']>[0]) => box.change('me', to),
    alone: <Result>(work: () => Promise<Result>) => work(),
  };
  TestBed.configureTestingModule({
    providers: [
      { provide: PunchStore, useValue: store },
      { provide: TimeApiClient, useValue: { send } },
    ],
  });
  return { send, box, next: (asked = false) => TestBed.inject(PunchSender).next(asked) };
}

describe('sending what waits', () => {
  const punches = [buildIn({ order: 1 }), buildOut({ order: 2 })];

  it('sends the first and keeps the rest', async () => {
    const { next, send, box } = await setUp(punches, () => of(answer));
    expect(await next()).toEqual({ type: 'taken', answer, punches: [punches[1]] });
    expect(send.mock.calls).toEqual([[punches[0], 'fail']]);
    expect(await box.read('me')).toEqual([punches[1]]);
  });

  it('lets the session be renewed only when a person asked', async () => {
    const { next, send } = await setUp(punches, () => of(answer));
    await next(true);
    expect(send).toHaveBeenCalledWith(punches[0], 'renew');
  });

  it('keeps a punch that no answer came to, as it was', async () => {
    const { next, box } = await setUp(punches, () => refusal(0, 'no-connection'));
    expect(await next()).toEqual({ type: 'waits', why: 'no-network' });
    expect(await box.read('me')).toEqual(punches);
  });

  it('keeps a refused punch with the reason, and holds the later ones back', async () => {
    const { next, box, send } = await setUp(punches, () => refusal(409, 'conflict', 'This job is closed.'));
    expect(await next()).toMatchObject({ type: 'refused' });
    expect((await box.read('me')).map(({ refused }) => refused)).toEqual(['This job is closed.', null]);
    expect(await next()).toEqual({ type: 'nothing' });
    expect(send).toHaveBeenCalledTimes(1);
  });

  it('does nothing while nothing waits', async () => {
    const { next, send } = await setUp([], () => of(answer));
    expect(await next()).toEqual({ type: 'nothing' });
    expect(send).not.toHaveBeenCalled();
  });
});

describe('the box that punches wait in', () => {
  it('keeps each member’s apart and in their order', async () => {
    const box = memoryPunchBox();
    const [late, early] = [buildOut({ order: 9 }), buildIn({ order: 3 })];
    await box.change('one', () => [late, early]);
    await box.change('two', () => [late]);
    expect((await box.read('one')).map(({ order }) => order)).toEqual([3, 9]);
    expect(await box.read('two')).toHaveLength(1);
    expect(await box.read('nobody')).toEqual([]);
  });
});
