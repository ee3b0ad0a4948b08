import type { LibraryCaution } from '../contract/moderation.js';
import { hazardKindWords } from '../contract/vocabulary.js';
import type { FieldDifference } from '../contract/write-ups.js';
import { wordDifference } from './word-difference.js';

type Words = Omit<LibraryCaution, 'id'>;

const fields: readonly { field: string; label: string; text: (words: Words) => string }[] = [
  { field: 'name', label: 'Name', text: (words) => words.name },
  { field: 'signalWord', label: 'Signal word', text: (words) => words.signalWord },
  { field: 'hazard', label: 'Hazard', text: (words) => words.hazard },
  { field: 'consequence', label: 'What can happen', text: (words) => words.consequence },
  { field: 'avoidance', label: 'How to avoid it', text: (words) => words.avoidance },
  {
    field: 'hazards',
    label: 'What it answers',
    text: (words) => words.hazards.map((hazard) => hazardKindWords[hazard]).join('\n'),
  },
];

/** What changed from one version of a caution to another, field by field and word by word. */
export function cautionDifference(from: Words, to: Words): FieldDifference[] {
  return fields.flatMap(({ field, label, text }) => {
    const [before, after] = [text(from), text(to)];
    return before === after ? [] : [{ field, label, pieces: wordDifference(before, after) }];
  });
}
