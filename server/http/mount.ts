import express, { type Express, type Request, type RequestHandler } from 'express';
import type { z } from 'zod';
import type { RouteDefinition } from '../../shared/contract/route.js';
import type { RouteBinding } from './binding.js';
import type { Caller } from './caller.js';
import { fieldProblems } from './field-problems.js';
import { NotAllowed, NotFound, NotSignedIn, NotValid, PostingLimited, ProblemError } from './problems.js';

const jsonBody = express.json({ limit: '3mb', type: 'application/json' });

/**
 * Serves the bindings. Every declared route must be bound, and only once: anything else ends the start, so that the
 * access table in shared/contract and what is served cannot differ.
 */
export function mountRoutes(
  app: Express,
  declared: Record<string, RouteDefinition>,
  bindings: readonly RouteBinding[],
  guards: { callerOf(request: Request): Caller; csrf: RequestHandler },
): void {
  const bound = new Set<RouteDefinition>();
  for (const binding of bindings) {
    if (bound.has(binding.route)) throw new Error(`Route ${nameOf(binding.route)} is bound twice.`);
    bound.add(binding.route);
  }
  for (const route of Object.values(declared)) {
    if (!bound.delete(route)) throw new Error(`Route ${nameOf(route)} is declared but nothing answers it.`);
  }
  const stray = [...bound][0];
  if (stray) throw new Error(`Route ${nameOf(stray)} is bound but not declared.`);

  for (const binding of bindings) {
    const { route } = binding;
    const changes = route.method !== 'get';
    app[route.method](
      route.path,
      allowOnly(route, guards.callerOf),
      ...(changes && !route.csrfExempt ? [guards.csrf] : []),
      ...(route.body && !route.multipart ? [demandJson, jsonBody] : []),
      ...binding.before,
      answer(binding, guards.callerOf),
    );
  }
}

function nameOf(route: RouteDefinition): string {
  return `${route.method.toUpperCase()} ${route.path}`;
}

function allowOnly(route: RouteDefinition, callerOf: (request: Request) => Caller): RequestHandler {
  const posts = route.method !== 'get' && !route.limitedMay && !route.access.includes('visitor');
  return (request, _response, next) => {
    const caller = callerOf(request);
    const { role } = caller;
    if (!route.access.includes(role)) throw role === 'visitor' ? new NotSignedIn() : new NotAllowed();
    if (posts && role !== 'visitor' && caller.limit) throw new PostingLimited(caller.limit);
    next();
  };
}

const demandJson: RequestHandler = (request, _response, next) => {
  if (request.is('application/json') !== 'application/json') {
    throw new ProblemError(
      'media-type-not-taken',
      415,
      'This address takes JSON only.',
      'Send the body with Content-Type: application/json.',
    );
  }
  next();
};

function answer(binding: RouteBinding, callerOf: (request: Request) => Caller): RequestHandler {
  const { route } = binding;
  return async (request, response) => {
    const params = parsePart(route.params, request.params, 'address');
    const query = parsePart(route.query, listsIn(route.query, request.query), 'query');
    const body = parsePart(route.body, request.body ?? {}, 'body');
    const version = route.ifMatch ? versionOf(request) : undefined;
    const result = await binding.handle({
      params,
      query,
      body,
      version: version as undefined,
      caller: callerOf(request),
      request,
      response,
    });
    if (response.headersSent) return;
    if (!route.response) {
      response.status(204).end();
      return;
    }
    response.status(route.status ?? 200).json(result);
  };
}

function parsePart(
  schema: z.ZodType | undefined,
  value: unknown,
  where: 'address' | 'query' | 'body',
): undefined {
  if (!schema) return undefined;
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data as undefined;
  const fields = fieldProblems(parsed.error.issues);
  if (where === 'address') throw new NotFound(undefined, undefined, fields);
  throw new NotValid(fields, `The ${where} has fields that cannot be taken as they are.`);
}

/** A query that names a list field once (`?part=a`) means a list of one. */
function listsIn(schema: z.ZodType | undefined, query: Request['query']): Record<string, unknown> {
  const shape = (schema as { shape?: Record<string, z.ZodType> } | undefined)?.shape ?? {};
  return Object.fromEntries(
    Object.entries(query).map(([name, value]) => [
      name,
      name in shape && takesList(shape[name]) && !Array.isArray(value) ? [value] : value,
    ]),
  );
}

function takesList(schema: z.ZodType | undefined): boolean {
  const definition = schema?.def as { type?: string; innerType?: z.ZodType } | undefined;
  return (
    definition?.type === 'array' || (definition?.innerType !== undefined && takesList(definition.innerType))
  );
}

function versionOf(request: Request): number {
  const header = request.get('if-match');
  const match = /^"(\d{1,9})"$/.exec(header ?? '');
  if (!match) {
    throw new ProblemError(
      'precondition-needed',
      428,
      'The version that was read must be named.',
      'Send If-Match with the ETag of what you read.',
    );
  }
  return Number(match[1]);
}
