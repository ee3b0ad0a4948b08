import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { LengthUnit } from '../../../shared/contract/worksheet';
import type { ShimLine } from '../../../shared/fit/worksheet-shim';
import { piecesText } from '../../../shared/fit/worksheet-shim';
import { lengthText } from './length-text';

/** The best stacks, the first the best; choosing one draws it. */
@Component({
  selector: 'sl-stack-list',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset>
      <legend>Stacks, the best first</legend>
      @for (line of shown(); track line.key) {
        <label [class.chosen]="line.key === chosen()">
          <input
            type="radio"
            name="stack"
            [value]="line.key"
            [checked]="line.key === chosen()"
            (change)="choose.emit(line.key)"
          />
          <span class="pieces">{{ line.pieces }}</span>
          <span class="figures">
            <span class="sl-measured">{{ line.thickness }}</span>
            <span>{{ line.error }}</span>
            <span class="sl-quiet">{{ line.interval }}</span>
            <span>{{ line.count }}</span>
            <strong>{{ line.fits }}</strong>
          </span>
        </label>
      }
    </fieldset>
  `,
  styles: `
    fieldset {
      border: 0;
      margin: 1rem 0;
      padding: 0;
      min-inline-size: 0;
    }
    legend {
      padding: 0;
      font: 600 1.15rem/1.3 var(--sl-heading);
      color: var(--sl-ink);
    }
    label {
      display: grid;
      grid-template-columns: auto minmax(0, 1fr);
      gap: 0.1rem 0.75rem;
      align-items: center;
      padding-block: 0.55rem;
      min-block-size: 2.75rem;
      border-block-end: 1px solid var(--sl-hair);
      cursor: pointer;
    }
    .chosen {
      background: var(--sl-accent-wash);
    }
    .pieces {
      font-weight: 600;
    }
    .figures {
      grid-column: 2;
      display: flex;
      flex-wrap: wrap;
      gap: 0.1rem 1rem;
      font-size: var(--sl-small);
      font-variant-numeric: tabular-nums;
    }
  `,
})
export class StackList {
  readonly lines = input.required<readonly ShimLine[]>();
  readonly chosen = input.required<string>();
  readonly unit = input.required<LengthUnit>();
  readonly choose = output<string>();

  protected readonly shown = computed(() =>
    this.lines().map(({ key, stack }) => {
      const length = (value: number): string => lengthText(value, this.unit(), stack.uncertainty);
      const bare = (value: number): string => length(value).replace(` ${this.unit()}`, '');
      const side = stack.error > 0 ? 'too thick' : 'too thin';
      return {
        key,
        pieces: piecesText(stack),
        thickness: length(stack.thickness),
        error:
          Math.abs(stack.error) < 5e-4 ? 'as thick as the gap' : `${length(Math.abs(stack.error))} ${side}`,
        interval: `error ${bare(stack.interval[0])} to ${length(stack.interval[1])} at 95 %`,
        count: stack.count === 1 ? '1 piece' : `${stack.count} pieces`,
        fits: stack.withinTolerance ? 'within tolerance' : 'misses the tolerance',
      };
    }),
  );
}
