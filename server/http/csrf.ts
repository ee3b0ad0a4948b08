import cookieParser from 'cookie-parser';
import { doubleCsrf } from 'csrf-csrf';
import type { Request, RequestHandler, Response } from 'express';
import { ProblemError } from './problems.js';

const cookieName = 'XSRF-TOKEN';

export interface Csrf {
  /** Reads cookies and, on every GET, sees to it that the browser holds a token that is good for its session. */
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
  const shared = {
    getSecret: () => options.secret,
    // Visitors have no session yet; theirs is bound to the secret alone.
    getSessionIdentifier: (request: Request) => (request.user ? request.sessionID : 'visitor'),
    cookieName,
    cookieOptions: { httpOnly: false, sameSite: 'lax' as const, secure: options.secure, path: '/' },
  };
  const csrf = doubleCsrf({ ...shared, getCsrfTokenFromRequest: (request) => request.get('x-xsrf-token') });
  // The same check with the cookie on both sides tells whether the cookie alone is still good.
  const cookieCheck = doubleCsrf({ ...shared, getCsrfTokenFromRequest: (request) => cookieOf(request) });
  return {
    issue: [
      cookieParser(),
      (request, response, next) => {
        if (request.method === 'GET' && !cookieCheck.validateRequest(request))
          csrf.generateCsrfToken(request, response, { overwrite: true });
        next();
      },
    ],
    demand: (request, _response, next) => {
      if (!csrf.validateRequest(request)) {
        throw new ProblemError(
          'csrf-token-missing',
          403,
          'The request did not come from a page of this site.',
          'Load the page again and repeat what you did; what you typed is kept.',
        );
      }
      next();
    },
    renew(request, response) {
      csrf.generateCsrfToken(request, response, { overwrite: true });
    },
  };
}

function cookieOf(request: Request): string | undefined {
  return (request.cookies as Record<string, string> | undefined)?.[cookieName];
}
