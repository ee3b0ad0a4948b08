import type { DimensionConsensus, Measurement } from '../../../../shared/contract/measurements';
import { coverage95 } from '../../../../shared/fit/dimension';

export interface PlottedDot {
  readonly id: number;
  readonly x: number;
  readonly y: number;
  /** Ends of the 95 % whisker, cut at the edges of the plot. */
  readonly from: number;
  readonly to: number;
  /** Without a say by a moderator's word. */
  readonly isHollow: boolean;
  readonly isSlip: boolean;
  /** Beyond the edge: the dot stands at it and points outwards. */
  readonly beyond: 'low' | 'high' | null;
}

export interface DotPlotLayout {
  readonly width: number;
  readonly height: number;
  readonly dots: readonly PlottedDot[];
  /** Consensus and its 95 % band. */
  readonly line: number | null;
  readonly band: readonly [number, number] | null;
  readonly ticks: readonly { readonly x: number; readonly value: number }[];
}

const width = 360;
const margin = 16;
const top = 10;

/**
 * Places of readings on a scale that holds all that have a say, with their whiskers, and the consensus; the others stand
 * at the edge where they lie beyond. Newest at the bottom. Values in any one unit.
 */
export function layOutDots(
  readings: readonly Measurement[],
  consensus: DimensionConsensus | null,
): DotPlotLayout {
  const step = readings.length > 40 ? 6 : readings.length > 15 ? 10 : 16;
  const [low, high] = domainOf(readings, consensus);
  const place = (value: number): number => margin + ((value - low) / (high - low)) * (width - 2 * margin);
  const clamp = (x: number): number => Math.min(width - margin / 2, Math.max(margin / 2, x));
  const inOrder = [...readings].sort((one, other) => one.id - other.id);
  return {
    width,
    height: top + Math.max(1, readings.length) * step + 30,
    dots: inOrder.map((reading, index) => ({
      id: reading.id,
      x: clamp(place(reading.value)),
      y: top + (index + 0.5) * step,
      from: clamp(place(reading.value - coverage95 * reading.uncertainty)),
      to: clamp(place(reading.value + coverage95 * reading.uncertainty)),
      isHollow: reading.setAside !== null,
      isSlip: reading.unitSlip,
      beyond: reading.value < low ? 'low' : reading.value > high ? 'high' : null,
    })),
    line: consensus && place(consensus.mean),
    band: consensus && [clamp(place(consensus.low)), clamp(place(consensus.high))],
    ticks: ticksBetween(low, high).map((value) => ({ x: place(value), value })),
  };
}

function domainOf(
  readings: readonly Measurement[],
  consensus: DimensionConsensus | null,
): readonly [number, number] {
  const heard = readings.filter((reading) => reading.weight > 0);
  const ends = (heard.length > 0 ? heard : readings).flatMap(({ value, uncertainty }) => [
    value - coverage95 * uncertainty,
    value + coverage95 * uncertainty,
  ]);
  if (consensus) ends.push(consensus.low, consensus.high);
  const [low, high] = [Math.min(...ends), Math.max(...ends)];
  const pad = Math.max((high - low) * 0.06, Math.abs(high) * 1e-4, 1e-3);
  return [low - pad, high + pad];
}

/** Three to five round values between two ends. */
function ticksBetween(low: number, high: number): number[] {
  const rough = (high - low) / 4;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((lead) => lead * power).find((candidate) => candidate >= rough)!;
  const first = Math.ceil(low / step) * step;
  const count = Math.floor((high - first) / step) + 1;
  return Array.from({ length: count }, (_, index) => first + index * step);
}
