import { describe, expect, it } from 'vitest';
import {
  figureIn,
  ownPieceIn,
  ownPieceText,
  queryOf,
  readInputs,
  textsOf,
  textsOfQuery,
  worksheetAddress,
} from './worksheet-address.js';
import { emptySeat, emptyShim, emptyTrim, type ShimInputs } from './worksheet.js';

/** A query as the router gives it, from an address. */
function queryIn(address: string): Record<string, string | string[]> {
  const parameters = new URL(address, 'http://localhost').searchParams;
  return Object.fromEntries(
    [...new Set(parameters.keys())].map((name) => {
      const values = parameters.getAll(name);
      return [name, values.length > 1 ? values : values[0]!];
    }),
  );
}

const shim: ShimInputs = {
  ...emptyShim,
  unit: 'in',
  gap: 0.059,
  tolerance: 0,
  layout: 'three-points',
  boltCircle: 1.75,
  families: ['coin', 'tape'],
  excluded: ['us-cent'],
  own: [{ name: 'tin & ~ solder, 20%', thickness: 1.48, uncertainty: 0.01, available: 2 }],
  chosen: 'us-dime.1_pvc-tape.1',
  bossDiameter: 0.886,
};

describe('the address of a worksheet', () => {
  it('gives back every input', () => {
    const back = readInputs('shim', textsOfQuery('shim', queryIn(worksheetAddress('shim', shim))));
    expect(back).toEqual({ inputs: shim, notNumbers: [] });
  });

  it('carries its version and leaves out what is as in an empty sheet', () => {
    expect(worksheetAddress('seat', { ...emptySeat, bossDiameter: 22.5 })).toBe(
      '/worksheets/seat?v=1&bossDiameter=22.5',
    );
  });

  it('tells a list without entries from one that was never touched', () => {
    const none = { ...emptyShim, families: [] };
    expect(readInputs('shim', textsOfQuery('shim', queryIn(worksheetAddress('shim', none)))).inputs).toEqual(
      none,
    );
    expect(readInputs('shim', textsOfQuery('shim', {})).inputs).toEqual(emptyShim);
  });

  it('reads a decimal comma, and names what is no number', () => {
    const texts = {
      ...textsOf<'trim'>(emptyTrim),
      bossDiameter: '22,5',
      bossHeight: '1.5 or so',
      allowance: '.2',
    };
    expect(readInputs('trim', texts)).toEqual({
      inputs: { ...emptyTrim, bossDiameter: 22.5, allowance: 0.2 },
      notNumbers: ['bossHeight'],
    });
  });

  it('takes nothing from words that it does not know', () => {
    const query = { unit: 'furlong', form: ['x', 'y'], families: ['coin', 'gold'], own: 'a~b', other: '1' };
    expect(readInputs('seat', textsOfQuery('seat', query)).inputs).toEqual(emptySeat);
    expect(readInputs('shim', textsOfQuery('shim', query)).inputs).toEqual(emptyShim);
  });

  it('keeps a figure as it was typed until it reads as one', () => {
    expect(queryOf('seat', { bossDiameter: '22.' })).toEqual({ v: '1', bossDiameter: '22.' });
    expect(figureIn('22.')).toBe(22);
    expect(figureIn('2 2')).toBeNaN();
    expect(figureIn('1e400')).toBeNaN();
    expect(figureIn('  ')).toBeNull();
  });

  it('writes a piece of own stock and reads it back', () => {
    const piece = { name: 'strip ~ thin', thickness: 0.2, uncertainty: 0, available: null };
    expect(ownPieceIn(ownPieceText(piece))).toEqual(piece);
    expect(ownPieceIn('0~0~~nothing')).toBeNull();
  });
});
