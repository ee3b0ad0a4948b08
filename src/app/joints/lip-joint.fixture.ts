import type { FitCell, JointPage } from '../../../shared/contract/joints';
import type { DimensionConsensus } from '../../../shared/contract/measurements';

export const maker = {
  id: 1,
  slug: 'stonebridge-prints',
  name: 'Stonebridge Prints',
};

/** Consensus of five readings of one dimension, mm. */
export function consensus(mean: number, count = 5): DimensionConsensus {
  return {
    count,
    mean,
    uncertainty: 0.02,
    predictionSpread: 0.05,
    low: mean - 0.04,
    high: mean + 0.04,
    thin: count <= 2,
    unitSlips: 0,
  };
}

export function cell(revisionA: number, revisionB: number, change: Partial<FitCell> = {}): FitCell {
  return {
    revisionA,
    revisionB,
    verdict: 'not-known',
    sentence: 'Nobody has read what would settle this yet.',
    writeUps: [],
    predicted: null,
    sat: 0,
    didNotSit: 0,
    chance: null,
    interval: null,
    contradicts: false,
    ...change,
  };
}

/** A lip of 22.5 mm (bracket Rev 1; nobody has read Rev 2) and recesses of 23 mm (motor Rev B) and 19.5 mm (Rev C). */
export function lipJoint(): JointPage {
  const bracket = {
    id: 1,
    slug: 'belt-bracket',
    name: 'Belt bracket',
    kind: 'motor-bracket' as const,
    maker,
  };
  const motor = {
    id: 2,
    slug: 'm1',
    name: 'M1',
    kind: 'focus-motor' as const,
    maker,
  };
  const recess = (diameter: number) => ({
    diameter: consensus(diameter),
    depth: consensus(2),
  });
  return {
    id: 9,
    slug: 'lip-in-m1',
    name: 'Lip in the M1 recess',
    kind: 'boss-recess',
    a: bracket,
    b: motor,
    sideA: {
      part: bracket,
      feature: { id: 1, slug: 'lip', name: 'raised lip', kind: 'boss' },
      process: 'printed',
      revisions: [
        {
          revision: { id: 11, partId: 1, label: 'Rev 1' },
          attributes: {},
          dimensions: {
            diameter: consensus(22.5),
            height: consensus(1.5),
            plateWidth: consensus(60),
          },
        },
        {
          revision: { id: 12, partId: 1, label: 'Rev 2' },
          attributes: {},
          dimensions: {},
        },
      ],
    },
    sideB: {
      part: motor,
      feature: {
        id: 2,
        slug: 'recess',
        name: 'recess round the shaft',
        kind: 'recess',
      },
      process: 'machined',
      revisions: [
        {
          revision: { id: 21, partId: 2, label: 'Rev B' },
          attributes: {},
          dimensions: recess(23),
        },
        {
          revision: { id: 22, partId: 2, label: 'Rev C' },
          attributes: {},
          dimensions: recess(19.5),
        },
      ],
    },
    cells: [
      cell(11, 21, {
        verdict: 'seats-with-room',
        predicted: 0.99,
        chance: 0.99,
        interval: [0.9, 1],
      }),
      cell(11, 22, {
        verdict: 'will-not-seat',
        predicted: 0.001,
        didNotSit: 4,
        chance: 0.001,
        interval: [0, 0.02],
      }),
      cell(12, 21),
      cell(12, 22),
    ],
    writeUps: [],
  };
}
