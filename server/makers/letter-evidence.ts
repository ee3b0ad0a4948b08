import { readingUnitSymbols, trialOutcomeWords } from '../../shared/contract/vocabulary.js';
import { fixKindWords, permanenceWords, standingWords } from '../../shared/contract/vocabulary.js';
import { fitVerdictWords, type JointPage, type JointSidePage } from '../../shared/contract/joints.js';
import type { LetterTable } from '../../shared/contract/makers.js';
import type { DimensionConsensus } from '../../shared/contract/measurements.js';
import type { FixView, Trial } from '../../shared/contract/write-ups.js';
import { featureSpecs, type DimensionSpec } from '../../shared/fit/feature-dimensions.js';

const longestNote = 200;

/** Consensus of every dimension that was read on either side of the joint, by revision. */
export function readingsTable(joint: JointPage): LetterTable {
  return {
    caption: 'Readings by owners, consensus with its 95 % interval',
    head: ['Part and revision', 'Feature', 'Dimension', 'Consensus', '95 % interval', 'Readings'],
    rows: [joint.sideA, joint.sideB].flatMap(rowsOfSide),
  };
}

function rowsOfSide(side: JointSidePage): string[][] {
  return side.revisions.flatMap(({ revision, dimensions }) =>
    featureSpecs[side.feature.kind].dimensions.flatMap((spec) => {
      const consensus = dimensions[spec.name];
      if (!consensus) return [];
      return [
        [
          `${side.part.name} ${revision.label}`,
          side.feature.name,
          spec.label,
          figure(consensus.mean, consensus, spec),
          `${figure(consensus.low, consensus, spec)} to ${figure(consensus.high, consensus, spec)}`,
          consensus.thin ? `${consensus.count}, thin evidence` : String(consensus.count),
        ],
      ];
    }),
  );
}

/** To the digits that the interval allows. */
function figure(value: number, { low, high }: DimensionConsensus, { unit }: DimensionSpec): string {
  if (unit === 'count') return value.toFixed(0);
  if (unit === 'deg') return `${value.toFixed(1)}°`;
  return `${value.toFixed((high - low) / 2 < 0.02 ? 3 : 2)} mm`;
}

/** What readings predict and owners report for each pair of revisions. */
export function fitTable(joint: JointPage): LetterTable {
  return {
    caption: `Fit table: ${joint.a.name} down, ${joint.b.name} across`,
    head: ['', ...joint.sideB.revisions.map(({ revision }) => labelOf(revision))],
    rows: joint.sideA.revisions.map(({ revision: a }) => [
      labelOf(a),
      ...joint.sideB.revisions.map(({ revision: b }) => {
        const cell = joint.cells.find((each) => each.revisionA === a.id && each.revisionB === b.id);
        if (!cell) return '';
        const voices = cell.sat + cell.didNotSit === 0 ? '' : `; ${cell.sat} sat, ${cell.didNotSit} did not`;
        return `${fitVerdictWords[cell.verdict]}${voices}`;
      }),
    ]),
  };
}

function labelOf({ label, announced }: { label: string; announced?: true | undefined }): string {
  return announced ? `${label} (announced)` : label;
}

export function fixesTable(fixes: readonly FixView[]): LetterTable {
  return {
    caption: 'Fixes and how far they are borne out',
    head: ['Fix', 'Kind', 'Leaves', 'Standing', 'Held', 'For a while', 'Did not help'],
    rows: fixes.map(({ title, kind, permanence, standing, madeRightFrom, trialCounts }) => [
      title,
      kind ? fixKindWords[kind].label : '',
      permanence ? permanenceWords[permanence] : '',
      `${standingWords[standing].label}${madeRightFrom ? ` from ${madeRightFrom.label}` : ''}`,
      String(trialCounts.held),
      String(trialCounts.heldForAWhile),
      String(trialCounts.didNotHelp),
    ]),
  };
}

export function trialsTable(trials: readonly Trial[], fixes: readonly FixView[]): LetterTable {
  return {
    caption: 'Trials by owners',
    head: ['Fix', 'On', 'Outcome', 'Figure reached', 'In their words'],
    rows: trials.map(({ fixKey, revisions, outcome, figure: reached, note }) => {
      const fix = fixes.find(({ key }) => key === fixKey);
      const unit = fix?.acceptance ? ` ${readingUnitSymbols[fix.acceptance.unit]}` : '';
      return [
        fix?.title ?? 'a fix of an earlier edition',
        revisions.map(({ partName, label }) => `${partName} ${label}`).join(', '),
        trialOutcomeWords[outcome],
        reached === null ? '' : `${reached}${unit}`,
        shortened(note),
      ];
    }),
  };
}

function shortened(note: string): string {
  const line = note.replace(/\s+/g, ' ').trim();
  return line.length <= longestNote ? line : `${line.slice(0, longestNote - 1)}…`;
}
