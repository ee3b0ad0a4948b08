import type { z } from 'zod';
import type { Role } from './vocabulary.js';

export const anyone: readonly Role[] = ['visitor', 'member', 'maker', 'moderator', 'administrator'];
export const signedIn: readonly Role[] = ['member', 'maker', 'moderator', 'administrator'];
/** Whoever can speak for a maker; which one, the service asks. */
export const makers: readonly Role[] = ['maker', 'moderator', 'administrator'];
export const moderators: readonly Role[] = ['moderator', 'administrator'];
export const administrators: readonly Role[] = ['administrator'];

/**
 * A route as data. Server wiring, access table, OpenAPI document and the client's typed calls are all derived from it.
 * Path parameters are written `:name`.
 */
export interface RouteDefinition {
  readonly method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  readonly path: string;
  readonly tag: string;
  readonly summary: string;
  /** Who may call it; everybody else gets 401 (visitor) or 403. */
  readonly access: readonly Role[];
  readonly params?: z.ZodType;
  readonly query?: z.ZodType;
  readonly body?: z.ZodType;
  /** Absent: 204 without a body. */
  readonly response?: z.ZodType;
  /** Status of success; 200, or 204 where there is no response. */
  readonly status?: 200 | 201 | 202 | 204 | 303;
  /** Where the body is multipart/form-data with one `file` beside the fields of `body`. */
  readonly multipart?: true;
  /** Carries an ETag, and `If-Match` is demanded: 428 without it, 412 when it is stale. */
  readonly ifMatch?: true;
  /** A change that a member whose posting is limited may make all the same: it is nobody's but their own. */
  readonly limitedMay?: true;
  /** Called by others than the site's own pages, with the proof in the call itself. */
  readonly csrfExempt?: true;
  /** Problem types beyond those every route can answer with. */
  readonly problems?: readonly string[];
}

type Input<S> = S extends z.ZodType ? z.input<S> : undefined;
type Output<S> = S extends z.ZodType ? z.output<S> : undefined;

/** What a caller sends. */
export interface CallOf<R extends RouteDefinition> {
  params: Input<R['params']>;
  query: Input<R['query']>;
  body: Input<R['body']>;
}

/** What a handler gets: parsed and defaulted. */
export interface ParsedCall<R extends RouteDefinition> {
  params: Output<R['params']>;
  query: Output<R['query']>;
  body: Output<R['body']>;
}

export type ResponseOf<R extends RouteDefinition> = Output<R['response']>;

/** Keeps the literal types of a declaration. */
export function route<const R extends RouteDefinition>(definition: R): R {
  return definition;
}
