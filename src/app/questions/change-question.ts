import { ChangeDetectionStrategy, Component, OnInit, inject, input, output } from '@angular/core';
import { FormArray, FormGroup, ReactiveFormsModule } from '@angular/forms';
import type { QuestionPage } from '../../../shared/contract/questions';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { readingForm, readingsIn, textControl, titleControl, type ReadingForm } from './question-form';
import { Questions } from './questions';
import { ReadingsFields } from './readings-fields';

/** The asker changes title, words or readings of a question. */
@Component({
  selector: 'sl-change-question',
  imports: [Field, Labelled, ProblemNote, ReactiveFormsModule, ReadingsFields],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="form" novalidate aria-label="Change the question" (ngSubmit)="send()">
      <sl-labelled label="Title" hint="What does not fit, in one line" [control]="form.controls.title">
        <input slField maxlength="140" formControlName="title" />
      </sl-labelled>
      <sl-labelled
        label="What happens"
        hint="Markdown, at least 20 characters"
        [control]="form.controls.text"
      >
        <textarea slField rows="8" maxlength="6000" formControlName="text"></textarea>
      </sl-labelled>
      <sl-readings-fields [readings]="form.controls.readings" />
      <sl-problem-note [problem]="sending.problem()" />
      <p>
        <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">Keep the change</button>
        <button type="button" class="sl-bare-button" (click)="left.emit()">Leave it as it was</button>
      </p>
    </form>
  `,
  styles: `
    form {
      display: grid;
      gap: 1.25rem;
      max-inline-size: var(--sl-measure);
      margin-block: 1rem;
    }
    p {
      display: flex;
      flex-wrap: wrap;
      gap: 0.5rem 1.5rem;
      margin: 0;
    }
  `,
})
export class ChangeQuestion implements OnInit {
  readonly question = input.required<QuestionPage>();
  readonly changed = output<QuestionPage>();
  readonly left = output();
  private readonly questions = inject(Questions);
  protected readonly sending = formSending();
  protected readonly form = new FormGroup({
    title: titleControl(),
    text: textControl(),
    readings: new FormArray<ReadingForm>([]),
  });

  ngOnInit(): void {
    const { title, text, readings } = this.question();
    this.form.patchValue({ title, text: text.source });
    for (const reading of readings) this.form.controls.readings.push(readingForm(reading));
  }

  protected send(): void {
    const { title, text } = this.form.getRawValue();
    this.sending.send(
      this.form,
      () =>
        this.questions.change(this.question().slug, {
          title,
          text,
          readings: readingsIn(this.form.controls.readings),
        }),
      (question) => this.changed.emit(question),
    );
  }
}
