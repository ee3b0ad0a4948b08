import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';
import { Icon } from '../../ui/icon/icon';

/** Where new photos come from: dropped here, pasted anywhere on the page, chosen, or taken with the phone. */
@Component({
  selector: 'sl-photo-sources',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:paste)': 'takePasted($event)' },
  template: `
    <div
      class="drop"
      tabindex="-1"
      [id]="fieldId()"
      [class.over]="over()"
      (dragover)="allow($event)"
      (dragleave)="over.set(false)"
      (drop)="takeDropped($event)"
    >
      <p>Drop photos here, or paste one.</p>
      <div class="ways">
        <label class="sl-plain-button">
          <sl-icon name="plus" />Choose photos
          <input
            class="sl-visually-hidden"
            type="file"
            accept="image/*"
            multiple
            (change)="takeChosen($event)"
          />
        </label>
        <label class="sl-plain-button camera">
          <sl-icon name="photo" />Take a photo
          <input
            class="sl-visually-hidden"
            type="file"
            accept="image/*"
            capture="environment"
            (change)="takeChosen($event)"
          />
        </label>
      </div>
      <p class="sl-quiet sl-small">
        JPEG, PNG, WebP, AVIF or HEIF, at most 20 MB each. Place, time and camera data are removed.
      </p>
    </div>
  `,
  styles: `
    :host {
      display: block;
      inline-size: 100%;
    }
    .drop {
      padding: 1rem;
      border: 1px dashed var(--sl-quiet);
    }
    .drop.over {
      border: 1px solid var(--sl-accent);
      background: var(--sl-accent-wash);
    }
    .drop p {
      margin: 0 0 0.5rem;
    }
    .drop p:last-child {
      margin: 0;
    }
    .ways {
      display: flex;
      flex-wrap: wrap;
      gap: 0.75rem;
      margin-block-end: 0.5rem;
    }
    .ways label {
      position: relative;
    }
    .ways label:focus-within {
      outline: 3px solid var(--sl-accent);
      outline-offset: 2px;
    }
    .camera {
      display: none;
    }
    @media (pointer: coarse) {
      .camera {
        display: inline-flex;
      }
    }
  `,
})
export class PhotoSources {
  readonly fieldId = input.required<string>();
  readonly added = output<readonly File[]>();
  protected readonly over = signal(false);

  protected takeChosen(event: Event): void {
    const field = event.target as HTMLInputElement;
    this.give([...(field.files ?? [])]);
    // The same file can be chosen again after it was left out.
    field.value = '';
  }

  protected takeDropped(event: DragEvent): void {
    event.preventDefault();
    this.over.set(false);
    this.give([...(event.dataTransfer?.files ?? [])]);
  }

  protected takePasted(event: ClipboardEvent): void {
    const images = [...(event.clipboardData?.files ?? [])].filter((file) => file.type.startsWith('image/'));
    if (images.length === 0) return;
    event.preventDefault();
    this.give(images);
  }

  protected allow(event: DragEvent): void {
    event.preventDefault();
    this.over.set(true);
  }

  private give(files: readonly File[]): void {
    if (files.length > 0) this.added.emit(files);
  }
}
