import type { Acceptance } from '../contract/edition-content.js';
import type { Standing, TrialOutcome } from '../contract/vocabulary.js';

export interface TrialEvidence {
  readonly outcome: TrialOutcome;
  readonly figure: number | null;
  /** The author's own trial does not raise the standing. */
  readonly byAuthor: boolean;
}

/** Whether a trial's figure reaches the fix's acceptance figure; limits belong to it. */
export function passesAcceptance(figure: number, acceptance: Acceptance): boolean {
  return acceptance.comparison === 'at-most' ? figure <= acceptance.value : figure >= acceptance.value;
}

/**
 * How far a fix is borne out: made right (the maker corrected the part), else measured (a trial that held has a figure
 * which passes the acceptance figure), else tried (somebody other than an author reported a trial), else told.
 */
export function standingOf(
  trials: readonly TrialEvidence[],
  acceptance: Acceptance | null,
  madeRight: boolean,
): Standing {
  if (madeRight) return 'made-right';
  const byOthers = trials.filter((trial) => !trial.byAuthor);
  const measured = byOthers.some(
    (trial) =>
      trial.outcome === 'held' &&
      trial.figure !== null &&
      acceptance !== null &&
      passesAcceptance(trial.figure, acceptance),
  );
  if (measured) return 'measured';
  return byOthers.length > 0 ? 'tried' : 'told';
}
