import type { Dimension } from '../../shared/fit/dimension.js';

/** A dimension the reader has read, in mm, with its standard uncertainty. */
export function read(value: number, uncertainty: number): Dimension {
  return { value, uncertainty, source: { kind: 'own-reading' } };
}

export function exact(value: number): Dimension {
  return read(value, 0);
}
