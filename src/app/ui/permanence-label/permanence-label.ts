import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { permanenceWords, type Permanence } from '../../../../shared/contract/vocabulary';

/** Reversible, leaves a mark, permanent: in words, with a line that grows more solid. */
@Component({
  selector: 'sl-permanence-label',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<span class="sl-label" [class]="permanence()">{{ words() }}</span>`,
  styles: `
    .sl-label {
      border-block-end: 2px dotted currentColor;
    }
    .leaves-a-mark {
      border-block-end-style: dashed;
    }
    .permanent {
      border-block-end-style: solid;
      font-weight: 600;
    }
  `,
})
export class PermanenceLabel {
  readonly permanence = input.required<Permanence>();
  protected readonly words = computed(() => permanenceWords[this.permanence()]);
}
