import type { Request, RequestHandler, Response } from 'express';
import type { ParsedCall, ResponseOf, RouteDefinition } from '../../shared/contract/route.js';
import type { Caller, MemberCaller } from './caller.js';

/** What a handler is given: the parsed call, who calls, and the raw exchange for the few that stream or set headers. */
export type HandlerContext<R extends RouteDefinition> = ParsedCall<R> & {
  caller: Caller;
  /** Version named by If-Match, on routes with `ifMatch`. */
  version: R['ifMatch'] extends true ? number : undefined;
  request: Request;
  response: Response;
};

export interface RouteBinding {
  readonly route: RouteDefinition;
  readonly before: readonly RequestHandler[];
  readonly handle: (context: HandlerContext<RouteDefinition>) => Promise<unknown>;
}

/**
 * Ties a declared route to what answers it. The handler returns the response body (nothing for 204);
 * one that has written to `response` itself returns undefined.
 */
export function bind<R extends RouteDefinition>(
  route: R,
  handle: (context: HandlerContext<R>) => Promise<ResponseOf<R> extends undefined ? void : ResponseOf<R>>,
  ...before: RequestHandler[]
): RouteBinding {
  return { route, before, handle: handle as RouteBinding['handle'] };
}

/** The account of a caller on a route that is closed to visitors. */
export function memberOf(caller: Caller): MemberCaller {
  if (caller.role === 'visitor')
    throw new TypeError('A route that needs an account is open to visitors in the access table.');
  return caller;
}
