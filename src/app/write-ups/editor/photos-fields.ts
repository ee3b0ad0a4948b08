import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import type { Photo } from '../../../../shared/contract/photos';
import { redrawWith } from '../../core/redraw-with';
import { Icon } from '../../ui/icon/icon';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { NewPhoto } from '../../ui/new-photo/new-photo';
import { PhotoView } from '../../ui/photo/photo';
import { Undo } from '../../ui/undo/undo';
import { DraftEditing } from './draft-editing';
import { photoForm, type EditionForm } from './edition-form';
import { fieldId } from './field-names';
import { ItemTools } from './item-tools';
import { moveItem } from './move-item';

const most = 24;

/** Photos of the write-up; new ones are dropped here, pasted, chosen or taken with the phone. */
@Component({
  selector: 'sl-photos-fields',
  imports: [Field, Icon, ItemTools, Labelled, NewPhoto, PhotoView, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:paste)': 'takePasted($event)' },
  templateUrl: './photos-fields.html',
  styleUrls: ['./item-fields.scss', './photos-fields.scss'],
})
export class PhotosFields {
  readonly photos = input.required<EditionForm['controls']['photos']>();
  protected readonly editing = inject(DraftEditing);
  private readonly undo = inject(Undo);
  protected readonly fieldId = fieldId;
  /** Files that are not stored yet. */
  protected readonly waiting = signal<readonly File[]>([]);
  protected readonly over = signal(false);

  constructor() {
    redrawWith(this.photos);
  }

  protected isFull(): boolean {
    return this.photos().length + this.waiting().length >= most;
  }

  protected takeChosen(event: Event): void {
    const field = event.target as HTMLInputElement;
    this.take([...(field.files ?? [])]);
    field.value = '';
  }

  protected takeDropped(event: DragEvent): void {
    event.preventDefault();
    this.over.set(false);
    this.take([...(event.dataTransfer?.files ?? [])]);
  }

  protected takePasted(event: ClipboardEvent): void {
    const images = [...(event.clipboardData?.files ?? [])].filter((file) => file.type.startsWith('image/'));
    if (images.length === 0) return;
    event.preventDefault();
    this.take(images);
  }

  protected allow(event: DragEvent): void {
    event.preventDefault();
    this.over.set(true);
  }

  protected stored(file: File, photo: Photo): void {
    this.forget(file);
    this.editing.keepPhotos([photo]);
    this.photos().push(photoForm({ photoId: photo.id, alt: photo.alt, caption: '' }));
  }

  protected forget(file: File): void {
    this.waiting.update((files) => files.filter((one) => one !== file));
  }

  protected move(index: number, by: -1 | 1): void {
    moveItem(this.photos(), index, by);
  }

  protected remove(index: number): void {
    const photos = this.photos();
    const photo = photos.at(index);
    photos.removeAt(index);
    this.undo.offer('Photo taken out', () => photos.insert(Math.min(index, photos.length), photo));
  }

  private take(files: readonly File[]): void {
    const room = most - this.photos().length - this.waiting().length;
    this.waiting.update((waiting) => [...waiting, ...files.slice(0, Math.max(room, 0))]);
    if (files.length > room) this.undo.tell(`A write-up takes ${most} photos; the rest was left out.`);
  }
}
