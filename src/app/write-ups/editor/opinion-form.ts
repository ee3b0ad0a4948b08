import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, input, linkedSignal, type OnInit } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import type { Opinion } from '../../../../shared/contract/proposed-editions';
import { formSending } from '../../core/form-sending';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { ProposedEditions } from './proposed-editions';

/** Whether an author agrees with an edition that somebody proposes, and a line to the desk. It can be said anew. */
@Component({
  selector: 'sl-opinion-form',
  imports: [DatePipe, Field, Labelled, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="form" novalidate (ngSubmit)="send()">
      <h2>What you tell the desk</h2>
      @if (latest(); as said) {
        <p role="status">
          You said on {{ said.at | date: 'd MMM y, HH:mm' }}: you {{ said.agrees ? 'agree' : 'do not agree'
          }}{{ said.line ? ', “' + said.line + '”' : '' }}.
          @if (said.beforeHandingIn) {
            <strong>It was handed in again since; look once more.</strong>
          }
        </p>
      }
      <fieldset>
        <legend class="sl-visually-hidden">Do you agree?</legend>
        <label><input type="radio" formControlName="agrees" [value]="true" /> I agree</label>
        <label><input type="radio" formControlName="agrees" [value]="false" /> I do not agree</label>
      </fieldset>
      @if (form.controls.agrees.touched && form.controls.agrees.invalid) {
        <p class="refusal" role="alert">Choose one of the two.</p>
      }
      <sl-labelled
        label="Why, in a line"
        hint="Only the desk reads it; may stay empty"
        [control]="form.controls.line"
      >
        <input slField type="text" maxlength="300" formControlName="line" />
      </sl-labelled>
      @if (sending.problem(); as problem) {
        <sl-problem-note [problem]="problem" />
      }
      <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">Tell the desk</button>
    </form>
  `,
  styles: `
    form {
      display: grid;
      gap: 0.75rem;
      justify-items: start;
      border-block: 2px solid var(--sl-ink);
      padding-block: 0.75rem 1.25rem;
      margin-block: 1.5rem;
    }
    h2,
    p {
      margin: 0;
    }
    fieldset {
      display: flex;
      flex-wrap: wrap;
      gap: 0 1.5rem;
      margin: 0;
      padding: 0;
      border: 0;
    }
    label {
      display: flex;
      align-items: center;
      gap: 0.5rem;
      min-block-size: 2.75rem;
      cursor: pointer;
    }
    sl-labelled {
      inline-size: 100%;
    }
    .refusal {
      font-weight: 600;
    }
  `,
})
export class OpinionForm implements OnInit {
  readonly editionId = input.required<number>();
  /** What was said before, if anything. */
  readonly said = input.required<Opinion | null>();
  private readonly proposed = inject(ProposedEditions);
  protected readonly sending = formSending();
  protected readonly latest = linkedSignal(() => this.said());
  protected readonly form = new FormGroup({
    agrees: new FormControl<boolean | null>(null, { validators: [Validators.required] }),
    line: new FormControl('', { nonNullable: true }),
  });

  ngOnInit(): void {
    const said = this.said();
    if (said) this.form.setValue({ agrees: said.agrees, line: said.line });
  }

  protected send(): void {
    const { agrees, line } = this.form.getRawValue();
    this.sending.send(
      this.form,
      () => this.proposed.giveOpinion(this.editionId(), { agrees: agrees === true, line }),
      (opinion) => this.latest.set(opinion),
    );
  }
}
