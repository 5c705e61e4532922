import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_CURRENCY } from '../../ui/formats/shop-settings';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { accountName, ENTRY_KIND_NAMES } from '../ledger-words';
import { LedgerPage } from '../state/ledger.actions';
import { selectEntry, selectOpenProblem } from '../state/ledger.selectors';

/** One entry: its lines, and the way back to what made it. */
@Component({
  selector: 'bm-entry-detail',
  imports: [DateTextPipe, MatButton, MoneyPipe, PageHead, Panel, ProblemNote, RouterLink, Skeleton],
  templateUrl: './entry-detail.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EntryDetail {
  /** From the address. */
  readonly id = input.required<string>();

  private readonly store = inject(Store);
  protected readonly can = injectCan();
  protected readonly currency = inject(SHOP_CURRENCY);
  protected readonly kinds = ENTRY_KIND_NAMES;
  protected readonly accountName = accountName;
  private readonly selected = computed(() => this.store.selectSignal(selectEntry(this.id())));
  protected readonly entry = computed(() => this.selected()());
  protected readonly problem = this.store.selectSignal(selectOpenProblem);
  /** Every line of an entry is about the same job, when it is about one. */
  protected readonly jobId = computed(() => this.entry()?.lines.find(({ jobId }) => jobId !== null)?.jobId);

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    const id = this.id();
    untracked(() => this.store.dispatch(LedgerPage.entryOpened({ id })));
  }
}
