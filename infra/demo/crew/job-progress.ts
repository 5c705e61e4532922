import type { Generator } from '../chance/generator.js';
import type { CatalogRoom } from '../catalog/lines.js';
import { JOB_OPERATIONS, type JobOperation } from '../catalog/operations.js';
import type { Project, WorkdayIndex } from '../plan/project.js';
import { NEEDS, PHASE_OF, PHASES, SHARE_NEEDED, type Phase } from './phases.js';

/** When a job came to where it is, in working days; null when it has not come there. */
export type Milestones = Record<
  'measuredOn' | 'approvedOn' | 'materialOn' | 'buildingOn' | 'finishingOn' | 'installingOn' | 'doneOn',
  WorkdayIndex | null
>;

/** A job while its work is done: what it will really take, and what is left of it. Minutes. */
export class JobProgress {
  readonly milestones: Milestones;
  private readonly needed = new Map<JobOperation, number>();
  private readonly left = new Map<JobOperation, number>();

  constructor(
    readonly project: Project,
    random: Generator,
  ) {
    for (const [operation, planned] of plannedMinutes(project.work.rooms)) {
      const minutes = Math.round(planned * random.around(project.tempo, 0.22));
      this.needed.set(operation, minutes);
      this.left.set(operation, minutes);
    }
    this.milestones = startOf(project);
    // Work taken over by hand was measured and drawn before the shop wrote it down.
    if (project.origin === 'by-hand') this.left.set('Measure and draw', 0);
  }

  leftOf(operation: JobOperation): number {
    return this.left.get(operation) ?? 0;
  }

  get isDone(): boolean {
    return this.milestones.doneOn !== null;
  }

  /** The operations that can be worked on. */
  open(day: WorkdayIndex): JobOperation[] {
    const phase = this.phase(day);
    return JOB_OPERATIONS.filter(
      (operation) => PHASE_OF[operation] === phase && this.leftOf(operation) > 0 && this.isReady(operation),
    );
  }

  /** Time was worked on it. */
  work(operation: JobOperation, minutes: number, day: WorkdayIndex): void {
    this.left.set(operation, Math.max(0, this.leftOf(operation) - minutes));
    this.note(PHASE_OF[operation], day);
  }

  /** The phase the job is in on a day, or null while it waits for somebody outside the shop. */
  phase(day: WorkdayIndex): Phase | null {
    const { measuredOn, materialOn } = this.milestones;
    const current = PHASES.find((phase) => this.leftInPhase(phase) > 0) ?? null;
    if (current === 'measure')
      return day >= this.project.acceptedOn + this.project.pace.measure ? current : null;
    if (measuredOn === null || materialOn === null) return null;
    return day > materialOn ? current : null;
  }

  private leftInPhase(phase: Phase): number {
    return JOB_OPERATIONS.filter((operation) => PHASE_OF[operation] === phase).reduce(
      (sum, operation) => sum + this.leftOf(operation),
      0,
    );
  }

  private isReady(operation: JobOperation): boolean {
    return (NEEDS[operation] ?? []).every((before) => {
      const needed = this.needed.get(before) ?? 0;
      return needed === 0 || 1 - this.leftOf(before) / needed >= SHARE_NEEDED;
    });
  }

  private note(phase: Phase, day: WorkdayIndex): void {
    const { milestones, project } = this;
    if (phase === 'measure' && this.leftInPhase('measure') === 0) {
      milestones.measuredOn = day;
      milestones.approvedOn = day + project.pace.approval;
      milestones.materialOn = day + project.pace.approval + project.pace.material;
    }
    if (phase === 'build') milestones.buildingOn ??= day;
    if (phase === 'finish') milestones.finishingOn ??= day;
    if (phase === 'deliver' || phase === 'install') milestones.installingOn ??= day;
    if (PHASES.every((one) => this.leftInPhase(one) === 0)) milestones.doneOn = day;
  }
}

/** Minutes by operation, as the estimate plans them. */
export function plannedMinutes(rooms: readonly CatalogRoom[]): Map<JobOperation, number> {
  const minutes = new Map<JobOperation, number>();
  for (const { operation, quantity, plannedMinutesPerUnit } of rooms.flatMap(({ lines }) => lines)) {
    if (operation === null || plannedMinutesPerUnit === null) continue;
    const more = Number(quantity) * Number(plannedMinutesPerUnit);
    minutes.set(operation, (minutes.get(operation) ?? 0) + more);
  }
  return minutes;
}

function startOf({ origin, acceptedOn, pace }: Project): Milestones {
  const known = origin === 'by-hand' ? acceptedOn : null;
  return {
    measuredOn: known,
    approvedOn: known,
    materialOn: known === null ? null : known + pace.material,
    ...{ buildingOn: null, finishingOn: null, installingOn: null, doneOn: null },
  };
}
