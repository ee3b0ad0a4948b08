import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import type { LengthUnit } from '../../../shared/contract/worksheet';
import type { AnySheet } from './sheet-state';

/** Millimetres or inches for the whole sheet; what is typed already is turned into the other. */
@Component({
  selector: 'sl-unit-choice',
  imports: [ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset>
      <legend class="sl-visually-hidden">Unit of all lengths</legend>
      @for (unit of units; track unit.value) {
        <label
          ><input
            type="radio"
            [name]="'unit'"
            [value]="unit.value"
            [formControl]="sheet().control('unit')"
            (change)="sheet().convertTo(unit.value)"
          />{{ unit.words }}</label
        >
      }
    </fieldset>
  `,
  styles: `
    fieldset {
      border: 0;
      padding: 0;
      margin: 0;
    }
    label {
      display: inline-flex;
      align-items: center;
      gap: 0.5rem;
      min-block-size: 2.75rem;
      margin-inline-end: 1.5rem;
      cursor: pointer;
    }
  `,
})
export class UnitChoice {
  readonly sheet = input.required<AnySheet>();
  protected readonly units: readonly { value: LengthUnit; words: string }[] = [
    { value: 'mm', words: 'millimetres' },
    { value: 'in', words: 'inches' },
  ];
}
