import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { TakenDown } from '../../../../shared/contract/taken-down';

/** Over something that only its writer and the desk still see: that it is off the pages, and why. */
@Component({
  selector: 'sl-taken-down-note',
  imports: [DatePipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (of(); as down) {
      <p role="note">
        <strong>Taken down by the desk, {{ down.at | date: 'yyyy-MM-dd' }}.</strong>
        <span> Only its writer and the desk see it. The reason: </span><q>{{ down.reason }}</q>
      </p>
    }
  `,
  styles: `
    p {
      margin: 0.5rem 0;
      padding: 0.5rem 0.75rem;
      border: 1px dashed var(--sl-rule);
      border-inline-start: 4px solid var(--sl-ink);
    }
  `,
})
export class TakenDownNote {
  readonly of = input.required<TakenDown | null>();
}
