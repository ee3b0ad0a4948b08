import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import type { Proposed } from '../../../../shared/contract/proposals';
import { FeatureKind, PartKind, partKindWords } from '../../../../shared/contract/vocabulary';
import { Field, Labelled } from '../labelled/labelled';
import { PhotosField } from '../new-photo/photos-field';
import type { EntryForm } from './entry-form';

/** The fields of a part, a revision or a feature. Stands inside a form of the page's own. */
@Component({
  selector: 'sl-hardware-entry',
  imports: [Field, Labelled, PhotosField, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @switch (kind()) {
      @case ('part') {
        @let part = form().controls.part.controls;
        <sl-labelled label="Maker" hint="A new name makes a new maker" [control]="part.maker">
          <input slField maxlength="120" list="known-makers" autocomplete="off" [formControl]="part.maker" />
        </sl-labelled>
        <datalist id="known-makers">
          @for (maker of makers(); track maker) {
            <option [value]="maker"></option>
          }
        </datalist>
        <sl-labelled label="Kind" [control]="part.partKind">
          <select slField [formControl]="part.partKind">
            @for (option of partKinds; track option.value) {
              <option [value]="option.value">{{ option.words }}</option>
            }
          </select>
        </sl-labelled>
        <sl-labelled label="Name" [control]="part.name">
          <input slField maxlength="120" autocomplete="off" [formControl]="part.name" />
        </sl-labelled>
        <sl-labelled label="About it" hint="What it is for; may stay empty" [control]="part.about">
          <textarea slField rows="3" maxlength="2000" [formControl]="part.about"></textarea>
        </sl-labelled>
      }
      @case ('revision') {
        @let revision = form().controls.revision.controls;
        <sl-labelled
          label="Label"
          hint="As the maker or owners call it: Rev E, v2"
          [control]="revision.label"
        >
          <input slField maxlength="60" autocomplete="off" [formControl]="revision.label" />
        </sl-labelled>
        <div class="days">
          <sl-labelled label="Sold from" [optional]="true" [control]="revision.soldFrom">
            <input slField type="date" [formControl]="revision.soldFrom" />
          </sl-labelled>
          <sl-labelled label="Sold until, without that day" [optional]="true" [control]="revision.soldTo">
            <input slField type="date" [formControl]="revision.soldTo" />
          </sl-labelled>
        </div>
        <sl-labelled
          label="How to tell it"
          hint="What can be seen or read on it and on no other"
          [control]="revision.howToTell"
        >
          <textarea slField rows="3" maxlength="2000" [formControl]="revision.howToTell"></textarea>
        </sl-labelled>
        <sl-labelled label="What changed" hint="Against the one before" [control]="revision.whatChanged">
          <textarea slField rows="3" maxlength="2000" [formControl]="revision.whatChanged"></textarea>
        </sl-labelled>
        @if (mostPhotos() || revision.photos.length) {
          <sl-photos-field
            legend="Photos that show how to tell it"
            captionLabel="What to look at"
            [photos]="revision.photos"
            [most]="mostPhotos()"
          />
        }
      }
      @case ('feature') {
        @let feature = form().controls.feature.controls;
        <sl-labelled label="Kind" [control]="feature.featureKind">
          <select slField [formControl]="feature.featureKind">
            @for (option of featureKinds; track option) {
              <option [value]="option">{{ option.replace('-', ' ') }}</option>
            }
          </select>
        </sl-labelled>
        <sl-labelled label="Name" hint="Raised lip round the shaft hole" [control]="feature.name">
          <input slField maxlength="120" autocomplete="off" [formControl]="feature.name" />
        </sl-labelled>
        <sl-labelled
          label="Made by"
          hint="Sets the spread to expect between parts"
          [control]="feature.process"
        >
          <select slField [formControl]="feature.process">
            <option value="machined">machining</option>
            <option value="printed">printing</option>
            <option value="cast">casting or moulding</option>
          </select>
        </sl-labelled>
      }
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 1rem;
      inline-size: 100%;
      max-inline-size: 34rem;
    }
    .days {
      display: flex;
      flex-wrap: wrap;
      gap: 1rem;
    }
    textarea {
      display: block;
      resize: vertical;
    }
  `,
})
export class HardwareEntry {
  readonly form = input.required<EntryForm>();
  readonly kind = input.required<Proposed['kind']>();
  /** Names that the maker's field offers. */
  readonly makers = input<readonly string[]>([]);
  /** How many photos of a revision can be added; with none, those that are there can still be taken out. */
  readonly mostPhotos = input(0);
  protected readonly partKinds = PartKind.options.map((value) => ({ value, words: partKindWords[value] }));
  protected readonly featureKinds = FeatureKind.options;
}
