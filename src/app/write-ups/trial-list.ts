import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { FixView, Trial } from '../../../shared/contract/write-ups';
import { TrialLine } from './trial-line';

const shownAtOnce = 3;

/** What people found when they tried the fixes, under the fix they tried. */
@Component({
  selector: 'sl-trial-list',
  imports: [TrialLine],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (group of groups(); track group.key) {
      <h3>{{ group.title }}</h3>
      <ul class="sl-plain-list">
        @for (trial of group.first; track trial.id) {
          <li><sl-trial-line [trial]="trial" [acceptance]="group.acceptance" /></li>
        }
      </ul>
      @if (group.rest.length) {
        <details>
          <summary>
            {{ group.rest.length === 1 ? 'One more trial' : group.rest.length + ' more trials' }}
          </summary>
          <ul class="sl-plain-list">
            @for (trial of group.rest; track trial.id) {
              <li><sl-trial-line [trial]="trial" [acceptance]="group.acceptance" /></li>
            }
          </ul>
        </details>
      }
    } @empty {
      <p>Nobody but the author has told of a trial yet.</p>
    }
  `,
  styles: `
    h3 {
      font-size: 1.2rem;
      margin-block: 1rem 0.25rem;
    }
    summary {
      min-block-size: 2.75rem;
      display: inline-flex;
      align-items: center;
      cursor: pointer;
      color: var(--sl-accent);
      text-decoration: underline;
      text-underline-offset: 0.18em;
    }
  `,
})
export class TrialList {
  readonly trials = input.required<readonly Trial[]>();
  readonly fixes = input.required<readonly FixView[]>();

  protected readonly groups = computed(() =>
    this.fixes()
      .map(({ key, title, acceptance }) => {
        const trials = this.trials().filter((trial) => trial.fixKey === key);
        return {
          key,
          title,
          acceptance,
          first: trials.slice(0, shownAtOnce),
          rest: trials.slice(shownAtOnce),
        };
      })
      .filter((group) => group.first.length > 0),
  );
}
