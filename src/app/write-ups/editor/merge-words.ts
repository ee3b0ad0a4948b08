import type { Fix, JointEntry, PhotoUse, Reading } from '../../../../shared/contract/edition-content';
import {
  afterwardsWords,
  fixKindWords,
  permanenceWords,
  readingUnitSymbols,
} from '../../../../shared/contract/vocabulary';
import type { PieceField } from './edition-merge';
import { fieldName } from './field-names';

/** Names that a text only holds the numbers of. */
export interface Names {
  partName(id: number | null): string;
  revisionName(id: number): string;
}

/** One piece of a text in words, so that two versions of it can be read side by side; null where it is not there. */
export function wordsOfPiece(field: PieceField, value: unknown, names: Names): string | null {
  if (value === undefined) return null;
  switch (field) {
    case 'joints':
      return (value as JointEntry[]).map((joint) => wordsOfJoint(joint, names)).join('\n');
    case 'symptoms':
      return (value as string[]).map((slug) => slug.replaceAll('-', ' ')).join(', ');
    case 'readings':
      return wordsOfReading(value as Reading, names);
    case 'fixes':
      return wordsOfFix(value as Fix, names);
    case 'photos':
      return [(value as PhotoUse).alt, (value as PhotoUse).caption].filter(Boolean).join('\n');
    default:
      return value as string;
  }
}

/** Heading of a piece: its field, and for an item of a list what it is called on either side. */
export function nameOfPiece(field: PieceField, mine: unknown, theirs: unknown): string {
  const item = (mine ?? theirs) as { title?: string; dimension?: string; alt?: string };
  const called =
    field === 'fixes'
      ? item.title
      : field === 'readings'
        ? item.dimension
        : field === 'photos'
          ? item.alt
          : '';
  return called ? `${fieldName(field)} “${called}”` : fieldName(field);
}

function wordsOfJoint(joint: JointEntry, names: Names): string {
  return [joint.a, joint.b]
    .map((side) => {
      const marks = side.revisions.map(
        (mark) => `${names.revisionName(mark.revisionId)} ${mark.holds ? 'holds' : 'does not hold'}`,
      );
      return [names.partName(side.partId), side.feature, ...marks].filter(Boolean).join('; ');
    })
    .join('\n');
}

function wordsOfReading(reading: Reading, names: Names): string {
  const unit = readingUnitSymbols[reading.unit];
  const figure = reading.value === null ? 'no value' : `${reading.value} ${unit}`;
  const uncertainty = reading.uncertainty === null ? '' : ` ± ${reading.uncertainty} ${unit}`;
  const revision = reading.revisionId === null ? '' : `, ${names.revisionName(reading.revisionId)}`;
  return `${reading.dimension}: ${figure}${uncertainty} (${reading.instrument}${revision})`;
}

function wordsOfFix(fix: Fix, names: Names): string {
  const acceptance = fix.acceptance;
  const lines = [
    fix.title,
    [fix.kind && fixKindWords[fix.kind].label, fix.permanence && permanenceWords[fix.permanence]]
      .filter(Boolean)
      .join(', '),
    fix.why,
    labelled('Tools', fix.tools),
    labelled('Materials', fix.materials),
    ...fix.steps.map((step, index) => `${index + 1}. ${step.text}`),
    labelled(
      'Holds for',
      fix.revisionIds.map((id) => names.revisionName(id)),
    ),
    labelled('Afterwards', [
      ...fix.afterwards.map((one) => afterwardsWords[one]),
      ...(fix.afterwardsNote ? [fix.afterwardsNote] : []),
    ]),
    acceptance &&
      `Acceptance: ${acceptance.quantity} ${acceptance.comparison.replace('-', ' ')} ${acceptance.value} ${readingUnitSymbols[acceptance.unit]}`,
    fix.worksheet && `Worksheet: ${fix.worksheet.result.sentence}`,
  ];
  return lines.filter(Boolean).join('\n');
}

function labelled(label: string, words: readonly string[]): string {
  return words.length === 0 ? '' : `${label}: ${words.join(', ')}`;
}
