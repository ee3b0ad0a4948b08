import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { MemberLimit, MemberPage } from '../../../shared/contract/members';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Members } from './members';

/** Lifts a limit before its term, or puts back what went with one that has run out. */
@Component({
  selector: 'sl-lift-form',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="form" novalidate (ngSubmit)="lift()">
      <h3>{{ limit().holds ? 'Lift it' : 'Put back what went with it' }}</h3>
      <sl-labelled label="Reason" hint="They read it, by mail too" [control]="form.controls.reason">
        <textarea slField rows="3" maxlength="1000" formControlName="reason"></textarea>
      </sl-labelled>
      @if (limit().worksGo && limit().holds) {
        <label>
          <input type="checkbox" formControlName="putBack" />
          <span>put back what was taken down with it</span>
        </label>
      }
      @if (sending.problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      <button type="submit" class="sl-plain-button" [disabled]="sending.busy()">
        {{ limit().holds ? 'Lift it' : 'Put it back' }}
      </button>
    </form>
  `,
  styles: `
    form {
      display: grid;
      gap: 0.75rem;
      justify-items: start;
      max-inline-size: var(--sl-measure);
    }
    sl-labelled {
      inline-size: 100%;
    }
    h3 {
      margin-block-end: 0;
    }
    label {
      display: flex;
      align-items: center;
      gap: 0.6rem;
      min-block-size: 2.75rem;
      cursor: pointer;
    }
    textarea {
      display: block;
      resize: vertical;
    }
  `,
})
export class LiftForm {
  readonly limit = input.required<MemberLimit>();
  readonly done = output<MemberPage>();
  private readonly members = inject(Members);
  protected readonly sending = formSending();
  protected readonly form = new FormGroup({
    reason: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
    putBack: new FormControl(true, { nonNullable: true }),
  });

  protected lift(): void {
    const { reason, putBack } = this.form.getRawValue();
    const works = this.limit().worksGo && putBack ? 'put-back' : 'leave';
    this.sending.send(
      this.form,
      () => this.members.lift(this.limit().id, { reason, works }),
      (member) => this.done.emit(member),
    );
  }
}
