import {
  ChangeDetectionStrategy,
  Component,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
} from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import {
  MatAutocomplete,
  MatAutocompleteTrigger,
  type MatAutocompleteSelectedEvent,
} from '@angular/material/autocomplete';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import type { CustomerRow, CustomerWithSites } from '@bookmatch/common/customers/customers-contract';
import type { Job, JobBillingRow, JobRow } from '@bookmatch/common/jobs/jobs-contract';
import { catchError, debounceTime, filter, of, switchMap } from 'rxjs';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { InvoicesApiClient } from '../invoices-api';

type Chosen = Pick<CustomerWithSites, 'id' | 'name'>;
export type StageRef = { jobId: string; billingStageId: string };

/** Whom a new invoice is for: the customer, perhaps a job, and the job's stages that wait to be billed. */
@Component({
  selector: 'bm-invoice-for',
  imports: [
    ErrorOf,
    MatAutocomplete,
    MatAutocompleteTrigger,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    MoneyPipe,
    ReactiveFormsModule,
  ],
  templateUrl: './invoice-for.html',
  styleUrl: './invoice-for.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvoiceFor {
  /** From the address, when the way here began at a customer or a job. */
  readonly startCustomerId = input<string>();
  readonly startJobId = input<string>();
  readonly busy = input(false);
  /** Empty while no customer is chosen. */
  readonly customerChosen = output<CustomerWithSites | null>();
  readonly jobChosen = output<string | null>();
  readonly stageChosen = output<StageRef>();

  private readonly api = inject(InvoicesApiClient);
  /** What stands in the customer's field: a text while it is searched, the customer once chosen. */
  readonly customer = new FormControl<string | Chosen>('', { nonNullable: true });
  protected readonly job = new FormControl<string | null>(null);
  protected readonly jobs = signal<readonly JobRow[]>([]);
  protected readonly stages = signal<readonly JobBillingRow[]>([]);
  protected readonly nameOf = (customer: string | Chosen): string =>
    typeof customer === 'string' ? customer : customer.name;
  protected readonly found = toSignal(
    this.customer.valueChanges.pipe(
      filter((value) => typeof value === 'string'),
      debounceTime(250),
      switchMap((q) => this.api.findCustomers(q).pipe(catchError(() => of<CustomerRow[]>([])))),
    ),
    { initialValue: [] },
  );

  constructor() {
    effect(() => {
      const [customerId, jobId] = [this.startCustomerId(), this.startJobId()];
      untracked(() => {
        if (jobId) this.startAtJob(jobId);
        else if (customerId) this.takeCustomer(customerId);
      });
    });
    this.customer.valueChanges.pipe(takeUntilDestroyed()).subscribe((value) => {
      if (typeof value === 'string') this.forget();
    });
    this.job.valueChanges.pipe(takeUntilDestroyed()).subscribe((id) => this.takeJob(id));
  }

  protected choose({ option }: MatAutocompleteSelectedEvent): void {
    this.takeCustomer((option.value as Chosen).id);
  }

  protected bill({ billingStageId }: JobBillingRow): void {
    const jobId = this.job.value;
    if (jobId) this.stageChosen.emit({ jobId, billingStageId });
  }

  private startAtJob(jobId: string): void {
    this.api
      .job(jobId)
      .pipe(catchError(() => of(null)))
      .subscribe((job) => {
        if (job) this.takeCustomer(job.customer.id, job);
      });
  }

  private takeCustomer(id: string, job: Job | null = null): void {
    this.api
      .customer(id)
      .pipe(catchError(() => of(null)))
      .subscribe((customer) => {
        if (!customer) return;
        this.customer.setValue(customer, { emitEvent: false });
        this.customerChosen.emit(customer);
        this.offerJobs(id, job);
      });
  }

  private offerJobs(customerId: string, job: Job | null): void {
    this.api
      .jobsOf(customerId)
      .pipe(catchError(() => of<JobRow[]>([])))
      .subscribe((jobs) => {
        this.jobs.set(jobs);
        this.job.setValue(job?.id ?? null);
      });
  }

  /** Only stages without an invoice wait to be billed. */
  private takeJob(id: string | null): void {
    this.stages.set([]);
    this.jobChosen.emit(id);
    if (!id) return;
    this.api
      .job(id)
      .pipe(catchError(() => of(null)))
      .subscribe((job) => {
        const waiting = (job?.money?.billing ?? []).filter(({ invoice }) => invoice === null);
        if (this.job.value === id) this.stages.set(waiting);
      });
  }

  private forget(): void {
    this.jobs.set([]);
    this.job.setValue(null);
    this.customerChosen.emit(null);
  }
}
