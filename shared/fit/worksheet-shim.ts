import type { OwnPiece, ShimInputs, WorksheetFigure, WorksheetSummary } from '../contract/worksheet.js';
import { coverage95, millimetresPerInch } from './dimension.js';
import { usualUncertainty } from './instruments.js';
import {
  bestStacks,
  threePoints,
  type ShimQuestion,
  type ShimStack,
  type StockKind,
  type ThreePoints,
} from './shim-stack.js';
import { stockLibrary } from './stock-library.js';
import { InputCheck, ranges, type Outcome } from './worksheet-range.js';

/** How far a stack may miss where nothing is typed, mm; half of a usual sheet's thickness, common practice, no source. */
export const usualTolerance = 0.05;
const stacksWanted = 8;

export interface ShimLine {
  /** Names the stack in an address: ids and counts. */
  readonly key: string;
  readonly stack: ShimStack;
  /** Only for three points with a bolt circle. */
  readonly points: ThreePoints | null;
}

export interface ShimSheet {
  readonly question: ShimQuestion;
  readonly lines: readonly ShimLine[];
  readonly chosen: ShimLine | null;
  readonly summary: WorksheetSummary;
}

/** The question that the inputs put, or what is out of range. Finding the stacks is the dear part: `findLines`. */
export function askShim(inputs: ShimInputs): Outcome<ShimQuestion> {
  const check = new InputCheck(inputs.unit);
  const gap = check.neededLength('gap', 'gap to fill', inputs.gap, ranges.gap);
  const gapUncertainty = check.length('gapUncertainty', inputs.gapUncertainty, ranges.uncertainty);
  const tolerance = check.length('tolerance', inputs.tolerance, ranges.tolerance);
  const mostPieces = check.count('mostPieces', 'most pieces on top of each other', inputs.mostPieces, 1, 8);
  check.length('boltCircle', inputs.boltCircle, ranges.dimension);
  for (const field of ['bossDiameter', 'bossHeight', 'recessDiameter', 'recessDepth'] as const)
    check.length(field, inputs[field], ranges.dimension);
  const stock = stockOf(inputs);
  if (stock.length === 0)
    check.tell('families', 'No stock is left: tick a family, or add a piece of your own.');
  if (gap === null || mostPieces === null) return check.outcome<ShimQuestion>(null);
  return check.outcome<ShimQuestion>({
    gap,
    gapUncertainty: gapUncertainty ?? usualUncertainty('caliper', 'mm'),
    tolerance: tolerance ?? usualTolerance,
    stock,
    mostPieces,
    wanted: stacksWanted,
    copies: inputs.layout === 'three-points' ? 3 : 1,
  });
}

/** Kinds of stock that a sheet draws from: the families ticked, without those left out, and own pieces. */
export function stockOf(inputs: ShimInputs): readonly StockKind[] {
  const library = stockLibrary.filter(
    (kind) =>
      (inputs.families as readonly string[]).includes(kind.family) && !inputs.excluded.includes(kind.id),
  );
  return [...library, ...inputs.own.map(ownKind)];
}

/** The best stacks for a question, each with where it stands on three points. The dear part: see `bestStacks`. */
export function findLines(inputs: ShimInputs, question: ShimQuestion): readonly ShimLine[] {
  const boltCircle =
    inputs.layout === 'three-points' && inputs.boltCircle !== null
      ? inputs.boltCircle * (inputs.unit === 'in' ? millimetresPerInch : 1)
      : null;
  return bestStacks(question).map((stack) => ({
    key: stack.pieces.map((piece) => `${piece.stock.id}.${piece.count}`).join('_'),
    stack,
    points: boltCircle === null ? null : threePoints(boltCircle, stackUncertainty(stack)),
  }));
}

/** The sheet with the stack of that key chosen, or the first where none has it. */
export function chooseLine(question: ShimQuestion, lines: readonly ShimLine[], key: string): ShimSheet {
  const chosen = lines.find((line) => line.key === key) ?? lines[0] ?? null;
  return { question, lines, chosen, summary: summaryOf(question, chosen) };
}

export function runShim(inputs: ShimInputs): Outcome<ShimSheet> {
  const asked = askShim(inputs);
  const question = asked.result;
  return {
    ...asked,
    result: question && chooseLine(question, findLines(inputs, question), inputs.chosen),
  };
}

/** Pieces in words: "US cent + 2 × shim ring 0.10 mm". */
export function piecesText(stack: ShimStack): string {
  return stack.pieces
    .map(({ stock, count }) => (count > 1 ? `${count} × ${stock.name}` : stock.name))
    .join(' + ');
}

/** Standard uncertainty of the stack's own thickness, without the gap's, mm. */
export function stackUncertainty(stack: ShimStack): number {
  return Math.hypot(...stack.pieces.map((piece) => piece.count * piece.stock.uncertainty));
}

function ownKind(piece: OwnPiece, index: number): StockKind {
  return {
    id: `own-${index + 1}`,
    name: piece.name || `own piece of ${piece.thickness} mm`,
    family: 'own',
    thickness: piece.thickness,
    uncertainty: piece.uncertainty,
    outerDiameter: null,
    innerDiameter: null,
    ...(piece.available === null ? {} : { available: piece.available }),
    source: 'own reading',
  };
}

function summaryOf(question: ShimQuestion, line: ShimLine | null): WorksheetSummary {
  if (!line) return { sentence: 'No stack can be made from this stock.', figures: [] };
  const { stack, points } = line;
  const miss = Math.abs(stack.error);
  const side = miss < 0.005 ? '' : stack.error > 0 ? ' too thick' : ' too thin';
  const half = coverage95 * stack.uncertainty;
  const places = question.copies === 3 ? ', three times,' : '';
  const fit = stack.withinTolerance
    ? `within the ${question.tolerance.toFixed(2)} mm wanted`
    : `which is more than the ${question.tolerance.toFixed(2)} mm wanted`;
  return {
    sentence: `${begun(piecesText(stack))}${places} may fill the gap of ${question.gap.toFixed(2)} mm: ${miss.toFixed(2)} mm${side} (± ${half.toFixed(2)} mm at 95 %), ${fit}.`,
    figures: [
      {
        name: 'thickness',
        label: 'Stack',
        value: stack.thickness,
        uncertainty: stackUncertainty(stack),
        unit: 'mm',
      },
      {
        name: 'error',
        label: 'Stack minus gap',
        value: stack.error,
        uncertainty: stack.uncertainty,
        unit: 'mm',
      },
      ...(points ? pointFigures(points) : []),
    ],
  };
}

function begun(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}

function pointFigures(points: ThreePoints): WorksheetFigure[] {
  return [
    {
      name: 'leastRadius',
      label: 'Least distance of each stack from the centre',
      value: points.leastRadius,
      uncertainty: null,
      unit: 'mm',
    },
    {
      name: 'residualTilt',
      label: 'Tilt left by the spread of the stacks (root mean square)',
      value: points.residualTilt,
      uncertainty: null,
      unit: 'deg',
    },
  ];
}
