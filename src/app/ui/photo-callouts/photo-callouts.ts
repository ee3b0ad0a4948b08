import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Callout } from '../../../../shared/contract/callouts';
import type { Photo } from '../../../../shared/contract/photos';
import { calloutWords } from '../../../../shared/text/callout-words';
import { PhotoView } from '../photo/photo';
import { CalloutOverlay } from './callout-overlay';

/** A photo with what is drawn on it; for those who cannot see it the callouts are told in words. */
@Component({
  selector: 'sl-photo-callouts',
  imports: [CalloutOverlay, PhotoView],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="sheet">
      <sl-photo [photo]="photo()" [alt]="alt()" [sizes]="sizes()" />
      @if (callouts().length) {
        <sl-callout-overlay [callouts]="callouts()" [ratio]="ratio()" />
      }
    </div>
    @if (callouts().length) {
      <ul class="sl-visually-hidden" aria-label="Drawn on the photo">
        @for (one of callouts(); track one.key) {
          <li>{{ words(one) }}</li>
        }
      </ul>
    }
  `,
  styles: `
    :host {
      display: block;
      position: relative;
    }
    .sheet {
      position: relative;
      /* A photo is never cut where something is drawn on it. */
      --sl-photo-ratio: initial;
    }
  `,
})
export class PhotoCallouts {
  readonly photo = input.required<Photo>();
  readonly alt = input.required<string>();
  readonly callouts = input.required<readonly Callout[]>();
  readonly sizes = input('(min-width: 60rem) 40rem, 100vw');
  protected readonly ratio = computed(() => this.photo().width / this.photo().height);
  protected readonly words = calloutWords;
}
