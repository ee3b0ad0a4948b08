import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { RevisionPhoto } from '../../../../shared/contract/hardware';
import { PhotoView } from '../../ui/photo/photo';

/** Small photos that show what tells a revision from the others; each leads to its largest size. */
@Component({
  selector: 'sl-revision-photos',
  imports: [PhotoView],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ul class="sl-plain-list" [attr.aria-label]="'How to tell ' + label()">
      @for (item of photos(); track item.photo.id) {
        <li>
          <figure>
            <a [href]="largest(item)">
              <sl-photo [photo]="item.photo" sizes="11rem" />
              <span class="sl-visually-hidden">Larger</span>
            </a>
            <figcaption>{{ item.caption }}</figcaption>
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
export class RevisionPhotos {
  readonly photos = input.required<readonly RevisionPhoto[]>();
  /** Such as "Rev B". */
  readonly label = input.required<string>();

  protected largest({ photo }: RevisionPhoto): string {
    return `/photos/${photo.hash}-${Math.max(...photo.widths)}.webp`;
  }
}
