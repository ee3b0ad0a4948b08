import { ChangeDetectionStrategy, Component, effect, inject, input, signal, untracked } from '@angular/core';
import type { ValidatorFn } from '@angular/forms';
import { ReactiveFormsModule } from '@angular/forms';
import type { Photo } from '../../../../shared/contract/photos';
import { redrawWith } from '../../core/redraw-with';
import { wrongWith } from '../../core/told-fields';
import { Field, Labelled } from '../labelled/labelled';
import { PhotoView } from '../photo/photo';
import { Undo } from '../undo/undo';
import { NewPhoto } from './new-photo';
import { PhotoChoice } from './photo-choice';
import { attachedPhotoForm, type PhotosForm } from './photos-form';

/**
 * Photos that go with a form: each is stored first, with what it shows, and can be taken out again. While one is on its
 * way the form is not sent, so that none is left behind.
 */
@Component({
  selector: 'sl-photos-field',
  imports: [Field, Labelled, NewPhoto, PhotoChoice, PhotoView, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset>
      <legend>{{ legend() }}</legend>
      @if (photos().controls.length) {
        <ul class="sl-plain-list">
          @for (item of photos().controls; track item) {
            <li>
              <sl-photo [photo]="item.controls.photo.value" sizes="11rem" />
              <div>
                @if (captionLabel(); as label) {
                  <sl-labelled
                    [label]="label"
                    [hint]="item.controls.photo.value.alt"
                    [control]="item.controls.caption"
                  >
                    <input
                      slField
                      maxlength="200"
                      autocomplete="off"
                      [formControl]="item.controls.caption"
                      (keydown.enter)="$event.preventDefault()"
                    />
                  </sl-labelled>
                } @else {
                  <p>{{ item.controls.photo.value.alt }}</p>
                }
                <button type="button" class="sl-bare-button" (click)="takeOut($index)">
                  Take it out<span class="sl-visually-hidden">: {{ item.controls.photo.value.alt }}</span>
                </button>
              </div>
            </li>
          }
        </ul>
      }
      @if (file(); as file) {
        <sl-new-photo [file]="file" (stored)="stored($event)" (forgotten)="choose(null)" />
      } @else if (photos().controls.length < most()) {
        <sl-photo-choice
          [label]="photos().controls.length ? 'Add another' : 'Add a photo'"
          (chosen)="choose($event)"
        />
      }
      @if (wrong(); as wrong) {
        <p class="wrong" role="alert">{{ wrong }}</p>
      }
    </fieldset>
  `,
  styles: `
    :host {
      display: block;
      inline-size: 100%;
    }
    fieldset {
      display: grid;
      gap: 0.75rem;
      justify-items: start;
      margin: 0;
      padding: 0;
      border: 0;
      min-inline-size: 0;
    }
    legend {
      padding: 0;
      margin-block-end: 0.4rem;
      font-weight: 600;
    }
    ul,
    sl-new-photo {
      inline-size: 100%;
    }
    li {
      display: grid;
      grid-template-columns: minmax(5rem, 11rem) minmax(0, 1fr);
      gap: 1rem;
      padding-block: 0.6rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    p {
      margin: 0;
    }
    .wrong {
      font-weight: 600;
      color: var(--sl-danger);
    }
  `,
})
export class PhotosField {
  readonly photos = input.required<PhotosForm>();
  readonly legend = input('Photos');
  readonly most = input.required<number>();
  /** Name of the field for what to look at; where it is empty, no such words are asked for. */
  readonly captionLabel = input('');
  private readonly undo = inject(Undo);
  /** Chosen, but not stored yet. */
  protected readonly file = signal<File | null>(null);
  private readonly noneOnItsWay: ValidatorFn = () =>
    untracked(this.file) ? { told: 'store the photo first, or leave it out' } : null;

  constructor() {
    redrawWith(this.photos);
    effect((leave) => {
      const photos = this.photos();
      untracked(() => photos.addValidators(this.noneOnItsWay));
      leave(() => photos.removeValidators(this.noneOnItsWay));
    });
  }

  protected wrong(): string {
    return this.photos().touched ? wrongWith(this.photos()) : '';
  }

  protected choose(file: File | null): void {
    this.file.set(file);
    this.photos().updateValueAndValidity();
  }

  protected stored(photo: Photo): void {
    const there = this.photos().controls.some((item) => item.controls.photo.value.id === photo.id);
    if (!there) this.photos().push(attachedPhotoForm(photo, this.captionLabel() !== ''));
    this.choose(null);
  }

  protected takeOut(index: number): void {
    const [photos, item] = [this.photos(), this.photos().at(index)];
    photos.removeAt(index);
    this.undo.offer('Photo taken out', () => photos.insert(index, item));
  }
}
