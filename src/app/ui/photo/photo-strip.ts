import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { Photo } from '../../../../shared/contract/photos';
import { PhotoView } from './photo';

/** A photo with what to look at in it, where that is said. */
export interface CaptionedPhoto {
  readonly photo: Photo;
  readonly caption: string;
}

/** Small photos in a row; each leads to its largest size. */
@Component({
  selector: 'sl-photo-strip',
  imports: [PhotoView],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ul class="sl-plain-list" [attr.aria-label]="label()">
      @for (item of photos(); track item.photo.id) {
        <li>
          <figure>
            <a [href]="largest(item)">
              <sl-photo [photo]="item.photo" sizes="11rem" />
              <span class="sl-visually-hidden">Larger</span>
            </a>
            @if (item.caption) {
              <figcaption>{{ item.caption }}</figcaption>
            }
          </figure>
        </li>
      }
    </ul>
  `,
  styles: `
    :host {
      display: block;
    }
    ul {
      display: flex;
      flex-wrap: wrap;
      gap: 0.75rem 1rem;
      margin: 0.25rem 0 0.75rem;
    }
    li {
      inline-size: min(11rem, 100%);
    }
    figure {
      margin: 0;
    }
    a {
      display: block;
      border: 1px solid var(--sl-rule);
    }
    figcaption {
      margin-block-start: 0.25rem;
      font-size: 0.875rem;
      line-height: 1.35;
    }
  `,
})
export class PhotoStrip {
  readonly photos = input.required<readonly CaptionedPhoto[]>();
  /** What they show together, for those who cannot see it: "How to tell Rev B". */
  readonly label = input.required<string>();

  protected largest({ photo }: CaptionedPhoto): string {
    return `/photos/${photo.hash}-${Math.max(...photo.widths)}.webp`;
  }
}
