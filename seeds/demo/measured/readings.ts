import { millimetresPerInch } from '../../../shared/fit/dimension.js';
import { dimensionSpec, type DimensionSpec } from '../../../shared/fit/feature-dimensions.js';
import { usualUncertainty } from '../../../shared/fit/instruments.js';
import type { FeatureKind, Instrument } from '../../../shared/contract/vocabulary.js';
import { defaultSpread, type Process } from '../../../shared/statistics/consensus.js';
import { typeA } from '../../../shared/statistics/summary.js';
import { shuffled } from '../random.js';
import { bell } from './bell.js';
import { asTyped, instrumentFor } from './instrument.js';
import { atLetter, type MeasuredFeature } from './measured-shape.js';

/** Somebody who measures. */
export interface Measurer {
  readonly accountId: number;
  readonly since: Date;
  /** Whether the caliper at hand shows inches. */
  readonly inches: boolean;
}

/** A reading of the demo before it is stored. Value and uncertainty mm, degrees or counts. */
export interface Reading {
  /** `part/feature`. */
  readonly feature: string;
  readonly letter: string;
  readonly spec: DimensionSpec;
  readonly entered: readonly number[];
  readonly unit: 'mm' | 'in' | 'deg' | 'count';
  readonly instrument: Instrument;
  readonly value: number;
  readonly uncertainty: number;
  readonly accountId: number;
  readonly createdAt: Date;
  readonly setAsideReason: string | null;
}

/** Mean and standard uncertainty of what was typed, as the service stores it. */
export function stored(
  reading: Pick<Reading, 'entered' | 'unit' | 'instrument' | 'spec'>,
): Pick<Reading, 'value' | 'uncertainty'> {
  const factor = reading.unit === 'in' ? millimetresPerInch : 1;
  const { mean, standardUncertainty } = typeA([...reading.entered]);
  return {
    value: mean * factor,
    uncertainty: Math.hypot(
      usualUncertainty(reading.instrument, reading.spec.unit),
      (standardUncertainty ?? 0) * factor,
    ),
  };
}

/** Readings of one feature on one revision: some people, each with a part of their own, between two days. */
export function readingsOf(around: {
  feature: MeasuredFeature;
  kind: FeatureKind;
  process: Process;
  letter: string;
  from: Date;
  to: Date;
  people: readonly Measurer[];
  next: () => number;
}): Reading[] {
  const { feature, kind, process, letter, from, to, people, next } = around;
  const sizes = Object.entries(feature.sizes).flatMap(([name, values]) => {
    const size = atLetter(values, letter);
    const spec = dimensionSpec(kind, name);
    if (!spec) throw new Error(`The demo measures “${name}” of a ${kind}, which has no such dimension.`);
    return size === undefined ? [] : [{ spec, size }];
  });
  const count = atLetter(feature.people, letter) ?? 4 + Math.floor(next() * 5);
  return shuffled(people, next)
    .slice(0, sizes.length === 0 ? 0 : count)
    .flatMap((person, visit) => {
      const first = Math.max(from.getTime(), person.since.getTime());
      const createdAt = new Date(Math.floor(first + (to.getTime() - first) * next()));
      // Two people at least read everything, so that a pair can be judged.
      return sizes
        .filter(() => visit < 2 || next() > 0.12)
        .map(({ spec, size }) => ({
          feature: `${feature.part}/${feature.feature}`,
          letter,
          createdAt,
          accountId: person.accountId,
          setAsideReason: null,
          ...onePart({ spec, size, process, person, next }),
        }));
    });
}

/** Spread between parts in degrees; lengths have that of their process. */
const angleSpread = 0.4;

function onePart(around: {
  spec: DimensionSpec;
  size: number;
  process: Process;
  person: Measurer;
  next: () => number;
}): Pick<Reading, 'spec' | 'entered' | 'unit' | 'instrument' | 'value' | 'uncertainty'> {
  const { spec, size, process, person, next } = around;
  const instrument = instrumentFor(spec, size, process, next);
  const fromPaper = instrument === 'makers-drawing' || instrument === 'print-model';
  const spread = spec.unit === 'mm' ? defaultSpread[process] : spec.unit === 'deg' ? angleSpread : 0;
  const usual = spec.unit === 'count' ? 0 : usualUncertainty(instrument, spec.unit);
  const part = fromPaper ? size : size + spread * bell(next) + 0.8 * usual * bell(next);
  const repeats = spec.unit === 'count' || fromPaper || next() > 0.3 ? 1 : 3 + Math.floor(next() * 3);
  const values = Array.from({ length: repeats }, () => part + (repeats > 1 ? 0.3 * usual * bell(next) : 0));
  const unit = spec.unit === 'mm' && person.inches && instrument === 'caliper' ? 'in' : spec.unit;
  const entered = values.map((value) =>
    unit === 'in'
      ? Math.round((value / millimetresPerInch) * 2000) / 2000
      : asTyped(value, instrument, spec.unit),
  );
  const typed = { spec, entered, unit, instrument } as const;
  return { ...typed, ...stored(typed) };
}
