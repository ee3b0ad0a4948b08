import type { AbstractControl } from '@angular/forms';
import type { FieldProblem } from '../../../shared/contract/problem';

/**
 * Puts what the server says of fields at their controls, as the error `told`; it goes when the control's value changes.
 * Gives back the problems whose path has no control in the form, for the page to show above it.
 */
export function tellFields(form: AbstractControl, problems: readonly FieldProblem[]): FieldProblem[] {
  return problems.filter((problem) => {
    const control = form.get(problem.path);
    if (!control) return true;
    control.setErrors({ told: [problem.message, problem.remedy].filter(Boolean).join('. ') });
    control.markAsTouched();
    return false;
  });
}

/** What is wrong with a control, in words: the server's own, or those for Angular's validators. Empty while nothing is. */
export function wrongWith(control: AbstractControl): string {
  const { errors } = control;
  if (!errors) return '';
  if (typeof errors['told'] === 'string') return sentence(errors['told']);
  if (errors['required']) return 'Is needed.';
  if (errors['email']) return 'Is not a complete e-mail address.';
  if (errors['minlength']) return `Takes at least ${errors['minlength'].requiredLength} characters.`;
  if (errors['maxlength']) return `Takes at most ${errors['maxlength'].requiredLength} characters.`;
  return 'Cannot be taken as it is.';
}

function sentence(words: string): string {
  const begun = words.charAt(0).toUpperCase() + words.slice(1);
  return /[.!?]$/.test(begun) ? begun : `${begun}.`;
}
