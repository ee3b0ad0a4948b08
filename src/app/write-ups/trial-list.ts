import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { trialOutcomeWords } from '../../../shared/contract/vocabulary';
import type { FixView, Trial } from '../../../shared/contract/write-ups';
import { withUnit } from './figures';

/** What people found when they tried the fixes, under the fix they tried. */
@Component({
  selector: 'sl-trial-list',
  imports: [DatePipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (group of groups(); track group.key) {
      <h3>{{ group.title }}</h3>
      <ul class="sl-plain-list">
        @for (trial of group.trials; track trial.id) {
          <li>
            <p class="top">
              <strong>{{ outcomes[trial.outcome] }}</strong>
              @if (trial.figure !== null && group.acceptance) {
                <span>{{ group.acceptance.quantity }} <span class="sl-measured">{{ figure(trial.figure, group.acceptance.unit) }}</span></span>
              }
              @for (revision of trial.revisions; track revision.id) {<span class="part">{{ revision.partName }} <b>{{ revision.label }}</b></span>}
            </p>
            @if (trial.note) {<p class="note">{{ trial.note }}</p>}
            <p class="who sl-quiet">{{ trial.person.displayName }}, {{ trial.createdAt | date: 'd MMM y' : 'UTC' }}</p>
          </li>
        }
      </ul>
    } @empty {
      <p>Nobody but the author has told of a trial yet.</p>
    }
  `,
  styles: `
    h3 { font-size: 1.2rem; margin-block: 1rem 0.25rem; }
    li { border-block-end: 1px solid var(--sl-hair); padding-block: 0.7rem; max-inline-size: var(--sl-measure); break-inside: avoid; }
    .top { display: flex; flex-wrap: wrap; gap: 0.1rem 1.25rem; margin: 0; }
    .top strong { color: var(--sl-ink); }
    .part b { font-family: var(--sl-mono); font-size: 0.92em; }
    .note { margin: 0.25rem 0; white-space: pre-line; }
    .who { margin: 0; font-size: var(--sl-small); }
  `,
})
export class TrialList {
  readonly trials = input.required<readonly Trial[]>();
  readonly fixes = input.required<readonly FixView[]>();

  protected readonly outcomes = trialOutcomeWords;
  protected readonly figure = withUnit;
  protected readonly groups = computed(() =>
    this.fixes()
      .map(({ key, title, acceptance }) => ({ key, title, acceptance, trials: this.trials().filter((trial) => trial.fixKey === key) }))
      .filter((group) => group.trials.length > 0),
  );
}
