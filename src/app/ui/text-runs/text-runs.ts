import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { TextRun } from '../../../../shared/contract/search';

/** Text with the words that were searched for marked. */
@Component({
  selector: 'sl-text-runs',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@for (run of runs(); track $index) {
    @if (run.hit) {
      <mark>{{ run.text }}</mark>
    } @else {
      <span>{{ run.text }}</span>
    }
  }`,
})
export class TextRuns {
  readonly runs = input.required<readonly TextRun[]>();
}
