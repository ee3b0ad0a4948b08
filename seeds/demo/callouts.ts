import type {
  ArrowCallout,
  CalloutUnit,
  DimensionCallout,
  PhotoPoint,
  RingCallout,
} from '../../shared/contract/callouts.js';
import { sheetSize, type Point } from '../drawing/sheet.js';

/** Callouts on a drawing of the demo; places and radius in the pixels of its sheet, where it was drawn. */
export const ring = (key: string, label: string, centre: Point, radius: number): RingCallout => ({
  kind: 'ring',
  key,
  label,
  centre: on(centre),
  radius: share(radius / sheetSize.width),
});

export const arrow = (key: string, label: string, from: Point, to: Point): ArrowCallout => ({
  kind: 'arrow',
  key,
  label,
  from: on(from),
  to: on(to),
});

export const dimension = (
  key: string,
  label: string,
  from: Point,
  to: Point,
  value: number,
  unit: CalloutUnit = 'mm',
): DimensionCallout => ({ kind: 'dimension', key, label, from: on(from), to: on(to), value, unit });

function on([x, y]: Point): PhotoPoint {
  return { x: share(x / sheetSize.width), y: share(y / sheetSize.height) };
}

const share = (value: number): number => Math.round(value * 10_000) / 10_000;
