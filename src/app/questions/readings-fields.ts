import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ReactiveFormsModule, type FormArray } from '@angular/forms';
import {
  Instrument,
  ReadingUnit,
  instrumentWords,
  readingUnitSymbols,
} from '../../../shared/contract/vocabulary';
import { redrawWith } from '../core/redraw-with';
import { Field, Labelled } from '../ui/labelled/labelled';
import { readingForm, type ReadingForm } from './question-form';

const most = 20;

/** Readings as they were taken: dimension, figure, unit, instrument. */
@Component({
  selector: 'sl-readings-fields',
  imports: [Field, Labelled, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (reading of readings().controls; track reading) {
      <fieldset [formGroup]="reading">
        <legend>Reading {{ $index + 1 }}</legend>
        <sl-labelled class="dimension" label="Dimension" [control]="reading.controls.dimension">
          <input slField maxlength="120" formControlName="dimension" />
        </sl-labelled>
        <sl-labelled label="Reading" [control]="reading.controls.value">
          <input slField type="number" step="any" inputmode="decimal" formControlName="value" />
        </sl-labelled>
        <sl-labelled label="Unit" [control]="reading.controls.unit">
          <select slField formControlName="unit">
            @for (unit of units; track unit.value) {
              <option [value]="unit.value">{{ unit.words }}</option>
            }
          </select>
        </sl-labelled>
        <sl-labelled label="Instrument" [control]="reading.controls.instrument">
          <select slField formControlName="instrument">
            @for (instrument of instruments; track instrument.value) {
              <option [value]="instrument.value">{{ instrument.words }}</option>
            }
          </select>
        </sl-labelled>
        <button type="button" class="sl-bare-button" (click)="readings().removeAt($index)">
          Take reading {{ $index + 1 }} out
        </button>
      </fieldset>
    }
    @if (readings().length < most) {
      <button type="button" class="sl-plain-button" (click)="add()">Add a reading</button>
    }
  `,
  styles: `
    :host {
      display: block;
      inline-size: 100%;
    }
    fieldset {
      display: grid;
      grid-template-columns: repeat(3, minmax(0, 1fr));
      gap: 0.5rem 1rem;
      border: 0;
      border-block-end: 1px solid var(--sl-hair);
      padding: 0 0 0.75rem;
      margin: 0 0 1rem;
      min-inline-size: 0;
    }
    legend {
      padding: 0;
      font-weight: 600;
    }
    .dimension,
    .sl-bare-button {
      grid-column: 1 / -1;
    }
    .sl-bare-button {
      justify-self: start;
    }
    @media (max-width: 29.99rem) {
      fieldset {
        grid-template-columns: repeat(2, minmax(0, 1fr));
      }
    }
  `,
})
export class ReadingsFields {
  readonly readings = input.required<FormArray<ReadingForm>>();
  protected readonly most = most;
  protected readonly units = ReadingUnit.options.map((value) => ({
    value,
    words: readingUnitSymbols[value],
  }));
  protected readonly instruments = Instrument.options.map((value) => ({
    value,
    words: instrumentWords[value],
  }));

  constructor() {
    redrawWith(this.readings);
  }

  protected add(): void {
    this.readings().push(readingForm());
  }
}
