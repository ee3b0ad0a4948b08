import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import { hazardKindWords } from '../../shared/contract/vocabulary.js';
import type { Caution } from '../../shared/contract/write-ups.js';
import { answerHazards, findHazards, type NamedHazard } from '../../shared/safety/hazards.js';
import { ProblemError } from '../http/problems.js';

/** Hazards stand without a caution; names each with its fix and the words that name it. */
export class CautionMissing extends ProblemError {
  constructor(detail: string, remedy: string, content: EditionContent, open: readonly NamedHazard[]) {
    super('caution-missing', 409, detail, remedy, { fields: open.map((hazard) => fieldOf(content, hazard)) });
  }
}

/** Hazards that a text names and no caution answers. */
export function openHazards(content: EditionContent, cautions: readonly Caution[]): NamedHazard[] {
  return answerHazards(findHazards(content), cautions).flatMap(({ answered, ...named }) =>
    answered ? [] : [named],
  );
}

function fieldOf(content: EditionContent, { hazard, fixKey, fixTitle, words }: NamedHazard): FieldProblem {
  const quoted = words.map((word) => `“${word}”`).join(', ');
  return {
    path: fixKey === null ? '' : `fixes.${content.fixes.findIndex((fix) => fix.key === fixKey)}`,
    message: `${fixTitle === null ? 'The write-up' : `“${fixTitle}”`} names ${quoted}: ${hazardKindWords[hazard]}`,
    remedy: `Place a caution that answers “${hazardKindWords[hazard]}” on ${fixKey === null ? 'the write-up' : 'the fix or the write-up'}.`,
  };
}
