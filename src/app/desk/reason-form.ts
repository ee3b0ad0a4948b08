import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { Observable } from 'rxjs';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';

/** A decision that carries a reason. */
@Component({
  selector: 'sl-reason-form',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="form" novalidate (ngSubmit)="submit()">
      <sl-labelled [label]="label()" [hint]="hint()" [control]="form.controls.reason">
        <textarea slField rows="3" maxlength="1000" formControlName="reason"></textarea>
      </sl-labelled>
      <sl-problem-note [problem]="sending.problem()" />
      <button
        type="submit"
        [class.sl-strong-button]="strong()"
        [class.sl-plain-button]="!strong()"
        [disabled]="sending.busy()"
      >
        {{ verb() }}
      </button>
    </form>
  `,
  styles: `
    form {
      display: grid;
      gap: 0.75rem;
      justify-items: start;
      max-inline-size: 34rem;
      padding-block-end: 1.5rem;
    }
    sl-labelled {
      inline-size: 100%;
    }
    textarea {
      display: block;
      resize: vertical;
    }
  `,
})
export class ReasonForm {
  readonly label = input.required<string>();
  readonly hint = input.required<string>();
  /** What the button does: "Take it down". */
  readonly verb = input.required<string>();
  readonly strong = input(false);
  readonly send = input.required<(reason: string) => Observable<unknown>>();
  readonly done = output();
  protected readonly sending = formSending();
  protected readonly form = new FormGroup({
    reason: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
  });

  protected submit(): void {
    this.sending.send(
      this.form,
      () => this.send()(this.form.controls.reason.value),
      () => this.done.emit(),
    );
  }
}
