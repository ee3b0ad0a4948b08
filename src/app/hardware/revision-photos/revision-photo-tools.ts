import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { mostRevisionPhotos, type Revision, type RevisionPhoto } from '../../../../shared/contract/hardware';
import type { Photo } from '../../../../shared/contract/photos';
import type { Problem } from '../../../../shared/contract/problem';
import { toApiProblem } from '../../core/api-problem';
import { formSending } from '../../core/form-sending';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { NewPhoto } from '../../ui/new-photo/new-photo';
import { PhotoChoice } from '../../ui/new-photo/photo-choice';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Hardware } from '../hardware';

/** What a moderator does with the photos of a revision: adds one with a caption, or takes one away. */
@Component({
  selector: 'sl-revision-photo-tools',
  imports: [Field, Labelled, NewPhoto, PhotoChoice, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'sl-off-paper' },
  template: `
    @for (item of revision().photos; track item.photo.id) {
      <button type="button" class="sl-bare-button" (click)="remove(item)">
        Take away “{{ item.caption }}”
      </button>
    }
    @if (storedPhoto(); as photo) {
      <form [formGroup]="form" novalidate (ngSubmit)="show(photo)">
        <sl-labelled label="What to look at" [hint]="photo.alt" [control]="form.controls.caption">
          <input slField formControlName="caption" maxlength="200" autocomplete="off" />
        </sl-labelled>
        @if (sending.problem(); as problem) {
          <sl-problem-note [problem]="problem" />
        }
        <div>
          <button type="submit" class="sl-strong-button" [disabled]="sending.busy()">
            Show it at {{ revision().label }}
          </button>
          <button type="button" class="sl-bare-button" (click)="storedPhoto.set(null)">Leave it out</button>
        </div>
      </form>
    } @else if (file(); as file) {
      <sl-new-photo [file]="file" (stored)="stored($event)" (forgotten)="forget()" />
    } @else if (revision().photos.length < most) {
      <sl-photo-choice [label]="'Add a photo to ' + revision().label" (chosen)="file.set($event)" />
    }
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" />
    }
  `,
  styles: `
    :host,
    form {
      display: grid;
      gap: 0.75rem;
      justify-items: start;
      margin-block-start: 0.5rem;
    }
    .sl-bare-button {
      text-align: start;
    }
  `,
})
export class RevisionPhotoTools {
  readonly revision = input.required<Revision>();
  /** The photos that the revision has now. */
  readonly changed = output<RevisionPhoto[]>();

  private readonly hardware = inject(Hardware);
  protected readonly most = mostRevisionPhotos;
  protected readonly sending = formSending();
  protected readonly problem = signal<Problem | null>(null);
  protected readonly file = signal<File | null>(null);
  /** Stored, but not shown at the revision yet. */
  protected readonly storedPhoto = signal<Photo | null>(null);
  protected readonly form = new FormGroup({
    caption: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(3), Validators.maxLength(200)],
    }),
  });

  protected stored(photo: Photo): void {
    this.file.set(null);
    this.form.reset();
    this.storedPhoto.set(photo);
  }

  protected forget(): void {
    this.file.set(null);
  }

  protected show(photo: Photo): void {
    const { id, photos } = this.revision();
    this.sending.send(
      this.form,
      () =>
        this.hardware.addRevisionPhoto(id, { photoId: photo.id, caption: this.form.controls.caption.value }),
      (added) => {
        this.storedPhoto.set(null);
        this.changed.emit([...photos, added]);
      },
    );
  }

  protected remove(item: RevisionPhoto): void {
    const { id, photos } = this.revision();
    this.problem.set(null);
    this.hardware.removeRevisionPhoto(id, item.photo.id).subscribe({
      next: () => this.changed.emit(photos.filter((one) => one !== item)),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }
}
