import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import {
  hazardKindWords,
  signalWordMeans,
  type HazardKind,
  type SignalWord,
} from '../../../shared/contract/vocabulary';
import { Field, Labelled } from '../ui/labelled/labelled';

/** The fields of a caution's words; a form takes them in with whatever else it asks. */
export function cautionWordsControls() {
  const text = () =>
    new FormControl('', { nonNullable: true, validators: [Validators.required, Validators.minLength(3)] });
  return {
    signalWord: new FormControl<SignalWord>('caution', { nonNullable: true }),
    hazards: new FormControl<HazardKind[]>([], { nonNullable: true }),
    hazard: text(),
    consequence: text(),
    avoidance: text(),
  };
}
/** A form that has these fields, whatever else it has. */
export type CautionWordsForm = FormGroup & { readonly controls: ReturnType<typeof cautionWordsControls> };

/** What a caution says, in the order in which it is read, then its signal word and what it answers. */
@Component({
  selector: 'sl-caution-words-fields',
  imports: [Field, Labelled, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './caution-words-fields.html',
  styleUrl: './caution-words-fields.scss',
})
export class CautionWordsFields {
  readonly form = input.required<CautionWordsForm>();
  protected readonly signalWords = Object.entries(signalWordMeans) as [SignalWord, string][];
  protected readonly hazardKinds = Object.entries(hazardKindWords) as [HazardKind, string][];

  protected toggle(hazard: HazardKind): void {
    const { hazards } = this.form().controls;
    hazards.setValue(
      hazards.value.includes(hazard)
        ? hazards.value.filter((one) => one !== hazard)
        : [...hazards.value, hazard],
    );
    hazards.markAsDirty();
  }
}
