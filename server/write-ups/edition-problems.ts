import type { FieldProblem } from '../../shared/contract/problem.js';
import { editionStateWords, type EditionState } from '../../shared/contract/vocabulary.js';
import type { MergeGround } from '../../shared/contract/proposed-editions.js';
import type { Draft } from '../../shared/contract/write-ups.js';
import { NotFound, ProblemError } from '../http/problems.js';

/** The draft was saved from elsewhere since the caller read it; carries it as it stands now. */
export class EditionMovedOn extends ProblemError {
  constructor(current: Draft, changed: string[]) {
    super(
      'edition-moved-on',
      412,
      'This draft was saved from somewhere else since you read it.',
      'Compare your text with the one that is there now, then save on top of it.',
      { current, changed },
    );
  }
}

/** Another edition was published since this one was begun; carries both and what differs between them. */
export class EditionOvertaken extends ProblemError {
  constructor({ base, current, changed }: MergeGround) {
    const { number, author } = current.edition;
    super(
      'edition-moved-on',
      409,
      `Edition ${number} by ${author.displayName} was published since this one was begun.`,
      'Merge the two texts, so that nothing of either is lost.',
      { base, current, changed },
    );
  }
}

export class WrongState extends ProblemError {
  constructor(detail: string, remedy: string) {
    super('edition-state', 409, detail, remedy);
  }
}

/** The edition stands elsewhere on its way than the command needs; says where, and what to do from there. */
export function wrongState(
  edition: { state: EditionState; discardedAt: Date | null },
  needed: string,
): WrongState {
  if (edition.discardedAt !== null) {
    return new WrongState(`It was thrown away; only ${needed} can be used for this.`, 'Bring it back first.');
  }
  const remedies: Record<EditionState, string> = {
    draft: 'Hand it to the desk first.',
    returned: 'Hand it to the desk first.',
    submitted: 'Take it back from the desk first.',
    published: 'Start the next edition.',
  };
  return new WrongState(
    `The edition is ${editionStateWords[edition.state]}; only ${needed} can be used for this.`,
    remedies[edition.state],
  );
}

export class NotComplete extends ProblemError {
  constructor(fields: FieldProblem[]) {
    super('not-complete', 422, 'The edition still lacks something.', 'Fill in the fields named.', { fields });
  }
}

export class NoSuchDraft extends NotFound {
  constructor() {
    super('There is no such draft of yours.', 'Look it up in the list of your write-ups.');
  }
}

export class NoSuchWriteUp extends NotFound {
  constructor() {
    super('There is no published write-up of that name.', 'Search for the symptom or the part.');
  }
}
