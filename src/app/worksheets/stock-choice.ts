import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { LengthUnit, StockFamily } from '../../../shared/contract/worksheet';
import type { StockKind } from '../../../shared/fit/shim-stack';
import { stockLibrary } from '../../../shared/fit/stock-library';
import { lengthText } from './length-text';

const familyWords: Record<StockFamily, string> = {
  coin: 'coins',
  washer: 'washers',
  'shim-ring': 'shim rings',
  'feeler-leaf': 'feeler leaves',
  sheet: 'paper and can',
  tape: 'tape',
  'printed-layer': 'printed discs',
};

/** Families of stock to draw from, each with its kinds, their figures and where those come from. */
@Component({
  selector: 'sl-stock-choice',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (family of families(); track family.name) {
      <div class="family">
        <label
          ><input
            #box
            type="checkbox"
            [checked]="family.isTaken"
            (change)="toggleFamily(family.name, box.checked)"
          />{{ family.words }}</label
        >
        <details>
          <summary>
            <span
              >{{ family.kinds.length }} kinds{{
                family.leftOut ? ', ' + family.leftOut + ' left out' : ''
              }}</span
            >
          </summary>
          <ul class="sl-plain-list">
            @for (kind of family.kinds; track kind.id) {
              <li>
                <label
                  ><input
                    #use
                    type="checkbox"
                    [checked]="!kind.isOut"
                    [disabled]="!family.isTaken"
                    (change)="toggleKind(kind.id, !use.checked)"
                  /><span
                    >{{ kind.name }} <span class="sl-measured">{{ kind.figure }}</span>
                    <span class="source">{{ kind.size }}{{ kind.source }}</span></span
                  ></label
                >
              </li>
            }
          </ul>
        </details>
      </div>
    }
  `,
  styles: `
    .family {
      display: grid;
      grid-template-columns: 11rem minmax(0, 1fr);
      align-items: start;
      border-block-end: 1px solid var(--sl-hair);
    }
    details[open] {
      grid-column: 1 / -1;
    }
    label {
      display: flex;
      align-items: center;
      gap: 0.5rem;
      min-block-size: 2.75rem;
      cursor: pointer;
    }
    summary {
      min-block-size: 2.75rem;
      display: list-item;
      padding-block: 0.6rem;
      color: var(--sl-quiet);
      font-size: var(--sl-small);
      cursor: pointer;
    }
    .source {
      display: block;
      color: var(--sl-quiet);
      font-size: var(--sl-small);
    }
  `,
})
export class StockChoice {
  readonly taken = input.required<readonly string[]>();
  readonly excluded = input.required<readonly string[]>();
  readonly unit = input.required<LengthUnit>();
  readonly takenChange = output<readonly string[]>();
  readonly excludedChange = output<readonly string[]>();

  protected readonly families = computed(() =>
    (Object.keys(familyWords) as StockFamily[]).map((name) => {
      const kinds = stockLibrary
        .filter((kind) => kind.family === name)
        .map((kind) => ({ ...this.lineOf(kind), isOut: this.excluded().includes(kind.id) }));
      return {
        name,
        words: familyWords[name],
        isTaken: this.taken().includes(name),
        kinds,
        leftOut: kinds.filter((kind) => kind.isOut).length,
      };
    }),
  );

  protected toggleFamily(name: string, isTaken: boolean): void {
    this.takenChange.emit(changed(this.taken(), name, isTaken));
  }

  protected toggleKind(id: string, isOut: boolean): void {
    this.excludedChange.emit(changed(this.excluded(), id, isOut));
  }

  private lineOf(kind: StockKind) {
    const { id, name, source, thickness, uncertainty, outerDiameter, innerDiameter } = kind;
    const length = (value: number): string => lengthText(value, this.unit(), uncertainty);
    const hole = innerDiameter ? `, hole ⌀ ${lengthText(innerDiameter, this.unit())}` : '';
    return {
      id,
      name,
      source,
      figure: `${length(thickness)} ± ${lengthText(uncertainty, this.unit(), 0.001)}`,
      size: outerDiameter ? `⌀ ${lengthText(outerDiameter, this.unit())}${hole}. ` : '',
    };
  }
}

function changed(list: readonly string[], entry: string, isIn: boolean): readonly string[] {
  return isIn ? [...list.filter((one) => one !== entry), entry] : list.filter((one) => one !== entry);
}
