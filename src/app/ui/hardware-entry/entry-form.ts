import { FormControl, FormGroup, Validators } from '@angular/forms';
import type { Proposal, Proposed } from '../../../../shared/contract/proposals';
import type { FeatureKind, PartKind } from '../../../../shared/contract/vocabulary';
import { attachedPhotoForm, photosForm } from '../new-photo/photos-form';

const needed = (value = ''): FormControl<string> =>
  new FormControl(value, { nonNullable: true, validators: [Validators.required] });
const free = (value = ''): FormControl<string> => new FormControl(value, { nonNullable: true });

/** Fields of all kinds of entry; only those of `kind` are sent. */
export function entryForm() {
  return new FormGroup({
    part: new FormGroup({
      maker: needed(),
      partKind: new FormControl<PartKind>('motor-bracket', { nonNullable: true }),
      name: needed(),
      about: free(),
    }),
    revision: new FormGroup({
      label: needed(),
      soldFrom: free(),
      soldTo: free(),
      howToTell: free(),
      whatChanged: free(),
      photos: photosForm(),
    }),
    feature: new FormGroup({
      featureKind: new FormControl<FeatureKind>('boss', { nonNullable: true }),
      name: needed(),
      process: new FormControl<'machined' | 'printed' | 'cast'>('machined', { nonNullable: true }),
    }),
  });
}
export type EntryForm = ReturnType<typeof entryForm>;

/** What the fields of that kind say, as the API takes it; an empty day is one that is not known. */
export function entryOf(form: EntryForm, kind: Proposed['kind']): Proposed {
  if (kind === 'part') return { kind, ...form.controls.part.getRawValue() };
  if (kind === 'feature') return { kind, ...form.controls.feature.getRawValue() };
  const { photos, ...revision } = form.controls.revision.getRawValue();
  return {
    kind,
    ...revision,
    soldFrom: revision.soldFrom || null,
    soldTo: revision.soldTo || null,
    photos: photos.map(({ photo, caption }) => ({ photoId: photo.id, caption })),
  };
}

/** Fills the fields with a proposal, its photos as far as they are still there. */
export function fillEntry(form: EntryForm, { entry, photos }: Pick<Proposal, 'entry' | 'photos'>): void {
  if (entry.kind === 'part') form.controls.part.patchValue(entry);
  else if (entry.kind === 'feature') form.controls.feature.patchValue(entry);
  else {
    const { label, soldFrom, soldTo, howToTell, whatChanged } = entry;
    const fields = form.controls.revision;
    fields.patchValue({ label, soldFrom: soldFrom ?? '', soldTo: soldTo ?? '', howToTell, whatChanged });
    for (const { photo, caption } of photos)
      fields.controls.photos.push(attachedPhotoForm(photo, true, caption));
  }
}
