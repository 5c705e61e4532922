import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';

/** The two ways to look at the books: by account, and entry by entry. */
@Component({
  selector: 'bm-ledger-views',
  imports: [RouterLink, RouterLinkActive],
  template: `
    <nav aria-label="Ways to look at the ledger">
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
  styleUrl: './ledger-views.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LedgerViews {
  protected readonly views = [
    { path: '/ledger', name: 'Balances' },
    { path: '/ledger/entries', name: 'Entries' },
  ];
  protected readonly onlyThisPath = {
    paths: 'exact',
    queryParams: 'ignored',
    fragment: 'ignored',
    matrixParams: 'ignored',
  } as const;
}
