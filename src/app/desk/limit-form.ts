import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { longestTermDays, type LimitKind, type MemberPage } from '../../../shared/contract/members';
import { formSending } from '../core/form-sending';
import { Confirm } from '../ui/confirm/confirm';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Members } from './members';

/** Limits or blocks a member for a term, with the reason that they read; what they wrote stays or goes. */
@Component({
  selector: 'sl-limit-form',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="form" novalidate (ngSubmit)="set()">
      <fieldset>
        <legend>Set</legend>
        <label>
          <input type="radio" formControlName="kind" value="limited" />
          <span
            ><strong>limited</strong>
            <span class="sl-quiet">reads and keeps a bench, does not post</span></span
          >
        </label>
        <label>
          <input type="radio" formControlName="kind" value="blocked" />
          <span
            ><strong>blocked</strong>
            <span class="sl-quiet">is signed out at once and cannot sign in</span></span
          >
        </label>
      </fieldset>
      <fieldset>
        <legend>For how long</legend>
        <label>
          <input type="radio" formControlName="term" value="days" />
          <span>a number of days</span>
        </label>
        <label>
          <input type="radio" formControlName="term" value="lifted" />
          <span>until it is lifted</span>
        </label>
      </fieldset>
      @if (form.controls.term.value === 'days') {
        <sl-labelled label="Days" hint="Runs out by itself" [control]="form.controls.days">
          <input
            slField
            class="days"
            type="number"
            min="1"
            [max]="longest"
            inputmode="numeric"
            formControlName="days"
          />
        </sl-labelled>
      }
      <sl-labelled
        label="Reason"
        hint="They read it, by mail and where they are refused"
        [control]="form.controls.reason"
      >
        <textarea slField rows="4" maxlength="1000" formControlName="reason"></textarea>
      </sl-labelled>
      <fieldset>
        <legend>What they wrote</legend>
        <label>
          <input type="radio" formControlName="works" value="stay" />
          <span><strong>stays</strong></span>
        </label>
        <label>
          <input type="radio" formControlName="works" value="go" />
          <span
            ><strong>goes</strong>
            <span class="sl-quiet"
              >off the pages, with write-ups that nobody else wrote; nothing is deleted, and lifting can put
              it back</span
            ></span
          >
        </label>
      </fieldset>
      @if (sending.problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      <button type="submit" class="sl-plain-button" [disabled]="sending.busy()">Set it</button>
    </form>
  `,
  styles: `
    form {
      display: grid;
      gap: 0.75rem;
      justify-items: start;
      max-inline-size: var(--sl-measure);
    }
    fieldset {
      min-inline-size: 0;
      margin: 0;
      padding: 0;
      border: 0;
    }
    legend {
      padding: 0;
      font-weight: 600;
    }
    label {
      display: flex;
      align-items: baseline;
      gap: 0.6rem;
      padding-block: 0.5rem;
      cursor: pointer;
    }
    label strong {
      margin-inline-end: 0.35em;
    }
    sl-labelled {
      inline-size: 100%;
    }
    .days {
      max-inline-size: 8rem;
    }
    textarea {
      display: block;
      resize: vertical;
    }
  `,
})
export class LimitForm {
  readonly memberId = input.required<number>();
  readonly name = input.required<string>();
  readonly done = output<MemberPage>();
  private readonly members = inject(Members);
  private readonly confirm = inject(Confirm);
  protected readonly longest = longestTermDays;
  protected readonly sending = formSending();
  protected readonly form = new FormGroup({
    kind: new FormControl<LimitKind>('limited', { nonNullable: true }),
    term: new FormControl<'days' | 'lifted'>('days', { nonNullable: true }),
    days: new FormControl<number | null>(7, [
      Validators.required,
      Validators.min(1),
      Validators.max(longestTermDays),
    ]),
    reason: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(10)],
    }),
    works: new FormControl<'stay' | 'go'>('stay', { nonNullable: true }),
  });

  protected async set(): Promise<void> {
    const { term } = this.form.getRawValue();
    const { days } = this.form.controls;
    if (term === 'lifted') days.disable();
    else days.enable();
    if (this.form.valid && !(await this.sure())) return;
    this.sending.send(
      this.form,
      () => this.members.limit(this.memberId(), this.wish()),
      (member) => this.done.emit(member),
    );
  }

  private wish() {
    const { kind, term, days, reason, works } = this.form.getRawValue();
    return { kind, reason, works, days: term === 'lifted' ? null : days };
  }

  private sure(): Promise<boolean> {
    const { kind, works } = this.wish();
    const means = kind === 'limited' ? 'cannot post' : 'is signed out at once and cannot sign in';
    return this.confirm.ask({
      title: `${kind === 'limited' ? 'Limit' : 'Block'} ${this.name()}?`,
      text: `${this.name()} ${means}, and is told by mail. ${works === 'go' ? 'What they wrote goes off the pages.' : 'What they wrote stays.'}`,
      yes: kind === 'limited' ? 'Limit' : 'Block',
    });
  }
}
