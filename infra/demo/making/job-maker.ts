import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import { Job, jobOfEstimate } from '@bookmatch/api/features/jobs/jobs-public';
import { createJobCostSchema } from '@bookmatch/common/jobs/job-costs-contract';
import {
  createJobSchema,
  updateJobSchema,
  type JobStage,
  type UpdateJob,
} from '@bookmatch/common/jobs/jobs-contract';
import type { DateText } from '@bookmatch/common/calendar/shop-dates';
import { applyRate, extend, sumCents } from '@bookmatch/common/money/cents';
import type { Person } from '../cast/people.js';
import type { CatalogLine } from '../catalog/lines.js';
import type { Work } from '../catalog/work.js';
import { plannedMinutes } from '../crew/job-progress.js';
import type { Purchase } from '../plan/purchases.js';
import type { CustomerIds } from './customer-maker.js';
import type { Desk } from './desk.js';
import type { Trail } from './trail.js';

/** What is done about one job. */
export class JobMaker {
  constructor(
    private readonly desk: Desk,
    private readonly trail: Trail,
    /** Under which the job's id is kept. */
    private readonly name: string,
  ) {}

  /** The job that the acceptance of an estimate made. */
  async followAcceptance(scope: ShopScope, estimateId: string): Promise<void> {
    const job = await jobOfEstimate(scope, estimateId);
    if (!job) throw new RangeError(`Nobody has accepted the estimate of ${this.name}.`);
    this.trail.keep(this.name, job.id);
  }

  /** Work taken on without an estimate, at the price and with the plan that the catalog has for it. */
  async createByHand(scope: ShopScope, title: string, work: Work, place: CustomerIds, taxRate: string) {
    const lines = work.rooms.flatMap((room) => room.lines);
    const job = await this.desk.services.jobs.create(
      scope,
      createJobSchema.parse({
        ...{ title, ...place },
        ...priceOf(lines, taxRate),
        operations: [...plannedMinutes(work.rooms)].map(([operation, minutes]) => ({
          operationId: this.desk.operationId(operation),
          plannedMinutes: minutes,
        })),
        plannedCosts: boughtCosts(lines),
        notes: 'In progress when the shop began with the program. Measured and drawn before.',
      }),
    );
    this.trail.keep(this.name, job.id);
  }

  async move(scope: ShopScope, stage: JobStage): Promise<void> {
    const { id, version } = await this.read(scope);
    await this.desk.services.jobs.move(scope, id, { stage, confirmSkip: true, reason: '' }, version);
  }

  async update(scope: ShopScope, fields: UpdateJob): Promise<void> {
    const { id, version } = await this.read(scope);
    await this.desk.services.jobs.update(scope, id, updateJobSchema.parse(fields), version);
  }

  async assign(scope: ShopScope, people: readonly Person[]): Promise<void> {
    const { id, version } = await this.read(scope);
    const memberIds = people.map((person) => this.desk.seatOf(person).memberId);
    await this.desk.services.jobs.assign(scope, id, { memberIds }, version);
  }

  async buy(scope: ShopScope, { category, description, supplier, amountCents }: Purchase, onDate: DateText) {
    const cost = createJobCostSchema.parse({ category, description, supplier, amountCents, onDate });
    return this.desk.services.jobCosts.add(scope, this.trail.id(this.name), cost);
  }

  async takeBack(scope: ShopScope, costId: string, reason: string): Promise<void> {
    await this.desk.services.jobCosts.reverse(scope, this.trail.id(this.name), costId, reason);
  }

  private read(scope: ShopScope): Promise<Job> {
    return scope.rows(Job).get(this.trail.id(this.name));
  }
}

function priceOf(lines: readonly CatalogLine[], taxRate: string) {
  const amount = ({ quantity, unitPriceCents }: CatalogLine) => extend(quantity, unitPriceCents);
  const taxable = lines.filter((line) => line.taxable);
  return {
    contractNetCents: sumCents(lines.map(amount)),
    contractTaxCents: applyRate(sumCents(taxable.map(amount)), taxRate),
  };
}

/** What is planned to be bought, by category. */
function boughtCosts(lines: readonly CatalogLine[]) {
  const bought = lines.filter(({ operation }) => operation === null);
  return [...new Set(bought.map(({ kind }) => kind))].map((category) => ({
    category,
    plannedCents: sumCents(
      bought
        .filter(({ kind }) => kind === category)
        .map(({ quantity, unitCostCents }) => extend(quantity, unitCostCents)),
    ),
  }));
}
