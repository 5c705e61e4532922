import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import {
  addTimeEntrySchema,
  clockInSchema,
  type CorrectTimeEntry,
} from '@bookmatch/common/time/time-contract';
import type { Person } from '../cast/people.js';
import { OFF_JOB_OPERATION } from '../catalog/operations.js';
import type { WallMinute } from '../calendar/wall-clock.js';
import type { Generator } from '../chance/generator.js';
import type { Shift, Stretch, Task } from '../crew/shift.js';
import type { Slip } from '../crew/slips.js';
import type { SharedAct } from './acts.js';
import type { Desk } from './desk.js';
import type { Trail } from './trail.js';
import type { When } from './when.js';

const NOTES = [
  'Waited for the glue',
  'Blade changed',
  'Second coat',
  'Two doors made again',
  'With the electrician',
];
const MINUTE_MS = 60_000;

/** The punches of one hand, day by day, and what was put right afterwards. */
export class HandAtTheClock {
  readonly acts: SharedAct[] = [];

  /** @param trail keeps the entries' ids; apart from the office's, which is written at the same time */
  constructor(
    private readonly desk: Desk,
    private readonly jobs: Trail,
    private readonly trail: Trail,
    private readonly when: When,
    private readonly who: { person: Person; source: 'phone' | 'desk'; putRightBy: Person },
  ) {}

  /** All of a day, or what of it is over by now; the clock is left stopped. */
  clock(shift: Shift, slip: Slip | null, random: Generator): void {
    const { day } = shift;
    const done = shift.stretches.filter(
      ({ to }) => this.at(day, to).getTime() < this.when.now.getTime() - 60 * MINUTE_MS,
    );
    const first = slip?.kind === 'missed-first' ? 1 : 0;
    done.slice(first).forEach((stretch, index) => {
      const number = index + first;
      const wrong = slip?.kind === 'wrong-operation' && slip.stretch === number;
      const task =
        wrong && stretch.task.kind === 'job' ? { ...stretch.task, operation: slip.punched } : stretch.task;
      const note = random.chance(0.03) && task.kind === 'job' ? random.pick(NOTES) : '';
      this.punch(this.at(day, stretch.from), `${day} ${number}`, task, note);
    });
    const last = done.at(-1);
    if (last && done.length > first && slip?.kind !== 'forgot-out')
      this.stop(this.at(day, last.to), `${day} ${done.length - 1}`);
    if (slip && done.length === shift.stretches.length) this.putRight(shift, slip);
  }

  /** Clocked in and working. */
  startNow(task: Task, minutesAgo: number): void {
    this.punch(new Date(this.when.now.getTime() - minutesAgo * MINUTE_MS), 'now', task, '');
  }

  private punch(at: Date, name: string, task: Task, note: string): void {
    const { person, source } = this.who;
    this.act(at, person, async (scope) => {
      const entryId = scope.newId();
      const work = { kind: task.kind === 'meal' ? 'meal-break' : 'work', ...this.refOf(task) };
      const punch = clockInSchema.parse({ entryId, ...work, at: at.toISOString(), source, note });
      await this.desk.services.clock.punchIn(scope, punch);
      this.trail.keep(this.named(name), entryId);
    });
  }

  private stop(at: Date, name: string): void {
    this.act(at, this.who.person, (scope) =>
      this.desk.services.clock.punchOut(scope, this.idOf(name), { at: at.toISOString() }),
    );
  }

  /** On the next working day. */
  private putRight({ day, stretches }: Shift, slip: Slip): void {
    const last = stretches.length - 1;
    const by = this.who.putRightBy;
    const at = this.when.near(day + 1, 8);
    if (!at) return;
    const correct = (name: string, change: () => CorrectTimeEntry) =>
      this.act(at, by, async (scope) => {
        const { id, version } = await this.desk.services.timeEntries.get(scope, this.idOf(name));
        await this.desk.services.timeEntries.correct(scope, id, change(), version);
      });
    switch (slip.kind) {
      case 'forgot-out': {
        const endedAt = this.at(day, stretches[last]!.to).toISOString();
        return correct(`${day} ${last}`, () => ({ endedAt, reason: 'Forgot to clock out.' }));
      }
      case 'wrong-operation':
        return correct(`${day} ${slip.stretch}`, () => {
          const { operationId } = this.refOf(stretches[slip.stretch]!.task);
          return { operationId, reason: 'Clocked to the wrong operation.' };
        });
      case 'missed-first':
        return this.act(at, by, (scope) => this.add(scope, day, stretches[0]!));
      case 'stray':
        return this.stray(day, stretches[last]!.to, at, by);
    }
  }

  private add(scope: ShopScope, day: number, { from, to, task }: Stretch) {
    const entry = addTimeEntrySchema.parse({
      memberId: this.desk.seatOf(this.who.person).memberId,
      ...{ kind: task.kind === 'meal' ? 'meal-break' : 'work', ...this.refOf(task) },
      startedAt: this.at(day, from).toISOString(),
      endedAt: this.at(day, to).toISOString(),
      reason: 'The tablet was not charged in the morning.',
    });
    return this.desk.services.timeEntries.add(scope, entry);
  }

  private stray(day: number, end: WallMinute, at: Date, by: Person): void {
    const name = `${day} stray`;
    this.punch(this.at(day, end + 3), name, { kind: 'shop' }, '');
    this.stop(this.at(day, end + 5), name);
    this.act(at, by, async (scope) => {
      const { id, version } = await this.desk.services.timeEntries.get(scope, this.idOf(name));
      await this.desk.services.timeEntries.void(scope, id, 'Touched the screen by mistake.', version);
    });
  }

  private named(name: string): string {
    return `${this.who.person.email} ${name}`;
  }

  private idOf(name: string): string {
    return this.trail.id(this.named(name));
  }

  private refOf(task: Task): { jobId: string | null; operationId: string | null } {
    if (task.kind === 'meal') return { jobId: null, operationId: null };
    if (task.kind === 'shop') return { jobId: null, operationId: this.desk.operationId(OFF_JOB_OPERATION) };
    return { jobId: this.jobs.id(task.project), operationId: this.desk.operationId(task.operation) };
  }

  private at(day: number, minute: WallMinute): Date {
    return this.when.at(day, minute);
  }

  private act(at: Date, by: Person, run: (scope: ShopScope) => Promise<unknown>): void {
    this.acts.push({ at, by, run: async (scope) => void (await run(scope)) });
  }
}
