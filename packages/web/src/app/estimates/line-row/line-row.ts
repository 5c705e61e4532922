import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  Injector,
  input,
  output,
  signal,
  viewChild,
  type OnInit,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule, type AbstractControl } from '@angular/forms';
import { CdkDragHandle } from '@angular/cdk/drag-drop';
import { MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { COST_CATEGORIES, COST_CATEGORY_NAMES } from '@bookmatch/common/estimates/cost-categories';
import { QUANTITY_UNITS } from '@bookmatch/common/estimates/revision-contract';
import { formatRate } from '@bookmatch/common/money/format';
import { ratio } from '@bookmatch/common/money/ratio';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import { map, startWith, switchMap } from 'rxjs';
import { messageOf } from '../../ui/form-errors/field-problems';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { MoneyInput } from '../../ui/money-input/money-input';
import type { LineForm } from '../draft/draft-form';
import { HoursInput } from './hours-input';
import { lineFigures, priceAtMarkup } from './line-figures';

/** One line of a room: its fields in a row, what it comes to, and its hours and tax behind a switch. */
@Component({
  selector: 'bm-line-row',
  imports: [
    CdkDragHandle,
    HoursInput,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    MoneyInput,
    MoneyPipe,
    ReactiveFormsModule,
  ],
  templateUrl: './line-row.html',
  styleUrl: './line-row.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    role: 'group',
    '[attr.aria-label]': 'spoken()',
    '(keydown.alt.arrowup)': 'step($event, -1)',
    '(keydown.alt.arrowdown)': 'step($event, 1)',
    '(keydown.enter)': 'next($event)',
  },
})
export class LineRow implements OnInit {
  readonly line = input.required<LineForm>();
  /** Counted from 1. */
  readonly place = input.required<number>();
  readonly last = input(false);
  readonly operations = input.required<readonly Operation[]>();
  /** True for a line that was just added: it takes the focus. */
  readonly fresh = input(false);

  readonly moved = output<-1 | 1>();
  readonly duplicated = output();
  readonly removed = output();
  readonly below = output();

  private readonly injector = inject(Injector);
  private readonly description = viewChild.required<ElementRef<HTMLInputElement>>('description');
  protected readonly kinds = COST_CATEGORIES.map((value) => ({ value, name: COST_CATEGORY_NAMES[value] }));
  protected readonly units = QUANTITY_UNITS;
  protected readonly open = signal(false);

  private readonly fields = toSignal(
    toObservable(this.line).pipe(
      switchMap((line) =>
        line.events.pipe(
          startWith(null),
          map(() => line.getRawValue()),
        ),
      ),
    ),
  );
  protected readonly figures = computed(() => lineFigures(this.fields()));
  protected readonly spoken = computed(
    () => `Line ${this.place()}: ${this.fields()?.description || 'not described yet'}`,
  );
  protected readonly margin = computed(() => {
    const { amountCents, costCents } = this.figures();
    const share = ratio(amountCents - costCents, amountCents);
    return share === null ? '' : formatRate(share, 0);
  });
  protected readonly markup = computed(() => {
    const { amountCents, costCents } = this.figures();
    const share = ratio(amountCents - costCents, costCents);
    return share === null ? '' : formatRate(share, 1).replace('%', '');
  });
  /** Those of the shop that are in use, and the line's own even when it was archived since. */
  protected readonly choices = computed(() => {
    const own = this.fields()?.operationId;
    return this.operations().filter(({ id, archived, onJob }) => (onJob && !archived) || id === own);
  });

  ngOnInit(): void {
    this.open.set(this.line().controls.operationId.value !== null);
    if (this.fresh())
      afterNextRender(() => this.description().nativeElement.focus(), { injector: this.injector });
  }

  protected readonly problems = computed(() => {
    this.fields();
    return Object.values<AbstractControl>(this.line().controls)
      .filter((control) => this.isWrong(control))
      .map(messageOf);
  });

  protected isWrong(control: AbstractControl): boolean {
    return control.invalid && control.touched;
  }

  /** The price that a markup on the cost makes. */
  protected mark(text: string): void {
    const { unitCostCents, unitPriceCents } = this.line().controls;
    const price = priceAtMarkup(unitCostCents.value ?? 0, text);
    if (price !== null) unitPriceCents.setValue(price);
  }

  /** An operation comes with what its hour costs, for a line that has no cost yet. */
  protected takeOperation(): void {
    const { operationId, unit, unitCostCents, plannedMinutesPerUnit } = this.line().controls;
    const operation = this.operations().find(({ id }) => id === operationId.value);
    if (!operation) return;
    if (unit.value === 'hour' && plannedMinutesPerUnit.value === null) plannedMinutesPerUnit.setValue('60');
    const rate = operation.defaultRateCentsPerHour;
    if (unit.value === 'hour' && rate && unitCostCents.value === null) unitCostCents.setValue(rate);
  }

  protected step(event: Event, by: -1 | 1): void {
    event.preventDefault();
    this.moved.emit(by);
  }

  protected next(event: Event): void {
    if (!(event.target instanceof HTMLInputElement)) return;
    event.preventDefault();
    this.below.emit();
  }
}
