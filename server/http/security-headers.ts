import { randomBytes } from 'node:crypto';
import type { RequestHandler } from 'express';
import helmet from 'helmet';

/** Nonce of the page that answers this request; scripts without it do not run. */
export function nonceOf(locals: Record<string, unknown>): string {
  return String(locals['cspNonce']);
}

/** Helmet's headers with a content security policy that runs the app's own scripts only. Styles may be inline. */
export function securityHeaders(options: { secure: boolean }): RequestHandler[] {
  return [
    (_request, response, next) => {
      response.locals['cspNonce'] = randomBytes(16).toString('base64');
      next();
    },
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'self'"],
          baseUri: ["'self'"],
          formAction: ["'self'"],
          frameAncestors: ["'none'"],
          objectSrc: ["'none'"],
          scriptSrc: [
            "'self'",
            (_request, response) =>
              `'nonce-${nonceOf((response as unknown as { locals: Record<string, unknown> }).locals)}'`,
          ],
          scriptSrcAttr: ["'none'"],
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          fontSrc: ["'self'"],
          connectSrc: ["'self'"],
          ...(options.secure ? { upgradeInsecureRequests: [] } : {}),
        },
      },
      strictTransportSecurity: options.secure,
      xFrameOptions: { action: 'deny' },
      crossOriginEmbedderPolicy: false,
      referrerPolicy: { policy: 'strict-origin-when-cross-origin' },
    }),
  ];
}
