import { ChangeDetectionStrategy, Component, effect, inject, input, untracked } from '@angular/core';
import { FormControl, ReactiveFormsModule, type ValidatorFn } from '@angular/forms';
import { worksheetAddress } from '../../../../shared/contract/worksheet-address';
import type { WorksheetRecord } from '../../../../shared/contract/worksheet';
import { worksheetOfLink } from '../../../../shared/fit/worksheet-link';
import { redrawWith } from '../../core/redraw-with';
import { wrongWith } from '../../core/told-fields';
import { Undo } from '../undo/undo';
import { WorksheetAgain } from './worksheet-again';

/**
 * A worksheet attached by its link, which is run at once; what it comes to is shown before it is saved. A text that is no
 * such link keeps the form from being sent, so that it is not lost unnoticed.
 */
@Component({
  selector: 'sl-worksheet-field',
  imports: [ReactiveFormsModule, WorksheetAgain],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset tabindex="-1" [id]="fieldId()">
      <legend>Worksheet</legend>
      @if (control().value; as record) {
        <p>
          {{ record.result.sentence }}
          <a [href]="addressOf(record)" target="_blank" rel="noopener">Open it with its figures</a>
        </p>
        <sl-worksheet-again [record]="record" (taken)="take($event, record)" />
        <button type="button" class="sl-bare-button" (click)="remove(record)">Take the worksheet off</button>
        <p class="sl-quiet">
          For other figures open it, change them, copy its link and paste it here in its place.
        </p>
      } @else {
        <p class="sl-quiet">
          {{ why() }} <a href="/worksheets" target="_blank" rel="noopener">To the worksheets</a>
        </p>
      }
      <div class="row">
        <input
          class="sl-field"
          type="text"
          inputmode="url"
          maxlength="4000"
          [attr.aria-label]="'Link of a worksheet'"
          [attr.aria-describedby]="refusal() ? fieldId() + '-refusal' : null"
          [formControl]="link"
          (change)="attach()"
          (keydown.enter)="$event.preventDefault(); attach()"
        />
        <button type="button" class="sl-plain-button" (click)="attach()">
          {{ control().value ? 'Attach in its place' : 'Attach' }}
        </button>
      </div>
      @if (refusal(); as refusal) {
        <p class="refusal" role="alert" [id]="fieldId() + '-refusal'">{{ refusal }}</p>
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
  /** What it is good for here. */
  readonly why = input(
    'Size the fix in a worksheet, copy its link and paste it here: readers then run it with their own readings.',
  );
  private readonly undo = inject(Undo);
  protected readonly link = new FormControl('', { nonNullable: true, validators: [isWorksheetLink] });
  private readonly linkIsRead: ValidatorFn = () => this.link.errors;

  constructor() {
    redrawWith(this.control);
    effect((leave) => {
      const control = this.control();
      untracked(() => control.addValidators(this.linkIsRead));
      leave(() => control.removeValidators(this.linkIsRead));
    });
  }

  protected refusal(): string {
    return this.link.touched ? wrongWith(this.link) : '';
  }

  protected addressOf(record: WorksheetRecord): string {
    return worksheetAddress(record.kind, record.inputs);
  }

  protected attach(): void {
    this.link.markAsTouched();
    const read = this.link.value.trim() === '' ? null : worksheetOfLink(this.link.value.trim());
    if (read && 'record' in read) {
      const before = this.control().value;
      this.link.reset();
      if (before) this.take(read.record, before);
      else this.control().setValue(read.record);
    } else {
      this.control().updateValueAndValidity();
    }
  }

  /** Puts a worksheet in the place of the one before, with a way back. */
  protected take(record: WorksheetRecord, before: WorksheetRecord): void {
    this.control().setValue(record);
    this.undo.offer('Another worksheet is attached', () => this.control().setValue(before));
  }

  protected remove(record: WorksheetRecord): void {
    this.control().setValue(null);
    this.undo.offer('Worksheet taken off', () => this.control().setValue(record));
  }
}

/** Lets an empty field and the link of a worksheet pass; says in words why another text does not. */
const isWorksheetLink: ValidatorFn = ({ value }) => {
  const link = String(value).trim();
  const read = link === '' ? null : worksheetOfLink(link);
  return read && 'refusal' in read ? { told: read.refusal } : null;
};
