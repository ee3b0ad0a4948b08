import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { standingWords, type Standing } from '../../../../shared/contract/vocabulary';

/** How far a fix is borne out, with what the word means at hand. */
@Component({
  selector: 'sl-standing-label',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<span class="sl-label" [class.measured]="standing() === 'measured'" [title]="words().means">{{
      words().label
    }}</span>
    @if (explained()) {
      <span class="means">({{ words().means }})</span>
    }`,
  styles: `
    .sl-label {
      font-weight: 600;
    }
    .measured {
      color: var(--sl-brass);
    }
    .means {
      color: var(--sl-quiet);
    }
  `,
})
export class StandingLabel {
  readonly standing = input.required<Standing>();
  /** Writes the meaning beside the word. */
  readonly explained = input(false);
  protected readonly words = computed(() => standingWords[this.standing()]);
}
