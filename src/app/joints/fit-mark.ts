import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { FitVerdict } from '../../../shared/contract/joints';
import type { z } from 'zod';

/**
 * A verdict as a small drawing: a peg over its slot. Narrower with room, filling it, hatched where it is tight, standing
 * on the rim where it will not go in, and dashed where nobody knows. It repeats what the words beside it say.
 */
@Component({
  selector: 'sl-fit-mark',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-hidden': 'true' },
  template: `
    <svg viewBox="0 0 32 24" focusable="false">
      @switch (verdict()) {
        @case ('seats-with-room') {
          <path class="slot" d="M1 9h7v13h16V9h7" />
          <path class="peg" d="M11 2h10v17H11z" />
        }
        @case ('seats-snugly') {
          <path class="slot" d="M1 9h7v13h16V9h7" />
          <path class="peg" d="M8 2h16v20H8z" />
        }
        @case ('tight') {
          <path class="slot" d="M1 9h7v13h16V9h7" />
          <path class="line" d="M8 2h16v13H8zM8 8l6-6M8 15 21 2M15 15l9-9" />
        }
        @case ('will-not-seat') {
          <path class="slot" d="M1 12h7v10h16V12h7" />
          <path
            class="line"
            d="M4 2h24v10H4zM4 12 14 2M12 12 22 2M20 12l8-8M4 6l4-4M4 2l10 10M10 2l10 10M18 2l10 10"
          />
        }
        @default {
          <path class="slot dashed" d="M1 9h7v13h16V9h7" />
          <path class="line dashed" d="M10 2h12v14H10z" />
        }
      }
    </svg>
  `,
  styles: `
    :host {
      display: inline-flex;
      inline-size: 2rem;
      block-size: 1.5rem;
      flex: none;
    }
    svg {
      inline-size: 100%;
      block-size: 100%;
    }
    path {
      fill: none;
      stroke: var(--sl-ink);
      stroke-width: 1.5;
      stroke-linejoin: round;
    }
    .slot {
      stroke-width: 2.25;
    }
    .peg {
      fill: var(--sl-ink);
      fill-opacity: 0.3;
    }
    .dashed {
      stroke: var(--sl-quiet);
      stroke-width: 1.25;
      stroke-dasharray: 3 2;
    }
  `,
})
export class FitMark {
  readonly verdict = input.required<z.infer<typeof FitVerdict>>();
}
