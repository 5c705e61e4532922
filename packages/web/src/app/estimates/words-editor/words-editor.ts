import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { TAX_RULES } from '@bookmatch/common/estimates/tax-rules';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { Panel } from '../../ui/panel/panel';
import { PercentInput } from '../../ui/percent-input/percent-input';
import { DraftEditor } from '../draft/draft-editor';
import { TAX_RULE_NAMES } from '../estimate-names';

/** How long the offer stands, how it is taxed, and what is said around the figures. */
@Component({
  selector: 'bm-words-editor',
  imports: [
    ErrorOf,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    MatSuffix,
    Panel,
    PercentInput,
    ReactiveFormsModule,
  ],
  templateUrl: './words-editor.html',
  styles: ':host { display: grid; gap: 20px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WordsEditor {
  protected readonly editor = inject(DraftEditor);
  protected readonly taxRules = TAX_RULES.map((value) => ({ value, name: TAX_RULE_NAMES[value] }));
}
