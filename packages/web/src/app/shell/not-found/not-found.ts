import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { EmptyState } from '../../ui/empty-state/empty-state';

@Component({
  selector: 'bm-not-found',
  imports: [EmptyState, MatButton, RouterLink],
  template: `
    <h1 class="bm-spoken">Not found</h1>
    <bm-empty-state
      icon="question"
      title="Nothing is here"
      text="The address may be mistyped, or what it led to is gone."
    >
      <a matButton="outlined" routerLink="/">Go to the first page</a>
    </bm-empty-state>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFound {}
