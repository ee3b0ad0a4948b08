import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import { hazardKindWords } from '../../shared/contract/vocabulary.js';
import type { Caution } from '../../shared/contract/write-ups.js';
import { answerHazards, findHazards, type NamedHazard } from '../../shared/safety/hazards.js';
import { ProblemError } from '../http/problems.js';

/** Hazards stand without a caution; names each with its fix, its step and the words that name it. */
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

function fieldOf(content: EditionContent, named: NamedHazard): FieldProblem {
  const { hazard, fixKey, fixTitle, step, words } = named;
  const quoted = words.map((word) => `“${word}”`).join(', ');
  const where =
    fixTitle === null ? 'The write-up' : step === null ? `“${fixTitle}”` : `Step ${step} of “${fixTitle}”`;
  const places = [
    ...(step === null ? [] : ['the step']),
    ...(fixKey === null ? [] : ['the fix']),
    'the write-up',
  ];
  return {
    path: pathOf(content, named),
    message: `${where} names ${quoted}: ${hazardKindWords[hazard]}`,
    remedy: `Place a caution that answers “${hazardKindWords[hazard]}” on ${places.join(' or ')}.`,
  };
}

function pathOf(content: EditionContent, { fixKey, step }: NamedHazard): string {
  if (fixKey === null) return '';
  const fix = `fixes.${content.fixes.findIndex((each) => each.key === fixKey)}`;
  return step === null ? fix : `${fix}.steps.${step - 1}`;
}
