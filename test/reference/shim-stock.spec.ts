import { describe, expect, test } from 'vitest';
import { stockLibrary } from '../../shared/fit/stock-library.js';

const byId = new Map(stockLibrary.map((kind) => [kind.id, kind]));

describe('coins', () => {
  test.each([
    // US Mint, "Coin Specifications".
    ['us-cent', 19.05, 1.52],
    ['us-nickel', 21.21, 1.95],
    ['us-dime', 17.91, 1.35],
    ['us-quarter', 24.26, 1.75],
    ['us-half', 30.61, 2.15],
    ['us-dollar', 26.49, 2.0],
    // "Euro – caratteristiche tecniche" and "The Physical Properties of the Euro Coins"; diameters also Reg. (EC) 975/98.
    ['eur-001', 16.25, 1.67],
    ['eur-002', 18.75, 1.67],
    ['eur-005', 21.25, 1.67],
    ['eur-010', 19.75, 1.93],
    ['eur-020', 22.25, 2.14],
    ['eur-050', 24.25, 2.38],
    ['eur-1', 23.25, 2.33],
    ['eur-2', 25.75, 2.2],
    // Royal Mint; all but the £1 from memory.
    ['gbp-1p-steel', 20.3, 1.65],
    ['gbp-2p-steel', 25.9, 2.03],
    ['gbp-20p', 21.4, 1.7],
    ['gbp-50p', 27.3, 1.78],
    ['gbp-1', 23.43, 2.8],
  ])('%s is %f mm across and %f mm thick', (id, diameter, thickness) => {
    expect(byId.get(id)).toMatchObject({ outerDiameter: diameter, thickness });
  });
});

describe('washers to ISO 7089', () => {
  // engineeringhardware.com "ISO 7089"; thickness also FreeCAD Fasteners workbench, iso7089def.csv.
  test.each([
    ['m2', 0.3, 2.2, 5],
    ['m2-5', 0.5, 2.7, 6],
    ['m3', 0.5, 3.2, 7],
    ['m4', 0.8, 4.3, 9],
    ['m5', 1.0, 5.3, 10],
    ['m6', 1.6, 6.4, 12],
    ['m8', 1.6, 8.4, 16],
  ])('%s is %f mm thick, %f by %f mm', (size, thickness, inner, outer) => {
    expect(byId.get(`iso-7089-${size}`)).toMatchObject({
      thickness,
      innerDiameter: inner,
      outerDiameter: outer,
    });
  });
});

describe('sheets and tapes', () => {
  test('80 g/m² paper is 0.1016 mm thick (prepressure.com, "Caliper": 0.004 in)', () => {
    expect(byId.get('paper-80')?.thickness).toBe(0.1016);
  });
  test('polyimide tape called 1 mil is 0.065 mm with its adhesive (CAPLINQ, "How thick is Polyimide Tape?")', () => {
    expect(byId.get('polyimide-tape')?.thickness).toBe(0.065);
  });
  test('every kind names its source and has a positive uncertainty', () => {
    expect(stockLibrary.filter((kind) => kind.source === '' || !(kind.uncertainty > 0))).toEqual([]);
    expect(new Set(stockLibrary.map((kind) => kind.id)).size).toBe(stockLibrary.length);
  });
});
