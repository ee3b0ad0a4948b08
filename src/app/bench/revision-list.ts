import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { RevisionRef } from '../../../shared/contract/hardware';
import { BenchStore } from './bench-store';

interface Chip {
  readonly id: number;
  readonly label: string;
  readonly mark: 'holds' | 'not' | 'unknown';
  readonly words: string;
  readonly mine: boolean;
}

/** Revisions of one part: framed where it holds, struck out where it was found not to, dotted where nobody knows. */
@Component({
  selector: 'sl-revision-list',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ul class="sl-plain-list" [attr.aria-label]="'Revisions of ' + partName()">
      @for (chip of chips(); track chip.id) {
        <li [class]="chip.mark" [class.mine]="chip.mine" [title]="chip.words">
          <span aria-hidden="true">{{ chip.label }}</span><span class="sl-visually-hidden"
            >{{ chip.label }}: {{ chip.words }}</span
          >
          @if (chip.mine) {
            <span class="yours" aria-hidden="true">yours</span>
          }
        </li>
      }
    </ul>
  `,
  styles: `
    ul {
      display: flex;
      flex-wrap: wrap;
      gap: 0.3rem;
    }
    li {
      display: inline-flex;
      align-items: center;
      gap: 0.35rem;
      font: 500 1rem/1.45 var(--sl-heading);
      padding: 0 0.45rem;
      border: 1px solid var(--sl-ink);
      color: var(--sl-ink);
    }
    .holds {
      font-weight: 600;
    }
    .not {
      border-color: var(--sl-rule);
      color: var(--sl-quiet);
    }
    .not > span:first-child {
      text-decoration: line-through;
    }
    .unknown {
      border-style: dotted;
      border-color: var(--sl-quiet);
      color: var(--sl-quiet);
    }
    .mine {
      box-shadow: 0 2px 0 var(--sl-accent);
    }
    .yours {
      font: 600 0.8125rem/1 var(--sl-body);
      text-decoration: none;
    }
  `,
})
export class RevisionList {
  readonly partName = input('');
  readonly holds = input<readonly RevisionRef[]>([]);
  readonly notFor = input<readonly RevisionRef[]>([]);
  readonly notKnown = input<readonly RevisionRef[]>([]);

  private readonly bench = inject(BenchStore);

  protected readonly chips = computed<Chip[]>(() => {
    const owned = new Set(this.bench.owned().map((item) => item.revision?.id));
    const marked = (revisions: readonly RevisionRef[], mark: Chip['mark'], words: string): Chip[] =>
      revisions.map(({ id, label }) => ({ id, label, mark, words, mine: owned.has(id) }));
    return [
      ...marked(this.holds(), 'holds', 'holds for it'),
      ...marked(this.notFor(), 'not', 'found not to hold for it'),
      ...marked(this.notKnown(), 'unknown', 'not known for it'),
    ];
  });
}
