import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';

/** The two ways to look at the leads: as a list, and by stage. Search and filters stay. */
@Component({
  selector: 'bm-lead-views',
  imports: [RouterLink, RouterLinkActive],
  template: `
    <nav aria-label="Ways to look at leads">
      @for (view of views; track view.path) {
        <a
          [routerLink]="view.path"
          queryParamsHandling="preserve"
          routerLinkActive="here"
          [routerLinkActiveOptions]="onlyThisPath"
          ariaCurrentWhenActive="page"
          >{{ view.name }}</a
        >
      }
    </nav>
  `,
  styleUrl: './lead-views.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeadViews {
  protected readonly views = [
    { path: '/leads', name: 'List' },
    { path: '/leads/board', name: 'Board' },
  ];
  protected readonly onlyThisPath = {
    paths: 'exact',
    queryParams: 'ignored',
    fragment: 'ignored',
    matrixParams: 'ignored',
  } as const;
}
