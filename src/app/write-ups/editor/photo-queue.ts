import { Injectable, computed, inject, signal } from '@angular/core';
import type { Subscription } from 'rxjs';
import { photoLimits, type Photo } from '../../../../shared/contract/photos';
import type { Problem } from '../../../../shared/contract/problem';
import { toApiProblem } from '../../core/api-problem';
import { PhotoUpload } from '../../ui/new-photo/photo-upload';
import { tooLarge } from '../../ui/new-photo/too-large';

/** Photos sent at once: more only make each slower on a phone's connection, and the server takes two in turn. */
const atOnce = 2;

export type PhotoProgress =
  | { readonly kind: 'waiting' }
  | {
      readonly kind: 'sending';
      /** 0 to 1; null where the browser cannot tell. */ readonly share: number | null;
    }
  | { readonly kind: 'failed'; readonly problem: Problem }
  | { readonly kind: 'stored'; readonly photo: Photo };

/** A file on its way into a draft. */
export interface ComingPhoto {
  readonly id: number;
  readonly draftId: number;
  readonly file: File;
  /** What it stands behind in the draft's photos; null at their beginning. */
  readonly behind: object | null;
  readonly progress: PhotoProgress;
}

/**
 * Sends photos two at a time in the order they came, whatever page of the app is open meanwhile. One that fails keeps its
 * place until it is sent again or left out.
 */
@Injectable({ providedIn: 'root' })
export class PhotoQueue {
  private readonly upload = inject(PhotoUpload);
  private readonly all = signal<readonly ComingPhoto[]>([]);
  private readonly underWay = new Map<number, Subscription>();
  private made = 0;
  readonly coming = this.all.asReadonly();
  /** Something would be lost if the page were closed now. */
  readonly isBusy = computed(() => this.all().some((one) => one.progress.kind !== 'stored'));

  add(draftId: number, files: readonly File[], behind: object | null): void {
    this.all.update((coming) => [
      ...coming,
      ...files.map((file): ComingPhoto => ({
        id: (this.made += 1),
        draftId,
        file,
        behind,
        progress:
          file.size > photoLimits.bytes ? { kind: 'failed', problem: tooLarge(file) } : { kind: 'waiting' },
      })),
    ]);
    this.sendNext();
  }

  retry(id: number): void {
    this.tell(id, { kind: 'waiting' });
    this.sendNext();
  }

  /** Stops it where it is under way, and leaves it out. */
  leaveOut(id: number): void {
    this.underWay.get(id)?.unsubscribe();
    this.underWay.delete(id);
    this.all.update((coming) => coming.filter((one) => one.id !== id));
    this.sendNext();
  }

  /** Takes out a stored photo that stands in the draft now as `item`; those that came after it stand behind it. */
  take(id: number, item: object): void {
    this.all.update((coming) => {
      const index = coming.findIndex((one) => one.id === id);
      const behind = coming[index]?.behind;
      return coming.flatMap((one, at) => {
        if (at === index) return [];
        return at > index && one.behind === behind ? [{ ...one, behind: item }] : [one];
      });
    });
  }

  private sendNext(): void {
    while (this.underWay.size < atOnce) {
      const next = this.all().find((one) => one.progress.kind === 'waiting');
      if (!next) return;
      this.send(next);
    }
  }

  private send({ id, file }: ComingPhoto): void {
    this.tell(id, { kind: 'sending', share: 0 });
    const subscription = this.upload.send(file, notDescribed(file)).subscribe({
      next: (step) => this.tell(id, step),
      error: (error: unknown) => this.end(id, { kind: 'failed', problem: toApiProblem(error).problem }),
      complete: () => this.end(id),
    });
    if (!subscription.closed) this.underWay.set(id, subscription);
  }

  private end(id: number, progress?: PhotoProgress): void {
    this.underWay.delete(id);
    if (progress) this.tell(id, progress);
    this.sendNext();
  }

  private tell(id: number, progress: PhotoProgress): void {
    this.all.update((coming) => coming.map((one) => (one.id === id ? { ...one, progress } : one)));
  }
}

/** Stands with the stored file until the write-up says what the photo shows. */
export function notDescribed(file: File): string {
  const words = `Photo ${file.name.replace(/\p{Cc}/gu, ' ')}, not described yet`;
  return [...words].slice(0, 300).join('').trim();
}
