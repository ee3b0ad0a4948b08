import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import type { Instrument, ReadingUnit } from '../../../shared/contract/vocabulary';
import type { WorksheetRecord } from '../../../shared/contract/worksheet';

export type ReadingForm = ReturnType<typeof readingForm>;
export type QuestionForm = ReturnType<typeof questionForm>;

/** One reading; a figure that is missing or no number is refused by the server, which names it. */
export function readingForm() {
  return new FormGroup({
    dimension: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
    value: new FormControl<number | null>(null, Validators.required),
    unit: new FormControl<ReadingUnit>('mm', { nonNullable: true }),
    instrument: new FormControl<Instrument>('caliper', { nonNullable: true }),
  });
}

export function questionForm() {
  return new FormGroup({
    title: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(8), Validators.maxLength(140)],
    }),
    text: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.minLength(20), Validators.maxLength(6000)],
    }),
    worksheet: new FormControl<WorksheetRecord | null>(null),
    readings: new FormArray<ReadingForm>([]),
    symptoms: new FormControl<readonly string[]>([], { nonNullable: true }),
  });
}

const place = 'shimlore-question';

/** Keeps what is typed for as long as the tab is open; a browser that refuses to store keeps nothing. */
export function keepTyped(form: QuestionForm): void {
  try {
    sessionStorage.setItem(place, JSON.stringify(form.getRawValue()));
  } catch {
    return;
  }
}

export function forgetTyped(): void {
  try {
    sessionStorage.removeItem(place);
  } catch {
    return;
  }
}

/** Fills the form with what was typed before in this tab. */
export function restoreTyped(form: QuestionForm): void {
  try {
    const kept = JSON.parse(sessionStorage.getItem(place) ?? 'null') as Partial<
      ReturnType<QuestionForm['getRawValue']>
    > | null;
    if (!kept) return;
    for (let row = 0; row < (kept.readings?.length ?? 0); row += 1)
      form.controls.readings.push(readingForm());
    form.patchValue(kept);
  } catch {
    forgetTyped();
  }
}
