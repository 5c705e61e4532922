import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import type { CustomerWithSites, Site } from '@bookmatch/common/customers/customers-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { Confirm } from '../../ui/confirm/confirm';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { addressLines, CUSTOMER_KIND_NAMES } from '../customer-names';
import { SiteForm, type SiteFormSubject } from '../site-form/site-form';
import { CustomersPage } from '../state/customers.actions';
import { selectCustomer, selectOpenProblem } from '../state/customers.selectors';

@Component({
  selector: 'bm-customer-detail',
  imports: [
    DateTextPipe,
    MatButton,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    PageHead,
    Panel,
    ProblemNote,
    RouterLink,
    Skeleton,
    StatusChip,
  ],
  templateUrl: './customer-detail.html',
  styleUrl: './customer-detail.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CustomerDetail {
  /** From the address. */
  readonly id = input.required<string>();

  private readonly store = inject(Store);
  private readonly confirm = inject(Confirm);
  private readonly dialog = inject(MatDialog);
  protected readonly can = injectCan();
  protected readonly kindNames = CUSTOMER_KIND_NAMES;
  protected readonly addressLines = addressLines;

  private readonly selected = computed(() => this.store.selectSignal(selectCustomer(this.id())));
  protected readonly customer = computed(() => this.selected()());
  protected readonly problem = this.store.selectSignal(selectOpenProblem);
  protected readonly facts = computed(() => factsOf(this.customer()));

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    const id = this.id();
    untracked(() => this.store.dispatch(CustomersPage.customerOpened({ id })));
  }

  protected archive({ id, name }: CustomerWithSites): void {
    const question = {
      title: `Archive ${name}?`,
      text: 'The customer leaves the lists. Jobs and invoices stay as they are, and you can bring the customer back.',
      action: 'Archive',
    };
    this.confirm.ask(question).subscribe((answer) => {
      if (answer) this.store.dispatch(CustomersPage.archiveConfirmed({ id }));
    });
  }

  protected restore({ id }: CustomerWithSites): void {
    this.store.dispatch(CustomersPage.restorePressed({ id }));
  }

  protected openSite(site: Site | null): void {
    const data: SiteFormSubject = { customerId: this.id(), site };
    this.dialog.open(SiteForm, { data, width: '560px', disableClose: true });
  }

  protected removeSite(site: Site): void {
    const question = {
      title: `Remove ${site.name}?`,
      text: 'Only a site that no work went to can be removed.',
      action: 'Remove',
      tone: 'harm',
    } as const;
    this.confirm.ask(question).subscribe((answer) => {
      if (answer) this.store.dispatch(CustomersPage.siteRemovalConfirmed({ site }));
    });
  }
}

function factsOf(customer: CustomerWithSites | null): string {
  if (!customer) return '';
  return [CUSTOMER_KIND_NAMES[customer.kind], customer.company, customer.phone, customer.email]
    .filter(Boolean)
    .join(' · ');
}
