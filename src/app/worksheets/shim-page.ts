import {
  ChangeDetectionStrategy,
  Component,
  PLATFORM_ID,
  computed,
  effect,
  inject,
  signal,
} from '@angular/core';
import { isPlatformServer } from '@angular/common';
import { ReactiveFormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { drawJoint } from '../../../shared/drawing/joint-drawing';
import type { Dimension } from '../../../shared/fit/dimension';
import { millimetresPerInch } from '../../../shared/fit/dimension';
import { usualUncertainty } from '../../../shared/fit/instruments';
import type { ShimQuestion } from '../../../shared/fit/shim-stack';
import {
  askShim,
  chooseLine,
  findLines,
  usualTolerance,
  type ShimLine,
} from '../../../shared/fit/worksheet-shim';
import { worksheetWords } from '../../../shared/fit/worksheet-words';
import { ShimloreTitles } from '../core/titles';
import { JointDrawing } from '../ui/joint-drawing/joint-drawing';
import { EnterGoesOn } from './enter-goes-on';
import { FigureField } from './figure-field';
import { typedLength } from './length-text';
import { OwnStockPanel } from './own-stock-panel';
import { SheetResult } from './sheet-result';
import { sheetState } from './sheet-state';
import { SheetTools } from './sheet-tools';
import { StackList } from './stack-list';
import { StackPicture } from './stack-picture';
import { StockChoice } from './stock-choice';
import { UnitChoice } from './unit-choice';

/** The best stacks of stock for a gap. */
@Component({
  selector: 'sl-shim-page',
  imports: [
    EnterGoesOn,
    FigureField,
    JointDrawing,
    OwnStockPanel,
    ReactiveFormsModule,
    RouterLink,
    SheetResult,
    SheetTools,
    StackList,
    StackPicture,
    StockChoice,
    UnitChoice,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './shim-page.html',
  styleUrl: './sheet.scss',
})
export class ShimPage {
  protected readonly sheet = sheetState('shim');
  protected readonly form = this.sheet.form;
  protected readonly answers = worksheetWords.shim.answers;
  private readonly onServer = isPlatformServer(inject(PLATFORM_ID));

  protected readonly families = computed(() => this.sheet.texts().families);
  protected readonly excluded = computed(() => this.sheet.texts().excluded);
  protected readonly own = computed(() => this.sheet.texts().own);
  /** Without the choice: choosing among stacks that are found is no new question. */
  private readonly asked = computed(
    () => {
      const inputs = { ...this.sheet.inputs(), chosen: '' };
      return { inputs, outcome: askShim(inputs) };
    },
    { equal: (one, other) => JSON.stringify(one) === JSON.stringify(other) },
  );
  protected readonly problems = computed(() => this.sheet.problemsWith(this.asked().outcome.problems));
  protected readonly needed = computed(() => this.asked().outcome.needed);
  protected readonly question = computed(() =>
    this.problems().length > 0 || this.sheet.isOfOtherVersion() ? null : this.asked().outcome.result,
  );
  private readonly late = signal<{ question: ShimQuestion; lines: readonly ShimLine[] } | null>(null);
  /** Null while a long search is under way. */
  private readonly lines = computed(() => {
    const question = this.question();
    if (!question) return null;
    if (!isLong(question)) return findLines(this.asked().inputs, question);
    const late = this.late();
    return late?.question === question ? late.lines : null;
  });
  protected readonly waiting = computed(() => this.question() !== null && this.lines() === null);
  protected readonly result = computed(() => {
    const [question, lines] = [this.question(), this.lines()];
    return question && lines && chooseLine(question, lines, this.sheet.inputs().chosen);
  });

  protected readonly drawing = computed(() => {
    const shim = this.result()?.chosen?.stack.thickness;
    const { bossDiameter, bossHeight, recessDiameter, recessDepth } = this.sheet.inputs();
    if (shim === undefined || bossDiameter === null || recessDiameter === null) return null;
    return drawJoint({
      kind: 'boss-recess',
      a: {
        dimensions: this.typed({ diameter: bossDiameter, height: bossHeight }),
        attributes: {},
        process: 'printed',
      },
      b: {
        dimensions: this.typed({ diameter: recessDiameter, depth: recessDepth }),
        attributes: {},
        process: 'printed',
      },
      nameA: 'the part with the boss',
      nameB: 'the part with the recess',
      shim,
    });
  });
  protected readonly usualTolerance = computed(() => this.usual(usualTolerance, 2));
  protected readonly usualSpread = computed(() => this.usual(usualUncertainty('caliper', 'mm'), 3));

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({ title: 'Worksheet: shim', description: this.answers, path: '/worksheets/shim' }),
    );
    effect((onCleanup) => {
      const [question, inputs] = [this.question(), this.asked().inputs];
      if (this.onServer || !question || !isLong(question)) return;
      // A tick later, so that what is typed next is not held up.
      const timer = setTimeout(() => this.late.set({ question, lines: findLines(inputs, question) }), 120);
      onCleanup(() => clearTimeout(timer));
    });
  }

  protected setList(name: 'families' | 'excluded' | 'own', list: readonly string[]): void {
    this.sheet.list(name).setValue(list);
  }

  protected choose(key: string): void {
    this.sheet.control('chosen').setValue(key);
  }

  private typed(lengths: Record<string, number | null>): Record<string, Dimension> {
    const factor = this.sheet.unit() === 'in' ? millimetresPerInch : 1;
    const known = Object.entries(lengths).flatMap(([name, value]) =>
      value === null
        ? []
        : [[name, { value: value * factor, uncertainty: 0, source: { kind: 'own-reading' } }]],
    );
    return Object.fromEntries(known) as Record<string, Dimension>;
  }

  private usual(millimetres: number, digits: number): string {
    const unit = this.sheet.unit();
    return Number(typedLength(millimetres, unit)).toFixed(unit === 'in' ? 4 : digits);
  }
}

/** Whether a search may take longer than a keystroke; then it is left to the browser, after a pause. */
function isLong({ stock, mostPieces }: ShimQuestion): boolean {
  return mostPieces > 5 || (mostPieces > 4 && stock.length > 40) || stock.length > 80;
}
