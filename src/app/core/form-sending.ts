import { ElementRef, inject, signal } from '@angular/core';
import { AbstractControl, FormArray, FormGroup } from '@angular/forms';
import { finalize, type Observable } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from './api-problem';
import { tellFields } from './told-fields';

/**
 * The way of one form to the server: sent once at a time and only when its fields are in order; what the server says of
 * fields is shown at the fields, the rest in `problem`. What was typed is never touched.
 */
export class FormSending {
  readonly busy = signal(false);
  readonly problem = signal<Problem | null>(null);

  constructor(private readonly host: ElementRef<HTMLElement>) {}

  send<T>(form: AbstractControl, call: () => Observable<T>, done: (answer: T) => void): void {
    if (this.busy()) return;
    this.problem.set(null);
    checkAgain(form);
    form.markAllAsTouched();
    if (form.invalid) {
      this.focusFirst();
      return;
    }
    this.busy.set(true);
    call()
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({ next: done, error: (error: unknown) => this.failed(form, toApiProblem(error).problem) });
  }

  private failed(form: AbstractControl, problem: Problem): void {
    const unplaced = tellFields(form, problem.fields ?? []);
    const allPlaced = problem.fields !== undefined && problem.fields.length > 0 && unplaced.length === 0;
    this.problem.set(allPlaced ? null : { ...problem, fields: unplaced });
    if (unplaced.length < (problem.fields?.length ?? 0)) this.focusFirst();
  }

  private focusFirst(): void {
    // After the redraw, when the fields carry their new state.
    setTimeout(() => {
      const selector = 'input.ng-invalid, textarea.ng-invalid, select.ng-invalid';
      this.host.nativeElement.querySelector<HTMLElement>(selector)?.focus();
    });
  }
}

/** A form's way to the server; call it while constructing the component that holds the form. */
export function formSending(): FormSending {
  return new FormSending(inject<ElementRef<HTMLElement>>(ElementRef));
}

/** Runs the validators of every field anew, which drops what the server said the last time. */
function checkAgain(control: AbstractControl): void {
  if (control instanceof FormGroup || control instanceof FormArray)
    Object.values(control.controls).forEach(checkAgain);
  control.updateValueAndValidity({ emitEvent: false });
}
