import type { WorksheetKind } from '../contract/worksheet.js';

export interface WorksheetWords {
  readonly title: string;
  /** What it answers, for the list of sheets. */
  readonly answers: string;
  /** How it is worked out, line by line. */
  readonly formulas: readonly { readonly what: string; readonly how: string }[];
  /** What the result does not know. */
  readonly doesNotKnow: readonly string[];
}

/** Stands under every result. */
export const safetySentence =
  "No result here makes a job safe. Follow the maker's instructions and local rules, and have a licensed person do what needs one.";

export const worksheetWords: Record<WorksheetKind, WorksheetWords> = {
  seat: {
    title: 'Seat',
    answers: 'Does a boss go into its recess, or a barrel into its bore, and what is left open if not?',
    formulas: [
      { what: 'Clearance', how: 'c = recess diameter − boss diameter; u(c)² = u(recess)² + u(boss)²' },
      {
        what: 'Chance that it enters',
        how: 'P = Φ(c / u(c)), with Φ the normal distribution; likewise for depth − height',
      },
      {
        what: 'Verdict',
        how: 'seats from P = 0.95, snugly up to 0.05 mm of clearance (machined), 0.10 mm (printed) or 0.20 mm (cast); will not seat up to P = 0.05; tight in between',
      },
      { what: 'Gap', how: 'boss height where it does not enter; height − depth where it bottoms' },
      {
        what: 'Tilt',
        how: 'asin(gap / L), L = (plate width − boss diameter) / 2: the plate tips over the rim until its edge touches',
      },
      { what: 'Out of plane', how: 'face width · sin(tilt)' },
    ],
    doesNotKnow: [
      'whether the parts are round, flat and free of burrs: it takes one diameter for the whole of each',
      'chamfers and fillets, which may let a pair enter a little before it jams',
      'how hard the screws are pulled, and whether the parts give',
      'any lean between screws that are pulled unevenly in steps: it tells the best and the worst',
    ],
  },
  shim: {
    title: 'Shim',
    answers: 'Which stack of coins, washers, shim rings, leaves, sheet or tape comes closest to a gap?',
    formulas: [
      { what: 'Error', how: 'sum of the thicknesses − gap' },
      {
        what: 'Uncertainty',
        how: 'u² = u(gap)² + Σ (n · u(piece))²: pieces of one kind share their deviation, kinds add as squares; the interval is ± 1.96 u',
      },
      {
        what: 'Search',
        how: 'exact: every stack up to the number of pieces allowed is looked at or shown to be worse. Within tolerance: fewer pieces first, then the smaller error',
      },
      {
        what: 'Three points',
        how: 'at least 0.6 of the bolt circle’s radius from the centre; tilt left = atan(2u / (√3 r)), taking the whole of a stack’s uncertainty as a difference between the three',
      },
    ],
    doesNotKnow: [
      'wear, dirt and paint on the pieces: coin figures are the mint’s, over the rim',
      'whether a piece is large enough, or leaves room for the screws: look at the diameters in the list',
      'how far tape and paper give under the screws',
      'whether the gap is the same all round',
    ],
  },
  trim: {
    title: 'Trim',
    answers: 'How much has to come off a boss or out of a recess, and what wall is left?',
    formulas: [
      { what: 'Off the height', how: 'boss height + allowance' },
      { what: 'Open the recess', how: 'boss diameter − recess diameter + clearance wanted' },
      { what: 'New recess', how: 'boss diameter + clearance wanted' },
      {
        what: 'Wall left',
        how: '(outer diameter − new recess) / 2; a warning below 1.2 mm printed, 0.8 mm machined, 1.5 mm cast (common practice, no source)',
      },
    ],
    doesNotKnow: [
      'infill, voids, threads or inserts behind the surface',
      'what the maker says of warranty; what is taken off does not come back',
      'how true your tool runs: leave the last tenth for hand work and try the fit',
      'whether a shim would do, which can be undone: try that first',
    ],
  },
};

/** What each input is called, where it is named away from its field. */
export const inputLabels: Record<string, string> = {
  bossDiameter: 'Diameter of the boss or barrel',
  bossHeight: 'Height or length of the boss or barrel',
  plateWidth: 'Width of the plate',
  recessDiameter: 'Diameter of the recess or bore',
  recessDepth: 'Depth of the recess or bore',
  recessOuter: 'Outer diameter of the wall round the recess',
  faceWidth: 'Face width',
  gap: 'Gap',
  gapUncertainty: 'Uncertainty of the gap',
  tolerance: 'Tolerance',
  mostPieces: 'Most pieces',
  boltCircle: 'Bolt circle',
  families: 'Stock',
  allowance: 'Allowance',
  clearanceWanted: 'Clearance wanted',
};

/** Name of an input for a reader: "Uncertainty of: diameter of the boss or barrel". */
export function inputLabel(field: string): string {
  const own = inputLabels[field];
  if (own) return own;
  const of = inputLabels[field.replace(/Uncertainty$/, '')];
  return of ? `Uncertainty of: ${of.charAt(0).toLowerCase()}${of.slice(1)}` : field;
}
