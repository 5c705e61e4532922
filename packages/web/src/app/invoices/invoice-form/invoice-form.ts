import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import type { CustomerWithSites } from '@bookmatch/common/customers/customers-contract';
import {
  createInvoiceSchema,
  updateInvoiceSchema,
  type Invoice,
} from '@bookmatch/common/invoices/invoices-contract';
import { Store } from '@ngrx/store';
import { map } from 'rxjs';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { placeFieldProblems } from '../../ui/form-errors/field-problems';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { PercentInput } from '../../ui/percent-input/percent-input';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { warnBeforeUnload, type HasUnsavedChanges } from '../../ui/unsaved-changes/unsaved-changes';
import { InvoiceFor, type StageRef } from '../invoice-for/invoice-for';
import { InvoiceLines } from '../invoice-lines/invoice-lines';
import { InvoicesApiClient } from '../invoices-api';
import { LineEditor } from '../line-editor/line-editor';
import { InvoicesPage } from '../state/invoices.actions';
import { selectInvoice, selectOpenProblem, selectSave } from '../state/invoices.selectors';
import { invoiceForm, lineForm, totalsSoFar } from './invoice-form-group';

/** Writes a free invoice, or changes the draft in the address. A stage's draft keeps its agreed amounts. */
@Component({
  selector: 'bm-invoice-form',
  imports: [
    ErrorOf,
    FormErrors,
    InvoiceFor,
    InvoiceLines,
    LineEditor,
    MatButton,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatSuffix,
    MoneyPipe,
    PageHead,
    Panel,
    PercentInput,
    ProblemNote,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './invoice-form.html',
  styleUrl: './invoice-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvoiceForm implements HasUnsavedChanges {
  /** From the address; absent for a new invoice. */
  readonly id = input<string>();
  readonly customerId = input<string>();
  readonly jobId = input<string>();

  private readonly store = inject(Store);
  private readonly api = inject(InvoicesApiClient);
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly whom = viewChild(InvoiceFor);
  protected readonly form = invoiceForm(this.builder);
  protected readonly save = this.store.selectSignal(selectSave);
  protected readonly openProblem = this.store.selectSignal(selectOpenProblem);
  private readonly selected = computed(() => this.store.selectSignal(selectInvoice(this.id() ?? '')));
  protected readonly invoice = computed(() => this.selected()());
  protected readonly isStage = computed(() => this.invoice()?.billingStage != null);
  protected readonly totals = toSignal(
    this.form.valueChanges.pipe(map(() => totalsSoFar(this.form.getRawValue()))),
    { initialValue: totalsSoFar(this.form.getRawValue()) },
  );
  private readonly shopTaxRate = signal('0');
  private filled = false;

  constructor() {
    this.store.dispatch(InvoicesPage.formOpened());
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const id = this.id();
      untracked(() => (id ? this.store.dispatch(InvoicesPage.invoiceOpened({ id })) : this.begin()));
    });
    effect(() => this.fillOnce(this.invoice()));
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty && this.save().status !== 'saved';
  }

  protected take(customer: CustomerWithSites | null): void {
    this.form.patchValue({
      customerId: customer?.id ?? '',
      taxRate: customer?.taxExempt ? '0' : this.shopTaxRate(),
    });
  }

  protected billStage(stage: StageRef): void {
    this.store.dispatch(InvoicesPage.createSubmitted({ fields: { from: 'stage', ...stage } }));
  }

  protected submit(element: HTMLFormElement): void {
    this.form.markAllAsTouched();
    const invoice = this.invoice();
    const done = invoice ? this.submitEdit(invoice) : this.submitNew();
    if (!done) focusFirstInvalid(element);
  }

  private submitNew(): boolean {
    const { dueOn: _, ...body } = this.form.getRawValue();
    const parsed = createInvoiceSchema.safeParse({ from: 'lines', ...body });
    if (body.customerId === '') this.refuseCustomer();
    if (!this.agrees(parsed) || body.customerId === '') return false;
    this.store.dispatch(InvoicesPage.createSubmitted({ fields: parsed.data }));
    return true;
  }

  private submitEdit({ id, version }: Invoice): boolean {
    const { lines, taxRate, memo, dueOn } = this.form.getRawValue();
    const own = { memo, dueOn: dueOn || null };
    const parsed = updateInvoiceSchema.safeParse(this.isStage() ? own : { ...own, lines, taxRate });
    if (!this.agrees(parsed)) return false;
    this.store.dispatch(InvoicesPage.editSubmitted({ invoice: { id, version }, fields: parsed.data }));
    return true;
  }

  /** Puts the contract's sentences at their fields. */
  private agrees<Out>(
    parsed: { success: true; data: Out } | { success: false; error: { issues: Issue[] } },
  ): parsed is { success: true; data: Out } {
    if (!parsed.success)
      placeFieldProblems(
        this.form,
        parsed.error.issues.map(({ path, message }) => ({ path: path.map(String).join('.'), message })),
      );
    return parsed.success && this.form.valid;
  }

  private refuseCustomer(): void {
    const field = this.whom()?.customer;
    field?.setErrors({ problem: 'Choose a customer from the list.' });
    field?.markAsTouched();
  }

  private begin(): void {
    this.form.controls.lines.push(lineForm(this.builder));
    this.api.shop().subscribe({
      next: ({ defaultTaxRate }) => {
        this.shopTaxRate.set(defaultTaxRate);
        if (this.form.controls.taxRate.pristine) this.form.patchValue({ taxRate: defaultTaxRate });
      },
      // The rate can be typed all the same.
      error: () => undefined,
    });
  }

  /** Only once: a newer version never overwrites what the person is writing. */
  private fillOnce(invoice: Invoice | null): void {
    if (!invoice || this.filled) return;
    this.filled = true;
    const { customer, job, taxRate, memo, dueOn, lines } = invoice;
    for (const line of lines) this.form.controls.lines.push(lineForm(this.builder, line));
    this.form.patchValue({
      customerId: customer.id,
      jobId: job?.id ?? null,
      taxRate: taxRate ?? '0',
      memo,
      dueOn: dueOn ?? '',
    });
  }
}
type Issue = { path: readonly PropertyKey[]; message: string };
