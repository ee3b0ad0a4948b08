import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { Instrument, instrumentWords } from '../../../shared/contract/vocabulary';
import { drawJoint } from '../../../shared/drawing/joint-drawing';
import type { Dimension } from '../../../shared/fit/dimension';
import { usualUncertainty } from '../../../shared/fit/instruments';
import { runTrim, usualAllowance, usualClearance } from '../../../shared/fit/worksheet-trim';
import { worksheetWords } from '../../../shared/fit/worksheet-words';
import { ShimloreTitles } from '../core/titles';
import { CautionBox } from '../ui/caution-box/caution-box';
import { JointDrawing } from '../ui/joint-drawing/joint-drawing';
import { EnterGoesOn } from './enter-goes-on';
import { FigureField } from './figure-field';
import { lengthText, typedLength } from './length-text';
import { SheetResult } from './sheet-result';
import { sheetState } from './sheet-state';
import { SheetTools } from './sheet-tools';
import { trimCautions } from './trim-cautions';
import { UnitChoice } from './unit-choice';

/** What to take off, the wall that is left, and the cautions before any tool is picked up. */
@Component({
  selector: 'sl-trim-page',
  imports: [
    CautionBox,
    EnterGoesOn,
    FigureField,
    JointDrawing,
    ReactiveFormsModule,
    RouterLink,
    SheetResult,
    SheetTools,
    UnitChoice,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './trim-page.html',
  styleUrl: './sheet.scss',
})
export class TrimPage {
  protected readonly sheet = sheetState('trim');
  protected readonly form = this.sheet.form;
  protected readonly answers = worksheetWords.trim.answers;
  protected readonly instruments = Instrument.options.filter((one) => one !== 'count');
  protected readonly instrumentWords = instrumentWords;
  protected readonly processes = ['printed', 'machined', 'cast'] as const;

  private readonly outcome = computed(() => runTrim(this.sheet.inputs()));
  protected readonly problems = computed(() => this.sheet.problemsWith(this.outcome().problems));
  protected readonly needed = computed(() => this.outcome().needed);
  protected readonly result = computed(() =>
    this.problems().length > 0 || this.sheet.isOfOtherVersion() ? null : this.outcome().result,
  );
  protected readonly cautions = computed(() => {
    const trim = this.result()?.trim;
    return trim?.offDiameter ? trimCautions(trim.hazards) : [];
  });
  /** With the boss taken off whole: what stays of it is drawn, what goes is a thin outline. */
  protected readonly drawing = computed(() => {
    const result = this.result();
    if (!result?.trim.offDiameter) return null;
    const { bossDiameter, bossHeight, recessDiameter, recessDepth, trim } = result;
    const side = (dimensions: Record<string, Dimension>) => ({
      dimensions,
      attributes: {},
      process: this.sheet.inputs().process,
    });
    return drawJoint({
      kind: 'boss-recess',
      a: side({ diameter: bossDiameter, height: bossHeight }),
      b: side({ diameter: recessDiameter, ...(recessDepth ? { depth: recessDepth } : {}) }),
      nameA: 'the part with the boss',
      nameB: 'the part with the recess',
      trim: Math.min(trim.offHeight.value, bossHeight.value),
    });
  });
  protected readonly spread = computed(() =>
    this.usual(usualUncertainty(this.sheet.inputs().instrument, 'mm'), 3),
  );
  protected readonly usualAllowance = computed(() => this.usual(usualAllowance, 2));
  protected readonly usualClearance = computed(() => this.usual(usualClearance, 2));
  protected readonly leastWall = computed(() => {
    const result = this.result();
    return result ? lengthText(result.leastWall, this.sheet.unit()) : '';
  });

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({ title: 'Worksheet: trim', description: this.answers, path: '/worksheets/trim' }),
    );
  }

  private usual(millimetres: number, digits: number): string {
    const unit = this.sheet.unit();
    return Number(typedLength(millimetres, unit)).toFixed(unit === 'in' ? 4 : digits);
  }
}
