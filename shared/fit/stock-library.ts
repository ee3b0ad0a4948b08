import type { StockKind } from './shim-stack.js';

/**
 * Stock that lies about, with thickness in mm and its source. Uncertainties are standard: a tolerance of ±t counts as
 * rectangular, t/√3 (JCGM 100:2008, 4.3.7). Coin thickness is over the rim; mints publish no tolerance for it, ±0.05 is
 * assumed (from memory).
 */
const halfWidth = (tolerance: number): number => tolerance / Math.sqrt(3);
const coinUncertainty = halfWidth(0.05);

const usMint = 'US Mint, Coin Specifications';
const euro =
  'Euro coin specifications, Reg. (EC) 975/98 diameters; thickness from "The Physical Properties of the Euro Coins"';
const royalMint = 'Royal Mint specification, from memory';

function coin(id: string, name: string, diameter: number, thickness: number, source: string): StockKind {
  return {
    id,
    name,
    family: 'coin',
    thickness,
    uncertainty: coinUncertainty,
    outerDiameter: diameter,
    innerDiameter: 0,
    source,
  };
}

const coins: StockKind[] = [
  coin('us-cent', 'US cent', 19.05, 1.52, usMint),
  coin('us-nickel', 'US nickel', 21.21, 1.95, usMint),
  coin('us-dime', 'US dime', 17.91, 1.35, usMint),
  coin('us-quarter', 'US quarter', 24.26, 1.75, usMint),
  coin('us-half', 'US half dollar', 30.61, 2.15, usMint),
  coin('us-dollar', 'US dollar', 26.49, 2.0, usMint),
  coin('eur-001', '1 euro cent', 16.25, 1.67, euro),
  coin('eur-002', '2 euro cent', 18.75, 1.67, euro),
  coin('eur-005', '5 euro cent', 21.25, 1.67, euro),
  coin('eur-010', '10 euro cent', 19.75, 1.93, euro),
  coin('eur-020', '20 euro cent', 22.25, 2.14, euro),
  coin('eur-050', '50 euro cent', 24.25, 2.38, euro),
  coin('eur-1', '1 euro', 23.25, 2.33, euro),
  coin('eur-2', '2 euro', 25.75, 2.2, euro),
  coin('gbp-1p-steel', 'UK 1p, steel (1992 on)', 20.3, 1.65, royalMint),
  coin('gbp-2p-steel', 'UK 2p, steel (1992 on)', 25.9, 2.03, royalMint),
  coin('gbp-20p', 'UK 20p', 21.4, 1.7, royalMint),
  coin('gbp-50p', 'UK 50p', 27.3, 1.78, royalMint),
  coin('gbp-1', 'UK £1, twelve-sided', 23.43, 2.8, 'Royal Mint, "The most secure coin in the world"'),
];

function washer(size: string, thickness: number, largest: number, inner: number, outer: number): StockKind {
  return {
    id: `iso-7089-${size.toLowerCase().replace('.', '-')}`,
    name: `washer ${size}`,
    family: 'washer',
    thickness,
    uncertainty: halfWidth(largest - thickness),
    outerDiameter: outer,
    innerDiameter: inner,
    source: 'ISO 7089, nominal and largest thickness',
  };
}

const washers: StockKind[] = [
  washer('M2', 0.3, 0.35, 2.2, 5),
  washer('M2.5', 0.5, 0.55, 2.7, 6),
  washer('M3', 0.5, 0.55, 3.2, 7),
  washer('M4', 0.8, 0.9, 4.3, 9),
  washer('M5', 1.0, 1.1, 5.3, 10),
  washer('M6', 1.6, 1.8, 6.4, 12),
  washer('M8', 1.6, 1.8, 8.4, 16),
];

const shimRings: StockKind[] = [0.1, 0.15, 0.2, 0.25, 0.3, 0.5, 1.0].map((thickness) => {
  // The tolerance lies below the nominal thickness: 0/−0.03 up to 0.15, 0/−0.04 up to 0.25, 0/−0.05 above.
  const below = thickness <= 0.15 ? 0.03 : thickness <= 0.25 ? 0.04 : 0.05;
  return {
    id: `din-988-${String(thickness).replace('.', '-')}`,
    name: `shim ring ${thickness.toFixed(2)} mm`,
    family: 'shim-ring',
    thickness: thickness - below / 2,
    uncertainty: halfWidth(below / 2),
    outerDiameter: null,
    innerDiameter: null,
    source: 'DIN 988 stock thicknesses, middle of the tolerance; from memory',
  };
});

const leaves: StockKind[] = [0.05, 0.1, 0.15, 0.2, 0.25, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1.0].map(
  (thickness) => ({
    id: `feeler-${thickness.toFixed(2).replace('.', '-')}`,
    name: `feeler leaf ${thickness.toFixed(2)} mm`,
    family: 'feeler-leaf',
    thickness,
    uncertainty: halfWidth(0.005),
    outerDiameter: null,
    innerDiameter: null,
    available: 1,
    source: 'common set of 13 leaves, from memory',
  }),
);

const sheets: StockKind[] = [
  {
    id: 'paper-80',
    name: 'office paper 80 g/m²',
    family: 'sheet',
    thickness: 0.1016,
    uncertainty: halfWidth(0.005),
    outerDiameter: null,
    innerDiameter: null,
    source: '"Caliper" of 80 g writing paper, 0.004 in, ±5 % (prepressure.com)',
  },
  {
    id: 'drink-can',
    name: 'drink-can wall',
    family: 'sheet',
    thickness: 0.1,
    uncertainty: halfWidth(0.01),
    outerDiameter: null,
    innerDiameter: null,
    source: '"Why aluminium cans are only 0.1 mm thick" (aluminiummagazine.com)',
  },
  {
    id: 'polyimide-tape',
    name: 'polyimide tape "1 mil", film and adhesive',
    family: 'tape',
    thickness: 0.065,
    uncertainty: halfWidth(0.005),
    outerDiameter: null,
    innerDiameter: null,
    source: 'CAPLINQ, "How thick is Polyimide Tape?": 25 µm film + 40 µm adhesive',
  },
  {
    id: 'pvc-tape',
    name: 'PVC electrical tape',
    family: 'tape',
    thickness: 0.13,
    uncertainty: halfWidth(0.02),
    outerDiameter: null,
    innerDiameter: null,
    source: '5 mil light-duty tape, from memory',
  },
];

const layers: StockKind[] = [0.1, 0.2].map((thickness) => ({
  id: `printed-${String(thickness).replace('.', '-')}`,
  name: `printed disc, ${thickness} mm a layer`,
  family: 'printed-layer',
  thickness,
  uncertainty: halfWidth(0.02),
  outerDiameter: null,
  innerDiameter: null,
  source: 'layer height as sliced; common practice, no source',
}));

/** The whole library, by family. */
export const stockLibrary: readonly StockKind[] = [
  ...coins,
  ...washers,
  ...shimRings,
  ...leaves,
  ...sheets,
  ...layers,
];
