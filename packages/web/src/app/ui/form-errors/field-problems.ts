import type { AbstractControl } from '@angular/forms';
import type { FieldProblem } from '@bookmatch/common/problems/problem';

/** The key under which a field's sentence stands among its control's errors. */
const KEY = 'problem';

/**
 * Puts each sentence at its control by the dotted path both sides use. A sentence goes away when its field is edited.
 *
 * @returns those whose field is not on this form, to be shown for the form as a whole
 */
export function placeFieldProblems(
  form: AbstractControl,
  problems: readonly FieldProblem[],
): readonly FieldProblem[] {
  const homeless: FieldProblem[] = [];
  for (const problem of problems) {
    const control = problem.path ? form.get(problem.path) : null;
    if (!control) {
      homeless.push(problem);
      continue;
    }
    control.setErrors({ ...control.errors, [KEY]: problem.message });
    control.markAsTouched();
  }
  return homeless;
}

export function messageOf(control: AbstractControl): string {
  const errors = control.errors;
  if (!errors) return '';
  const sentence: unknown = errors[KEY];
  if (typeof sentence === 'string') return sentence;
  return errors['required'] ? 'This cannot be empty.' : 'This cannot be read.';
}
