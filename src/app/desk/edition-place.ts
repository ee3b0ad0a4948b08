import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { DeskEdition } from '../../../shared/contract/moderation';

/** Whose write-up an edition is proposed on, whether what it builds on is still published, and what its owners say. */
@Component({
  selector: 'sl-edition-place',
  imports: [DatePipe, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (owners(); as owners) {
      <p>
        <strong>Proposed</strong> by {{ edition().author.displayName }} on
        <a [routerLink]="['/write-ups', edition().slug]">a write-up by {{ owners }}</a
        >.
      </p>
    }
    @if (edition().overtakenBy; as newer) {
      <p class="overtaken">
        <strong>It cannot be published as it is.</strong> It builds on
        {{ edition().base ? 'edition ' + edition().base?.number : 'an earlier edition' }}; edition
        {{ newer.number }} by {{ newer.author.displayName }} was published since, on
        {{ newer.publishedAt | date: 'd MMM y' }}. Give it back, so that
        {{ edition().author.displayName }} merges the two. What is shown below as changed is against edition
        {{ newer.number }}, so it also takes back what that one changed.
      </p>
    }
    @if (owners()) {
      <h2>What its authors say</h2>
      <ul class="sl-plain-list">
        @for (opinion of edition().opinions; track opinion.person.id) {
          <li>
            {{ opinion.person.displayName }}
            <strong>{{ opinion.agrees ? 'agrees' : 'does not agree' }}</strong>{{
              opinion.line ? ': “' + opinion.line + '”' : ''
            }}
            <span class="sl-quiet sl-small"
              >{{ opinion.at | date: 'd MMM y, HH:mm'
              }}{{ opinion.beforeHandingIn ? ', before it was handed in again' : '' }}</span
            >
          </li>
        } @empty {
          <li class="sl-quiet">Nothing yet.</li>
        }
      </ul>
    }
  `,
  styles: `
    h2 {
      font-size: 1.2rem;
      margin: 0.75rem 0 0;
    }
    p {
      margin: 0.35rem 0 0;
      max-inline-size: var(--sl-measure);
    }
    .overtaken {
      border-inline-start: 4px solid var(--sl-ink);
      padding-inline-start: 0.75rem;
    }
    li {
      padding-block: 0.25rem;
    }
  `,
})
export class EditionPlace {
  readonly edition = input.required<DeskEdition>();
  /** The authors of the write-up, where the edition's is not the only one of them; empty for a first edition. */
  protected readonly owners = computed(() => {
    const { author, writtenBy } = this.edition();
    return writtenBy
      .filter((person) => person.id !== author.id)
      .map((person) => person.displayName)
      .join(', ');
  });
}
