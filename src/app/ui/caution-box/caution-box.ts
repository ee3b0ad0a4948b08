import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { signalWordMeans } from '../../../../shared/contract/vocabulary';
import type { Caution } from '../../../../shared/contract/write-ups';
import { Icon } from '../icon/icon';

/**
 * A moderator's safety notice in the order of ANSI Z535.6: alert symbol and signal word, then the hazard, what it can do,
 * and how to avoid it.
 */
@Component({
  selector: 'sl-caution-box',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    role: 'note',
    '[class]': 'caution().signalWord',
    '[attr.aria-label]': 'caution().signalWord + ": " + caution().hazard',
  },
  template: `
    <p class="word" [title]="caution().signalWord + ': ' + means()">
      <sl-icon name="warning" />{{ caution().signalWord }}
    </p>
    <div class="text">
      <p class="hazard">{{ caution().hazard }}</p>
      <p>{{ caution().consequence }}</p>
      <p class="avoid">{{ caution().avoidance }}</p>
    </div>
  `,
  styles: `
    :host {
      display: block;
      border: 2px solid var(--sl-caution-line);
      margin-block: 0.75rem;
      break-inside: avoid;
      break-after: avoid;
      background: var(--sl-paper);
    }
    :host(.danger),
    :host(.warning) {
      border-color: var(--sl-danger);
    }
    p {
      margin: 0;
    }
    .word {
      display: flex;
      align-items: center;
      gap: 0.5rem;
      padding: 0.25rem 0.75rem;
      font: 600 1.15rem/1.4 var(--sl-heading);
      letter-spacing: 0.06em;
      text-transform: uppercase;
      border-block-end: 2px solid var(--sl-caution-line);
      color: var(--sl-ink);
    }
    :host(.danger) .word {
      background: var(--sl-danger);
      color: var(--sl-on-danger);
      border-color: var(--sl-danger);
    }
    :host(.warning) .word {
      color: var(--sl-danger);
      border-color: var(--sl-danger);
    }
    .text {
      padding: 0.5rem 0.75rem 0.65rem;
    }
    .hazard {
      font-weight: 600;
    }
    .avoid {
      margin-block-start: 0.25rem;
    }
    /* Paper may come without grounds; the signal word must not depend on one. */
    @media print {
      :host(.danger),
      :host(.warning) {
        border-width: 3px;
      }
      :host(.danger) .word {
        background: none;
        color: var(--sl-text);
        border-block-end-width: 3px;
      }
    }
  `,
})
export class CautionBox {
  readonly caution = input.required<Caution>();
  protected readonly means = computed(() => signalWordMeans[this.caution().signalWord]);
}
