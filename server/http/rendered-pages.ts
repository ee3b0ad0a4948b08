import type { ErrorRequestHandler, Request as ExpressRequest, RequestHandler } from 'express';
import { errorPage } from './error-page.js';
import { nonceOf } from './security-headers.js';

/** Renders the page for a request; null when the address belongs to no page. */
export type RenderPage = (request: Request) => Promise<Response | null>;

const noncePlaceholder = /%CSP_NONCE%/g;

/**
 * Pages of the app, rendered for each reader. `origin` is what the rendering takes for the site's own address: it is
 * the configured one and never what a request or a proxy claims, so that no header can change what a page says.
 */
export function renderedPages(render: RenderPage, origin: string): RequestHandler {
  return async (request, response, next) => {
    if (request.method !== 'GET' && request.method !== 'HEAD') {
      next();
      return;
    }
    if (!isReadable(request.originalUrl)) throw new UnreadableAddress();
    const page = await render(webRequest(request, origin));
    if (page === null) {
      next();
      return;
    }
    response.status(page.status);
    page.headers.forEach((value, name) => {
      if (name !== 'content-length') response.setHeader(name, value);
    });
    response.setHeader('Cache-Control', 'private, no-cache');
    const body = await page.text();
    response.send(body.replace(noncePlaceholder, nonceOf(response.locals)));
  };
}

class UnreadableAddress extends Error {
  readonly status = 400;
}

/** Whether each percent sign of an address stands for something; the router of the app takes no other. */
function isReadable(address: string): boolean {
  try {
    decodeURIComponent(address);
    return true;
  } catch {
    return false;
  }
}

/** An error page with the request id; the error itself stays in the log. */
export const pageProblemHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  const status = statusOf(error);
  if (status >= 500) request.log.error({ err: error }, 'page failed');
  if (response.headersSent) {
    next(error);
    return;
  }
  response
    .status(status)
    .set('Cache-Control', 'no-store')
    .type('html')
    .send(errorPage(status, String(request.id)));
};

function statusOf(error: unknown): number {
  const { status } = (error ?? {}) as { status?: unknown };
  return typeof status === 'number' && status >= 400 && status < 600 ? status : 500;
}

/** Headers that the rendering may see; proxy headers are not among them. */
const passedOn = ['accept', 'accept-language', 'cookie', 'user-agent'];

function webRequest(request: ExpressRequest, origin: string): Request {
  const headers = new Headers();
  for (const name of passedOn) {
    const value = request.get(name);
    if (value !== undefined) headers.set(name, value);
  }
  // An address may begin with two slashes, which alone would name another host.
  const url = new URL(origin + request.originalUrl.replace(/^\/{2,}/, '/'));
  return new Request(url, { headers });
}
