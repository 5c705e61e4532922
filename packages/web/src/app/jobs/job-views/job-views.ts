import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';

/** The two ways to look at the jobs: as a list, and by stage. */
@Component({
  selector: 'bm-job-views',
  imports: [RouterLink, RouterLinkActive],
  template: `
    <nav aria-label="Ways to look at jobs">
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
  styleUrl: './job-views.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobViews {
  protected readonly views = [
    { path: '/jobs', name: 'List' },
    { path: '/jobs/board', name: 'By stage' },
  ];
  protected readonly onlyThisPath = {
    paths: 'exact',
    queryParams: 'ignored',
    fragment: 'ignored',
    matrixParams: 'ignored',
  } as const;
}
