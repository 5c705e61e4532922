import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ReactiveFormsModule, type FormControl } from '@angular/forms';
import { MatRadioButton, MatRadioGroup } from '@angular/material/radio';
import { ROLE_NAMES, ROLES, type Role } from '@bookmatch/common/access/roles';
import { ROLE_WORDS } from '../role-words';

/** The roles to choose from, each with what it sees and what it does not. */
@Component({
  selector: 'bm-role-choice',
  imports: [MatRadioButton, MatRadioGroup, ReactiveFormsModule],
  template: `
    <mat-radio-group aria-label="Role" [formControl]="control()">
      @for (role of roles; track role.value) {
        <mat-radio-button [value]="role.value">
          <strong>{{ role.name }}</strong>
          <span class="words">{{ role.does }} {{ role.never }}</span>
        </mat-radio-button>
      }
    </mat-radio-group>
  `,
  styles: `
    mat-radio-group {
      display: grid;
      gap: 8px;
    }

    .words {
      display: block;
      color: var(--mat-sys-on-surface-variant);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RoleChoice {
  readonly control = input.required<FormControl<Role>>();
  protected readonly roles = ROLES.map((value) => ({
    value,
    name: ROLE_NAMES[value],
    ...ROLE_WORDS[value],
  }));
}
