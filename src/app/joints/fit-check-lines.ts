import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { fitVerdictWords, type FitCheckLine } from '../../../shared/contract/joints';
import { FitMark } from './fit-mark';
import { chanceWords } from './fit-words';
import { fixesForPair } from './fixes-for-pair';
import { PairFixes } from './pair-fixes';

/** Every joint between some revisions, worst first: verdict, reason, fixes with their cautions. */
@Component({
  selector: 'sl-fit-check-lines',
  imports: [FitMark, PairFixes, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ol class="sl-plain-list" aria-label="Joints, worst first">
      @for (entry of entries(); track entry.key) {
        <li [class]="entry.line.verdict">
          <p class="word"><sl-fit-mark [verdict]="entry.line.verdict" />{{ words[entry.line.verdict] }}</p>
          <div class="what">
            <p class="joint">
              <a [routerLink]="['/joints', entry.line.joint.slug]" [queryParams]="entry.pair">{{
                entry.line.joint.name
              }}</a>
            </p>
            <p class="sl-quiet">
              {{ entry.line.joint.a.name }} {{ entry.line.revisionA.label }} and
              {{ entry.line.joint.b.name }}
              {{ entry.line.revisionB.label }}
            </p>
            <p>{{ entry.line.sentence }}</p>
            <p class="sl-measured">{{ entry.chance }}</p>
            @if (entry.line.verdict === 'not-known') {
              <p>
                <a [routerLink]="['/joints', entry.line.joint.slug]" [queryParams]="entry.pair"
                  >What to measure, and how</a
                >
              </p>
            }
            @if (entry.fixes.length) {
              <sl-pair-fixes [writeUps]="entry.fixes" />
            }
          </div>
        </li>
      }
    </ol>
  `,
  styles: `
    li {
      display: grid;
      grid-template-columns: 11rem minmax(0, 1fr);
      gap: 0.25rem 1.5rem;
      padding-block: 0.9rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    ol {
      border-block-start: 1px solid var(--sl-ink);
    }
    p {
      margin: 0;
    }
    .word {
      display: flex;
      gap: 0.6rem;
      align-items: flex-start;
      font: 600 1.2rem/1.25 var(--sl-heading);
      color: var(--sl-ink);
    }
    .joint a {
      display: inline-block;
      padding-block-end: 0.2rem;
      font: 600 1.3rem/1.2 var(--sl-heading);
    }
    .what {
      max-inline-size: var(--sl-measure);
    }
    .sl-measured {
      white-space: normal;
    }
    sl-pair-fixes {
      display: block;
      margin-block-start: 0.5rem;
    }
    @media (max-width: 47.99rem) {
      li {
        grid-template-columns: minmax(0, 1fr);
      }
    }
  `,
})
export class FitCheckLines {
  readonly lines = input.required<readonly FitCheckLine[]>();

  protected readonly words = fitVerdictWords;
  protected readonly entries = computed(() =>
    this.lines().map((line) => {
      const pair = { a: line.revisionA.id, b: line.revisionB.id };
      return {
        line,
        pair,
        key: `${line.joint.id}/${pair.a}/${pair.b}`,
        chance: chanceWords(line.chance),
        fixes: fixesForPair(line.writeUps, { revisionA: pair.a, revisionB: pair.b }, null),
      };
    }),
  );
}
