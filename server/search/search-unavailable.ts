import { MeilisearchApiError, MeilisearchError } from 'meilisearch';
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

/** Whether the engine could not be asked, as against having refused a question as wrongly put. */
export function isUnavailable(error: unknown): boolean {
  if (error instanceof MeilisearchApiError) return error.response.status !== 400;
  return (
    error instanceof MeilisearchError ||
    (error instanceof Error && (error.name === 'AbortError' || error.name === 'TimeoutError'))
  );
}
