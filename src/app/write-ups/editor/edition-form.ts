import { FormArray, FormControl, FormGroup } from '@angular/forms';
import type { Callout } from '../../../../shared/contract/callouts';
import type {
  Acceptance,
  Fix,
  JointEntry,
  JointSide,
  PhotoUse,
  Reading,
  RevisionMark,
  Step,
} from '../../../../shared/contract/edition-content';
import type {
  Afterwards,
  FixKind,
  Instrument,
  Permanence,
  ReadingUnit,
} from '../../../../shared/contract/vocabulary';
import type { WorksheetRecord } from '../../../../shared/contract/worksheet';
import type { EditionText } from '../../../../shared/editions/edition-text';

export const editionForm = (text: EditionText) =>
  new FormGroup({
    title: words(text.content.title),
    summary: words(text.content.summary),
    joints: new FormArray(text.content.joints.map(jointForm)),
    symptoms: value<string[]>(text.content.symptoms),
    noticed: words(text.content.noticed),
    cause: words(text.content.cause),
    readings: new FormArray(text.content.readings.map(readingForm)),
    fixes: new FormArray(text.content.fixes.map(fixForm)),
    photos: new FormArray(text.content.photos.map(photoForm)),
    sources: words(text.content.sources),
    changeNote: words(text.changeNote),
  });

export const sideForm = (side: JointSide) =>
  new FormGroup({
    partId: value<number | null>(side.partId),
    feature: words(side.feature),
    revisions: value<RevisionMark[]>(side.revisions),
  });

export const jointForm = (joint: JointEntry) => new FormGroup({ a: sideForm(joint.a), b: sideForm(joint.b) });

export const readingForm = (reading: Reading) =>
  new FormGroup({
    key: words(reading.key),
    revisionId: value<number | null>(reading.revisionId),
    dimension: words(reading.dimension),
    value: value<number | null>(reading.value),
    unit: value<ReadingUnit>(reading.unit),
    instrument: value<Instrument>(reading.instrument),
    uncertainty: value<number | null>(reading.uncertainty),
  });

export const stepForm = (step: Step) =>
  new FormGroup({
    key: words(step.key),
    text: words(step.text),
    photoId: value<number | null>(step.photoId),
  });

/** While it is being typed an acceptance figure may lack its quantity or its value; it is kept by the form until it has both. */
export const acceptanceForm = (acceptance: Acceptance | null) =>
  new FormGroup({
    quantity: words(acceptance?.quantity ?? ''),
    comparison: value<Acceptance['comparison']>(acceptance?.comparison ?? 'at-most'),
    value: value<number | null>(acceptance?.value ?? null),
    unit: value<ReadingUnit>(acceptance?.unit ?? 'mm'),
  });

export const fixForm = (fix: Fix) =>
  new FormGroup({
    key: words(fix.key),
    title: words(fix.title),
    kind: value<FixKind | null>(fix.kind),
    permanence: value<Permanence | null>(fix.permanence),
    why: words(fix.why),
    tools: value<string[]>(fix.tools),
    materials: value<string[]>(fix.materials),
    steps: new FormArray(fix.steps.map(stepForm)),
    revisionIds: value<number[]>(fix.revisionIds),
    afterwards: value<Afterwards[]>(fix.afterwards),
    afterwardsNote: words(fix.afterwardsNote),
    acceptance: acceptanceForm(fix.acceptance),
    worksheet: value<WorksheetRecord | null>(fix.worksheet ?? null),
  });

export const photoForm = (photo: PhotoUse) =>
  new FormGroup({
    photoId: new FormControl(photo.photoId, { nonNullable: true }),
    alt: words(photo.alt),
    caption: words(photo.caption),
    callouts: value<Callout[]>(photo.callouts ?? []),
  });

export type EditionForm = ReturnType<typeof editionForm>;
export type JointForm = ReturnType<typeof jointForm>;
export type SideForm = ReturnType<typeof sideForm>;
export type ReadingForm = ReturnType<typeof readingForm>;
export type FixForm = ReturnType<typeof fixForm>;
export type StepForm = ReturnType<typeof stepForm>;
export type PhotoForm = ReturnType<typeof photoForm>;

/** The text as the form holds it, in the shape that is saved. */
export function textOf(form: EditionForm): EditionText {
  const { changeNote, fixes, ...rest } = form.getRawValue();
  return {
    content: {
      ...rest,
      fixes: fixes.map(({ acceptance, ...fix }) => ({ ...fix, acceptance: completeAcceptance(acceptance) })),
    },
    changeNote,
  };
}

function completeAcceptance(typed: Omit<Acceptance, 'value'> & { value: number | null }): Acceptance | null {
  return typed.value === null || typed.quantity.trim() === '' ? null : { ...typed, value: typed.value };
}

function words(initial: string): FormControl<string> {
  return new FormControl(initial, { nonNullable: true });
}

function value<T>(initial: T): FormControl<T> {
  return new FormControl(initial, { nonNullable: true }) as FormControl<T>;
}
