import { AngularAppEngine, createRequestHandler } from '@angular/ssr';

const engine = new AngularAppEngine();

/**
 * The page for a request, rendered or, where a route is drawn by the browser alone, as its shell; null when the address
 * belongs to no route. The nonce placeholder `%CSP_NONCE%` stands where the caller puts the nonce of its policy.
 */
export function renderPage(request: Request, context?: unknown): Promise<Response | null> {
  return engine.handle(request, context);
}

/** What the Angular tooling calls while developing. */
export const reqHandler = createRequestHandler((request: Request) => renderPage(request));
