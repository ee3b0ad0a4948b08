import cookieParser from 'cookie-parser';
import { doubleCsrf } from 'csrf-csrf';
import type { Request, RequestHandler, Response } from 'express';
import { ProblemError } from './problems.js';

export interface Csrf {
  /** Reads cookies and, on every GET, sees to it that the browser holds a token. */
  readonly issue: RequestHandler[];
  readonly demand: RequestHandler;
  /** Makes a new token; called when the session changes, which the token is bound to. */
  renew(request: Request, response: Response): void;
}

/**
 * Signed double-submit cookie under the names Angular's HttpClient uses by itself: cookie XSRF-TOKEN (readable by the
 * page's script), header X-XSRF-TOKEN.
 */
export function createCsrf(options: { secret: string; secure: boolean }): Csrf {
  const csrf = doubleCsrf({
    getSecret: () => options.secret,
    // Visitors have no session yet; theirs is bound to the secret alone.
    getSessionIdentifier: (request) => (request.user ? request.sessionID : 'visitor'),
    cookieName: 'XSRF-TOKEN',
    cookieOptions: { httpOnly: false, sameSite: 'lax', secure: options.secure, path: '/' },
    getCsrfTokenFromRequest: (request) => request.get('x-xsrf-token'),
  });
  return {
    issue: [
      cookieParser(),
      (request, response, next) => {
        if (request.method === 'GET') csrf.generateCsrfToken(request, response, { overwrite: false, validateOnReuse: false });
        next();
      },
    ],
    demand: (request, _response, next) => {
      if (!csrf.validateRequest(request)) {
        throw new ProblemError(
          'csrf-token-missing', 403, 'The request did not come from a page of this site.', 'Load the page again and repeat what you did; what you typed is kept.',
        );
      }
      next();
    },
    renew(request, response) {
      csrf.generateCsrfToken(request, response, { overwrite: true });
    },
  };
}
