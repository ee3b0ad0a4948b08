import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { worksheetAddress } from '../../../../shared/contract/worksheet-address';
import type { WorksheetRecord } from '../../../../shared/contract/worksheet';

/** What a worksheet that somebody attached came to, with the way to its figures. */
@Component({
  selector: 'sl-worksheet-note',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p>
      <span class="sl-quiet">Worked out:</span> {{ record().result.sentence }}
      <a class="sl-off-paper" [href]="address()">Open the worksheet with these figures</a>
    </p>
  `,
  styles: `
    p {
      max-inline-size: var(--sl-measure);
      border-inline-start: 3px solid var(--sl-brass-line);
      padding-inline-start: 1rem;
    }
  `,
})
export class WorksheetNote {
  readonly record = input.required<WorksheetRecord>();
  protected readonly address = computed(() => worksheetAddress(this.record().kind, this.record().inputs));
}
