import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHead } from '../../ui/page-head/page-head';
import { NameForm } from './name-form';
import { OwnSessions } from './own-sessions';
import { PasswordForm } from './password-form';

/** What a person may change about themselves, the same in every shop. */
@Component({
  selector: 'bm-my-account',
  imports: [NameForm, OwnSessions, PageHead, PasswordForm],
  template: `
    <bm-page-head name="My account" />
    <div class="bm-columns">
      <div class="stack"><bm-name-form /><bm-password-form /></div>
      <bm-own-sessions />
    </div>
  `,
  styles: '.stack { display: grid; gap: 20px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MyAccount {}
