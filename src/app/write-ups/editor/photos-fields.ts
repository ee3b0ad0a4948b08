import { CdkDrag, CdkDragDrop, CdkDragHandle, CdkDropList } from '@angular/cdk/drag-drop';
import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatDialog } from '@angular/material/dialog';
import type { Photo } from '../../../../shared/contract/photos';
import { redrawWith } from '../../core/redraw-with';
import { Icon } from '../../ui/icon/icon';
import { Field, Labelled } from '../../ui/labelled/labelled';
import { PhotoCallouts } from '../../ui/photo-callouts/photo-callouts';
import { Undo } from '../../ui/undo/undo';
import type { PhotoToDrawOn } from './callout-dialog';
import { DraftEditing } from './draft-editing';
import { photoForm, type EditionForm, type PhotoForm } from './edition-form';
import { fieldId } from './field-names';
import { ItemTools } from './item-tools';
import { moveItem, moveItemTo } from './move-item';
import { PhotoComing } from './photo-coming';
import { PhotoQueue, notDescribed, type ComingPhoto } from './photo-queue';
import { PhotoSources } from './photo-sources';

const most = 24;

/** Photos of the write-up: those that are in, in their order, and those on their way, each at the place it will have. */
@Component({
  selector: 'sl-photos-fields',
  imports: [
    CdkDrag,
    CdkDragHandle,
    CdkDropList,
    Field,
    Icon,
    ItemTools,
    Labelled,
    PhotoCallouts,
    PhotoComing,
    PhotoSources,
    ReactiveFormsModule,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(window:beforeunload)': 'keepOpen($event)' },
  templateUrl: './photos-fields.html',
  styleUrls: ['./item-fields.scss', './photos-fields.scss'],
})
export class PhotosFields {
  readonly photos = input.required<EditionForm['controls']['photos']>();
  protected readonly editing = inject(DraftEditing);
  private readonly queue = inject(PhotoQueue);
  private readonly dialog = inject(MatDialog);
  private readonly undo = inject(Undo);
  private readonly destroyed = inject(DestroyRef);
  protected readonly fieldId = fieldId;
  private readonly coming = computed(() => {
    const draftId = this.editing.draft().id;
    return this.queue.coming().filter((one) => one.draftId === draftId);
  });
  protected readonly opening = signal(false);

  constructor() {
    redrawWith(this.photos);
    effect(() => {
      const stored = this.coming().filter((one) => one.progress.kind === 'stored');
      untracked(() => stored.forEach((one) => this.takeIn(one)));
    });
  }

  /** Those on their way that will stand behind this photo; null: before the first one. */
  protected comingBehind(photo: PhotoForm | null): ComingPhoto[] {
    const known = new Set<object>(this.photos().controls);
    return this.coming().filter(
      // What stood behind a photo that is gone by now goes to the end.
      ({ behind }) => (behind === null || known.has(behind) ? behind : this.last()) === photo,
    );
  }

  protected isFull(): boolean {
    return this.room() <= 0;
  }

  protected add(files: readonly File[]): void {
    const room = Math.max(this.room(), 0);
    this.queue.add(this.editing.draft().id, files.slice(0, room), this.last());
    if (files.length > room) this.undo.tell(`A write-up takes ${most} photos; the rest was left out.`);
  }

  protected move(index: number, by: -1 | 1): void {
    moveItem(this.photos(), index, by);
  }

  protected drop({ previousIndex, currentIndex }: CdkDragDrop<unknown>): void {
    moveItemTo(this.photos(), previousIndex, currentIndex);
  }

  protected remove(index: number): void {
    const photos = this.photos();
    const photo = photos.at(index);
    photos.removeAt(index);
    this.undo.offer('Photo taken out', () => photos.insert(Math.min(index, photos.length), photo));
  }

  protected drawn(use: PhotoForm): string {
    const count = use.controls.callouts.value.length;
    return count === 0 ? 'Draw on the photo' : `Drawn on it: ${count}`;
  }

  /** What draws is loaded when it is first wanted. */
  protected async draw(use: PhotoForm, photo: Photo): Promise<void> {
    this.opening.set(true);
    try {
      const { CalloutDialog } = await import('./callout-dialog');
      if (this.destroyed.destroyed) return;
      const open = this.dialog.open<unknown, PhotoToDrawOn>(CalloutDialog, {
        data: { photo, alt: use.controls.alt.value, control: use.controls.callouts },
        width: 'min(84rem, 100vw)',
        maxWidth: '100vw',
        height: 'min(58rem, 100dvh)',
        maxHeight: '100dvh',
        autoFocus: 'first-tabbable',
      });
      const stop = this.destroyed.onDestroy(() => open.close());
      open.afterClosed().subscribe(() => stop());
    } catch {
      this.undo.tell('What draws could not be loaded. Check the connection and try again.');
    } finally {
      this.opening.set(false);
    }
  }

  /** Asks before the page is closed on photos that are not stored. */
  protected keepOpen(event: BeforeUnloadEvent): void {
    if (this.queue.isBusy()) event.preventDefault();
  }

  private takeIn({ id, file, behind, progress }: ComingPhoto): void {
    if (progress.kind !== 'stored') return;
    const { photo } = progress;
    const photos = this.photos();
    const controls: readonly object[] = photos.controls;
    const place =
      behind === null ? 0 : controls.includes(behind) ? controls.indexOf(behind) + 1 : photos.length;
    // A photo sent before may have been described then.
    const alt = photo.alt === notDescribed(file) ? '' : photo.alt;
    const use = photoForm({ photoId: photo.id, alt, caption: '', callouts: [] });
    this.editing.keepPhotos([photo]);
    this.queue.take(id, use);
    photos.insert(place, use);
  }

  private last(): PhotoForm | null {
    return this.photos().controls.at(-1) ?? null;
  }

  private room(): number {
    return most - this.photos().length - this.coming().length;
  }
}
