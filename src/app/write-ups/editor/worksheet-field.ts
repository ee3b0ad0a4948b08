import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { worksheetAddress } from '../../../../shared/contract/worksheet-address';
import type { WorksheetRecord } from '../../../../shared/contract/worksheet';
import { worksheetOfLink } from '../../../../shared/fit/worksheet-link';
import { redrawWith } from '../../core/redraw-with';
import { Undo } from '../../ui/undo/undo';

/** A worksheet attached by its link, which is run at once; what it comes to is shown before it is saved. */
@Component({
  selector: 'sl-worksheet-field',
  imports: [ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset tabindex="-1" [id]="fieldId()">
      <legend>Worksheet</legend>
      @if (control().value; as record) {
        <p>
          {{ record.result.sentence }}
          <a [href]="addressOf(record)" target="_blank" rel="noopener">Open it</a>
        </p>
        <button type="button" class="sl-bare-button" (click)="remove(record)">Take the worksheet off</button>
      } @else {
        <p class="sl-quiet">
          Size the fix in a <a href="/worksheets" target="_blank" rel="noopener">worksheet</a>, copy its link
          and paste it here: readers then run it with their own readings.
        </p>
        <div class="row">
          <input
            class="sl-field"
            type="text"
            inputmode="url"
            maxlength="4000"
            [attr.aria-label]="'Link of a worksheet'"
            [attr.aria-describedby]="refusal() ? fieldId() + '-refusal' : null"
            [formControl]="link"
            (keydown.enter)="$event.preventDefault(); attach()"
          />
          <button type="button" class="sl-plain-button" (click)="attach()">Attach</button>
        </div>
        @if (refusal(); as refusal) {
          <p class="refusal" role="alert" [id]="fieldId() + '-refusal'">{{ refusal }}</p>
        }
      }
    </fieldset>
  `,
  styles: `
    fieldset {
      margin: 1rem 0 0;
      padding: 0;
      border: 0;
      min-inline-size: 0;
    }
    legend {
      padding: 0;
      font-weight: 600;
    }
    p {
      margin: 0 0 0.4rem;
    }
    .row {
      display: flex;
      flex-wrap: wrap;
      gap: 0.5rem;
    }
    input {
      flex: 1 1 16rem;
      min-inline-size: 0;
    }
    .refusal {
      margin-block-start: 0.4rem;
      font-weight: 600;
    }
  `,
})
export class WorksheetField {
  readonly control = input.required<FormControl<WorksheetRecord | null>>();
  readonly fieldId = input.required<string>();
  private readonly undo = inject(Undo);
  protected readonly link = new FormControl('', { nonNullable: true });
  protected readonly refusal = signal('');

  constructor() {
    redrawWith(this.control);
  }

  protected addressOf(record: WorksheetRecord): string {
    return worksheetAddress(record.kind, record.inputs);
  }

  protected attach(): void {
    const read = worksheetOfLink(this.link.value);
    this.refusal.set('refusal' in read ? read.refusal : '');
    if (!('record' in read)) return;
    this.control().setValue(read.record);
    this.link.setValue('');
  }

  protected remove(record: WorksheetRecord): void {
    this.control().setValue(null);
    this.undo.offer('Worksheet taken off', () => this.control().setValue(record));
  }
}
