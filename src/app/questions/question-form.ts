import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import type { Instrument, ReadingUnit } from '../../../shared/contract/vocabulary';
import type { QuestionReading } from '../../../shared/contract/questions';
import type { WorksheetRecord } from '../../../shared/contract/worksheet';
import { attachedPhotoForm, photosForm } from '../ui/new-photo/photos-form';

export type ReadingForm = ReturnType<typeof readingForm>;
export type QuestionForm = ReturnType<typeof questionForm>;

/** One reading; a figure that is missing or no number is refused by the server, which names it. */
export function readingForm(reading?: QuestionReading) {
  return new FormGroup({
    dimension: new FormControl(reading?.dimension ?? '', {
      nonNullable: true,
      validators: [Validators.required],
    }),
    value: new FormControl<number | null>(reading?.value ?? null, Validators.required),
    unit: new FormControl<ReadingUnit>(reading?.unit ?? 'mm', { nonNullable: true }),
    instrument: new FormControl<Instrument>(reading?.instrument ?? 'caliper', { nonNullable: true }),
  });
}

/** The readings as the API takes them; call it on valid forms only. */
export function readingsIn(readings: FormArray<ReadingForm>): QuestionReading[] {
  return readings.getRawValue().map((reading) => ({ ...reading, value: reading.value! }));
}

export function titleControl(title = ''): FormControl<string> {
  return new FormControl(title, {
    nonNullable: true,
    validators: [Validators.required, Validators.minLength(8), Validators.maxLength(140)],
  });
}

export function textControl(text = ''): FormControl<string> {
  return new FormControl(text, {
    nonNullable: true,
    validators: [Validators.required, Validators.minLength(20), Validators.maxLength(6000)],
  });
}

export function questionForm() {
  return new FormGroup({
    title: titleControl(),
    text: textControl(),
    worksheet: new FormControl<WorksheetRecord | null>(null),
    readings: new FormArray<ReadingForm>([]),
    photos: photosForm(),
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
    for (const { photo } of kept.photos ?? []) form.controls.photos.push(attachedPhotoForm(photo, false));
    form.patchValue(kept);
  } catch {
    forgetTyped();
  }
}
