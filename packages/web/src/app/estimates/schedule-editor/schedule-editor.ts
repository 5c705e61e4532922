import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { ReactiveFormsModule, type AbstractControl } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { MAX_BILLING_STAGES } from '@bookmatch/common/estimates/billing-schedule-contract';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { MoneyInput } from '../../ui/money-input/money-input';
import { Panel } from '../../ui/panel/panel';
import { DraftEditor } from '../draft/draft-editor';

/** When the price is paid: the stages at which the job is invoiced, and what each comes to. */
@Component({
  selector: 'bm-schedule-editor',
  imports: [
    ErrorOf,
    MatButton,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    MoneyInput,
    MoneyPipe,
    Panel,
    ReactiveFormsModule,
  ],
  templateUrl: './schedule-editor.html',
  styleUrl: './schedule-editor.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScheduleEditor {
  protected readonly editor = inject(DraftEditor);
  protected readonly most = MAX_BILLING_STAGES;
  protected readonly isWrong = (control: AbstractControl): boolean => control.invalid && control.touched;
}
