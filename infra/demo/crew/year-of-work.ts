import type { Generator } from '../chance/generator.js';
import type { JobOperation } from '../catalog/operations.js';
import type { Project, WorkdayIndex } from '../plan/project.js';
import { dayFrame } from './day-frame.js';
import { HANDS, isOff, LIKES, type Hand } from './hands.js';
import { JobProgress, type Milestones } from './job-progress.js';
import { sameTask, type Shift, type Stretch, type Task } from './shift.js';

/** Everybody's days, and where each job came when. */
export type YearOfWork = { shifts: Shift[]; milestones: ReadonlyMap<string, Milestones> };

/** So many jobs are on the benches at a time; the others wait, their material in. */
const JOBS_ON_BENCHES = 4;
/** A piece of work shorter than this is finished rather than left for tomorrow. */
const LEFTOVER_MINUTES = 25;
type JobTask = Extract<Task, { kind: 'job' }>;

/**
 * Lets the crew work through the year, day by day, on what stands ready: earlier jobs first, each hand what they like
 * best. So the hours of a job, the dates of its stages and what is clocked are one history and not three.
 */
export class CrewYear {
  private readonly jobs: JobProgress[];
  private readonly last = new Map<Hand, JobTask>();
  private readonly shifts: Shift[] = [];

  constructor(
    projects: readonly Project[],
    private readonly random: Generator,
  ) {
    this.jobs = projects.map((project) => new JobProgress(project, random.stream(project.key)));
  }

  /** @param from the first working day; the last is 0 */
  workThrough(from: WorkdayIndex): YearOfWork {
    for (let day = from; day <= 0; day += 1)
      for (const hand of HANDS) if (!isOff(hand, day)) this.shifts.push(this.shift(hand, day));
    return {
      shifts: this.shifts,
      milestones: new Map(this.jobs.map(({ project, milestones }) => [project.key, milestones])),
    };
  }

  private shift(hand: Hand, day: WorkdayIndex): Shift {
    const stretches: Stretch[] = [];
    for (const piece of dayFrame(this.random.stream(`${hand} ${day}`)).pieces) {
      const add = (from: number, to: number, task: Task) => addStretch(stretches, { from, to, task });
      if (piece.use === 'meal') add(piece.from, piece.to, { kind: 'meal' });
      else if (piece.use === 'shop') add(piece.from, piece.to, { kind: 'shop' });
      else this.fill(hand, day, piece, add);
    }
    return { hand, day, stretches };
  }

  /** Works from one minute to another, on more than one thing when the first is done on the way. */
  private fill(
    hand: Hand,
    day: WorkdayIndex,
    { from, to }: { from: number; to: number },
    add: (from: number, to: number, task: Task) => void,
  ): void {
    let at = from;
    while (at < to) {
      const task = this.choose(hand, day);
      const until = task ? this.untilWhen(task, at, to) : to;
      add(at, until, task ?? { kind: 'shop' });
      if (task) this.jobOf(task).work(task.operation, until - at, day);
      at = until;
    }
  }

  private untilWhen(task: JobTask, at: number, to: number): number {
    const left = this.jobOf(task).leftOf(task.operation);
    if (left > to - at || to - at - left < LEFTOVER_MINUTES) return to;
    return at + Math.max(left, LEFTOVER_MINUTES);
  }

  private choose(hand: Hand, day: WorkdayIndex): JobTask | null {
    const tasks = this.ready(day);
    const best = tasks.reduce<{ task: JobTask; cost: number } | null>((found, task, index) => {
      const cost = this.cost(hand, task, index);
      return found === null || cost < found.cost ? { task, cost } : found;
    }, null);
    if (best) this.last.set(hand, best.task);
    return best?.task ?? null;
  }

  /** What can be worked on, the earliest job first. */
  private ready(day: WorkdayIndex): JobTask[] {
    let onBenches = this.jobs.filter(
      ({ milestones, isDone }) => milestones.buildingOn !== null && !isDone,
    ).length;
    return this.jobs
      .filter((job) => !job.isDone && job.project.acceptedOn < day)
      .flatMap((job) => {
        const waits = job.milestones.buildingOn === null && job.phase(day) !== 'measure';
        if (waits && onBenches >= JOBS_ON_BENCHES) return [];
        if (waits && job.phase(day) !== null) onBenches += 1;
        return job.open(day).map((operation) => taskOf(job, operation));
      });
  }

  /**
   * The lower the better: an early job, work one likes, work nobody else is at. A site is measured before all else, since
   * others wait for the drawings. A bit of chance keeps the days apart.
   */
  private cost(hand: Hand, task: JobTask, rank: number): number {
    if (hand === 'lead-hand' && task.operation === 'Measure and draw') return 0;
    const liked = LIKES[hand].indexOf(task.operation);
    const same = HANDS.filter((other) => sameTaskOrNone(this.last.get(other), task)).length;
    return rank * 0.9 + (liked < 0 ? 9 : liked * 1.4) + same * 4 + this.random.fraction() * 7;
  }

  private jobOf(task: JobTask): JobProgress {
    const job = this.jobs.find(({ project }) => project.key === task.project);
    if (!job) throw new RangeError(`There is no job ${task.project}.`);
    return job;
  }
}

const taskOf = ({ project }: JobProgress, operation: JobOperation): JobTask => ({
  kind: 'job',
  project: project.key,
  operation,
});

const sameTaskOrNone = (one: Task | undefined, other: Task): boolean =>
  one !== undefined && sameTask(one, other);

/** Joins what goes on with the same thing. */
function addStretch(stretches: Stretch[], next: Stretch): void {
  const before = stretches.at(-1);
  if (before && sameTask(before.task, next.task)) before.to = next.to;
  else stretches.push(next);
}
