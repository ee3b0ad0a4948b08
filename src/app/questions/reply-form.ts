import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { mostQuestionPhotos, type Reply } from '../../../shared/contract/questions';
import type { WorksheetRecord } from '../../../shared/contract/worksheet';
import { formSending } from '../core/form-sending';
import { Field, Labelled } from '../ui/labelled/labelled';
import { PhotosField } from '../ui/new-photo/photos-field';
import { photoIdsIn, photosForm } from '../ui/new-photo/photos-form';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { WorksheetField } from '../ui/worksheet/worksheet-field';
import { Questions } from './questions';

/** A reply with, where there is one, the link of a worksheet. */
@Component({
  selector: 'sl-reply-form',
  imports: [Field, Labelled, PhotosField, ProblemNote, ReactiveFormsModule, WorksheetField],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form [formGroup]="form" novalidate aria-label="Reply" (ngSubmit)="send()">
      <sl-labelled label="Your reply" [control]="form.controls.text">
        <textarea slField rows="5" maxlength="4000" formControlName="text"></textarea>
      </sl-labelled>
      <sl-photos-field [photos]="form.controls.photos" [most]="mostPhotos" />
      <sl-worksheet-field
        fieldId="reply-worksheet"
        why="If you worked something out, paste the link of the worksheet: others run it with their own readings."
        [control]="form.controls.worksheet"
      />
      <sl-problem-note [problem]="sending.problem()" />
      <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">Reply</button>
    </form>
  `,
  styles: `
    form {
      display: grid;
      gap: 1rem;
      justify-items: start;
      margin-block-start: 1.5rem;
      max-inline-size: var(--sl-measure);
    }
    sl-labelled {
      inline-size: 100%;
    }
  `,
})
export class ReplyForm {
  readonly slug = input.required<string>();
  readonly replied = output<Reply>();
  private readonly questions = inject(Questions);
  protected readonly sending = formSending();
  protected readonly mostPhotos = mostQuestionPhotos;
  protected readonly form = new FormGroup({
    text: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
    worksheet: new FormControl<WorksheetRecord | null>(null),
    photos: photosForm(),
  });

  protected send(): void {
    const { text, worksheet } = this.form.getRawValue();
    this.sending.send(
      this.form,
      () =>
        this.questions.reply(this.slug(), { text, worksheet, photos: photoIdsIn(this.form.controls.photos) }),
      (reply) => {
        this.form.reset();
        this.form.controls.photos.clear();
        this.replied.emit(reply);
      },
    );
  }
}
