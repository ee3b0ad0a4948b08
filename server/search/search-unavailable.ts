import { MeilisearchError } from 'meilisearch';
import { ProblemError } from '../http/problems.js';

/** The engine does not answer, or not yet; nothing of the caller's is wrong. */
export class SearchUnavailable extends ProblemError {
  constructor(cause: unknown) {
    super(
      'search-unavailable',
      503,
      'Search does not answer at the moment.',
      'Try again in a minute; the hardware pages list every write-up too.',
      {
        retryAfterSeconds: 30,
      },
    );
    this.cause = cause;
  }
}

/**
 * Whether an error is the engine's. Its refusals count too: every question is put together here out of checked pieces, so
 * one that is refused meets an index without its settings, which the worker is about to mend.
 */
export function isUnavailable(error: unknown): boolean {
  if (error instanceof MeilisearchError) return true;
  return error instanceof Error && (error.name === 'AbortError' || error.name === 'TimeoutError');
}
