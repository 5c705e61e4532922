import type { AbstractControl } from '@angular/forms';
import type { FieldProblem } from '@bookmatch/common/problems/problem';
import { placeFieldProblems } from './field-problems';

/** What a zod schema offers here, without the library's weight in the type. */
type Schema<Out> = {
  safeParse(
    value: unknown,
  ):
    | { success: true; data: Out }
    | { success: false; error: { issues: readonly { path: readonly PropertyKey[]; message: string }[] } };
};

/**
 * Checks a form by the contract that the server will check it by, and puts every sentence at its field.
 *
 * @returns what is to be sent, or null when something needs correcting
 */
export function checkForm<Out>(form: AbstractControl, schema: Schema<Out>): Out | null {
  forgetSentences(form);
  form.markAllAsTouched();
  const result = schema.safeParse(form.getRawValue());
  if (!result.success) placeFieldProblems(form, result.error.issues.map(toFieldProblem));
  return result.success && form.valid ? result.data : null;
}

/** What was said before may have been mended in another field: every control is judged afresh. */
function forgetSentences(control: AbstractControl): void {
  if ('controls' in control) Object.values(control.controls as AbstractControl[]).forEach(forgetSentences);
  control.updateValueAndValidity({ onlySelf: true });
}

const toFieldProblem = (issue: { path: readonly PropertyKey[]; message: string }): FieldProblem => ({
  path: issue.path.map(String).join('.'),
  message: issue.message,
});
