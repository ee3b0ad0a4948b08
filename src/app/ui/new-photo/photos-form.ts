import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import type { Photo } from '../../../../shared/contract/photos';

export type AttachedPhotoForm = ReturnType<typeof attachedPhotoForm>;
export type PhotosForm = FormArray<AttachedPhotoForm>;

/** Photos to be sent with a form. */
export function photosForm(): PhotosForm {
  return new FormArray<AttachedPhotoForm>([]);
}

/** A stored photo; `captioned`: what to look at in it has to be said. */
export function attachedPhotoForm(photo: Photo, captioned: boolean, caption = '') {
  return new FormGroup({
    photo: new FormControl(photo, { nonNullable: true }),
    caption: new FormControl(caption, {
      nonNullable: true,
      validators: captioned ? [Validators.required, Validators.minLength(3), Validators.maxLength(200)] : [],
    }),
  });
}

export function photoIdsIn(photos: PhotosForm): number[] {
  return photos.getRawValue().map(({ photo }) => photo.id);
}
