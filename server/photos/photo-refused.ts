import { ProblemError } from '../http/problems.js';

/** A file that is no photo this site can take; says why, and what to do instead. */
export class PhotoRefused extends ProblemError {
  constructor(reason: string, remedy: string) {
    super('photo-refused', 422, reason, remedy);
  }
}
