import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { fitVerdictWords, type FitCell, type JointPage } from '../../../shared/contract/joints';
import type { Dimension } from '../../../shared/fit/dimension';
import { featureSpecs } from '../../../shared/fit/feature-dimensions';
import type { FeatureOnHand } from '../../../shared/fit/joint-verdict';
import { FitMark } from './fit-mark';
import { chanceWords, figureText, lengthText, percent, tiltText, type LengthUnit } from './fit-words';
import { jointFormulas } from './joint-formulas';
import type { Judged } from './on-hand';

/** What is known of one pair: the sentence first, then the figures, then how they were worked out and from what. */
@Component({
  selector: 'sl-pair-sheet',
  imports: [FitMark, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './pair-sheet.html',
  styleUrl: './pair-sheet.scss',
})
export class PairSheet {
  readonly joint = input.required<JointPage>();
  readonly cell = input.required<FitCell>();
  readonly judged = input.required<Judged>();
  readonly a = input.required<FeatureOnHand>();
  readonly b = input.required<FeatureOnHand>();
  /** Whether the reader's own readings replace the prediction. */
  readonly own = input(false);
  readonly unit = input<LengthUnit>('mm');

  protected readonly verdict = computed(() => this.judged().verdict);
  protected readonly word = computed(() => this.verdict()?.verdict ?? 'not-known');
  protected readonly words = fitVerdictWords;
  protected readonly sentence = computed(
    () => this.verdict()?.sentence ?? `The readings cannot be right together: ${this.judged().wrong ?? ''}`,
  );
  protected readonly chance = computed(() => {
    const predicted = this.verdict()?.chance ?? null;
    if (!this.own()) return chanceWords(this.cell());
    if (predicted === null) return 'not known from your readings';
    return `${percent(predicted)} by your readings; what others report of their parts is left out`;
  });
  protected readonly formulas = computed(() => jointFormulas[this.joint().kind]);
  protected readonly margin = computed(() => {
    const margin = this.verdict()?.margin;
    return margin ? figureText(margin, this.unit()) : null;
  });
  /** Where the faces meet there is neither gap nor tilt to speak of. */
  private readonly standsOff = computed(() => (this.verdict()?.gap?.value ?? 0) > 0);
  protected readonly gap = computed(() => {
    const gap = this.verdict()?.gap;
    return gap && this.standsOff() ? figureText(gap, this.unit()) : null;
  });
  protected readonly tilt = computed(() => {
    const tilt = this.verdict()?.tilt;
    if (!tilt || !this.standsOff()) return null;
    const best = tiltText(tilt.best);
    return tilt.worst
      ? `${best} pulled evenly, up to ${tiltText(tilt.worst)} pulled on one side`
      : `${best} pulled evenly; how far it may tilt needs the width of the plate`;
  });
  protected readonly freeAngles = computed(() => {
    const free = this.verdict()?.freeAngles;
    if (!free) return null;
    if (free.length === 0) return 'none';
    if (free.some(({ from, to }) => to - from >= 360)) return 'all round';
    return free.map(({ from, to }) => `${Math.round(from)}° to ${Math.round(to) % 360}°`).join(', ');
  });
  protected readonly turn = computed(() => {
    const turn = this.verdict()?.turnNeeded ?? null;
    return turn === null
      ? null
      : `turn by ${Math.ceil(Math.abs(turn))}° ${turn < 0 ? 'clockwise' : 'counter-clockwise'}; then camera angle and flats are due`;
  });
  protected readonly iso = computed(() => {
    const fit = this.verdict()?.isoFit;
    if (!fit) return null;
    const at = (micrometres: number): string => String(Math.round(micrometres)).replace('-', '−');
    return `${fit.hole}/${fit.shaft} (${fit.kind}), clearance ${at(fit.smallestClearance)} to ${at(fit.largestClearance)} µm`;
  });
  protected readonly inputs = computed(() =>
    [
      {
        side: this.joint().sideA,
        hand: this.a(),
        revision: this.cell().revisionA,
      },
      {
        side: this.joint().sideB,
        hand: this.b(),
        revision: this.cell().revisionB,
      },
    ].map(({ side, hand, revision }) => ({
      name: `${side.part.name} ${side.revisions.find((entry) => entry.revision.id === revision)?.revision.label ?? ''}`,
      feature: side.feature.name,
      rows: [
        ...featureSpecs[side.feature.kind].dimensions.flatMap((spec) => {
          const dimension = hand.dimensions[spec.name];
          return dimension
            ? [
                {
                  label: spec.label,
                  value: this.valueOf(dimension, spec.unit),
                  source: sourceWords(dimension),
                },
              ]
            : [];
        }),
        ...featureSpecs[side.feature.kind].attributes.flatMap((spec) => {
          const value = hand.attributes[spec.name];
          return value ? [{ label: spec.label, value, source: 'named' }] : [];
        }),
      ],
    })),
  );
  protected readonly missing = computed(() =>
    (this.verdict()?.missing ?? []).map((reading) => ({
      ...reading,
      part: reading.side === 'a' ? this.joint().a : this.joint().b,
    })),
  );

  private valueOf({ value, uncertainty }: Dimension, unit: 'mm' | 'deg' | 'count'): string {
    if (unit === 'count') return String(Math.round(value * 1000) / 1000);
    if (unit === 'deg') return `${value.toFixed(1)} ± ${uncertainty.toFixed(1)}°`;
    const shown = this.unit();
    return `${lengthText(value, uncertainty, shown)} ± ${lengthText(uncertainty, uncertainty, shown)} ${shown}`;
  }
}

function sourceWords({ source }: Dimension): string {
  if (source.kind === 'own-reading') return 'your own reading';
  if (source.kind === 'makers-drawing') return "maker's drawing";
  const readings = source.readings === 1 ? 'one reading' : `consensus of ${source.readings} readings`;
  return source.thin ? `${readings}: thin evidence` : readings;
}
