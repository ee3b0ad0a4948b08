import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { RouterLink } from '@angular/router';
import { fitVerdictWords } from '../../../shared/contract/joints';
import { Instrument, instrumentWords } from '../../../shared/contract/vocabulary';
import { queryOf } from '../../../shared/contract/worksheet-address';
import { drawJoint } from '../../../shared/drawing/joint-drawing';
import { usualUncertainty } from '../../../shared/fit/instruments';
import type { IsoFit } from '../../../shared/fit/iso-286';
import { runSeat } from '../../../shared/fit/worksheet-seat';
import { worksheetWords } from '../../../shared/fit/worksheet-words';
import { ShimloreTitles } from '../core/titles';
import { JointDrawing } from '../ui/joint-drawing/joint-drawing';
import { EnterGoesOn } from './enter-goes-on';
import { FigureField } from './figure-field';
import { typedLength } from './length-text';
import { SheetResult } from './sheet-result';
import { sheetState } from './sheet-state';
import { SheetTools } from './sheet-tools';
import { UnitChoice } from './unit-choice';

/** Whether what one typed seats, drawn to scale, and what to do about the gap that is left. */
@Component({
  selector: 'sl-seat-page',
  imports: [
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
  templateUrl: './seat-page.html',
  styleUrl: './sheet.scss',
})
export class SeatPage {
  protected readonly sheet = sheetState('seat');
  protected readonly form = this.sheet.form;
  protected readonly answers = worksheetWords.seat.answers;
  protected readonly instruments = Instrument.options.filter((one) => one !== 'count');
  protected readonly instrumentWords = instrumentWords;
  protected readonly verdictWords = fitVerdictWords;
  protected readonly processes = ['machined', 'printed', 'cast'] as const;

  protected readonly words = computed(() =>
    this.sheet.inputs().form === 'boss-recess'
      ? { inner: 'boss', outer: 'recess', height: 'Height' }
      : { inner: 'barrel', outer: 'bore', height: 'Length' },
  );
  private readonly outcome = computed(() => runSeat(this.sheet.inputs()));
  protected readonly problems = computed(() => this.sheet.problemsWith(this.outcome().problems));
  protected readonly needed = computed(() => this.outcome().needed);
  protected readonly result = computed(() =>
    this.problems().length > 0 || this.sheet.isOfOtherVersion() ? null : this.outcome().result,
  );
  protected readonly drawing = computed(() => {
    const result = this.result();
    const { inner, outer } = this.words();
    return (
      result &&
      drawJoint({
        kind: this.sheet.inputs().form,
        a: result.a,
        b: result.b,
        nameA: `the part with the ${inner}`,
        nameB: `the part with the ${outer}`,
      })
    );
  });
  protected readonly bossSpread = computed(() => this.usualOf(this.sheet.inputs().bossInstrument));
  protected readonly recessSpread = computed(() => this.usualOf(this.sheet.inputs().recessInstrument));
  protected readonly isoText = computed(() => isoText(this.result()?.seat.isoFit ?? null));
  protected readonly shimQuery = computed(() => {
    const gap = this.result()?.gap;
    if (!gap) return null;
    const { unit, bossDiameter, bossHeight, recessDiameter, recessDepth } = this.sheet.texts();
    return queryOf('shim', {
      unit,
      gap: typedLength(gap.value, this.sheet.unit()),
      gapUncertainty: typedLength(gap.uncertainty, this.sheet.unit()),
      bossDiameter,
      bossHeight,
      recessDiameter,
      recessDepth,
    });
  });
  protected readonly trimQuery = computed(() => {
    if (!this.shimQuery() || this.sheet.inputs().form !== 'boss-recess') return null;
    const texts = this.sheet.texts();
    return queryOf('trim', {
      unit: texts.unit,
      bossDiameter: texts.bossDiameter,
      bossDiameterUncertainty: texts.bossDiameterUncertainty,
      bossHeight: texts.bossHeight,
      bossHeightUncertainty: texts.bossHeightUncertainty,
      recessDiameter: texts.recessDiameter,
      recessDiameterUncertainty: texts.recessDiameterUncertainty,
      recessDepth: texts.recessDepth,
      process: texts.recessProcess,
      instrument: texts.bossInstrument,
    });
  });

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({ title: 'Worksheet: seat', description: this.answers, path: '/worksheets/seat' }),
    );
  }

  private usualOf(instrument: Instrument): string {
    return Number(typedLength(usualUncertainty(instrument, 'mm'), this.sheet.unit())).toFixed(
      this.sheet.unit() === 'in' ? 4 : 3,
    );
  }
}

function isoText(fit: IsoFit | null): string {
  if (!fit) return '';
  const { smallestClearance: least, largestClearance: most } = fit;
  const told = (micrometres: number): string => String(micrometres).replace('-', '−');
  return `${fit.hole}/${fit.shaft}, a ${fit.kind} fit: clearance ${told(least)} to ${told(most)} µm`;
}
