import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Photo } from '../../../../shared/contract/photos';

/** A stored photo in the size that fits, its placeholder behind it until it is there. */
@Component({
  selector: 'sl-photo',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <picture>
      <source type="image/avif" [attr.srcset]="sources('avif')" [attr.sizes]="sizes()" />
      <img
        [src]="largest()"
        [attr.srcset]="sources('webp')"
        [attr.sizes]="sizes()"
        [alt]="alt() ?? photo().alt"
        [width]="photo().width"
        [height]="photo().height"
        [attr.loading]="eager() ? 'eager' : 'lazy'"
        decoding="async"
        [style.background-image]="behind()"
        [style.--own-ratio]="photo().width / photo().height"
      />
    </picture>
  `,
  styles: `
    :host,
    picture {
      display: block;
    }
    img {
      display: block;
      inline-size: 100%;
      block-size: auto;
      aspect-ratio: var(--sl-photo-ratio, var(--own-ratio));
      object-fit: cover;
      background-size: cover;
    }
  `,
})
export class PhotoView {
  readonly photo = input.required<Omit<Photo, 'id'>>();
  /** Alternative text of this use; the photo's own where none is given. */
  readonly alt = input<string>();
  readonly sizes = input('(min-width: 60rem) 40rem, 100vw');
  readonly eager = input(false);

  protected readonly largest = computed(() => this.addressOf(Math.max(...this.photo().widths), 'webp'));
  protected readonly behind = computed(() => {
    const { placeholder } = this.photo();
    return /^data:image\/[a-z]+;base64,[A-Za-z0-9+/=]+$/.test(placeholder) ? `url("${placeholder}")` : null;
  });

  protected sources(format: 'avif' | 'webp'): string {
    return this.photo()
      .widths.map((width) => `${this.addressOf(width, format)} ${width}w`)
      .join(', ');
  }

  private addressOf(width: number, format: 'avif' | 'webp'): string {
    return `/photos/${this.photo().hash}-${width}.${format}`;
  }
}
