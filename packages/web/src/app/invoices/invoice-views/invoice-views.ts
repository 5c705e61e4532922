import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';

/** The ways to look at what is billed: every invoice, what is owed by customer, and the money that came. */
@Component({
  selector: 'bm-invoice-views',
  imports: [RouterLink, RouterLinkActive],
  template: `
    <nav aria-label="Ways to look at invoices">
      @for (view of views; track view.path) {
        <a
          [routerLink]="view.path"
          routerLinkActive="here"
          [routerLinkActiveOptions]="onlyThisPath"
          ariaCurrentWhenActive="page"
          >{{ view.name }}</a
        >
      }
    </nav>
  `,
  styleUrl: './invoice-views.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvoiceViews {
  protected readonly views = [
    { path: '/invoices', name: 'Invoices' },
    { path: '/invoices/aging', name: 'Owed by customer' },
    { path: '/invoices/payments', name: 'Payments' },
  ];
  protected readonly onlyThisPath = {
    paths: 'exact',
    queryParams: 'ignored',
    fragment: 'ignored',
    matrixParams: 'ignored',
  } as const;
}
