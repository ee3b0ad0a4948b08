import { OpenAPIRegistry, OpenApiGeneratorV31 } from '@asteasolutions/zod-to-openapi';
import { z } from 'zod';
import { Problem, problemTypes, type ProblemType } from '../../shared/contract/problem.js';
import type { RouteDefinition } from '../../shared/contract/route.js';

type PathConfig = Parameters<OpenAPIRegistry['registerPath']>[0];
type BodyContent = NonNullable<NonNullable<PathConfig['request']>['body']>['content'];

const about = `Fit problems between telescope parts: search, write-ups, bench, desk. Lengths are in millimetres unless a unit is named.

**Changes** need the cookie XSRF-TOKEN, which any GET sets, repeated in the header X-XSRF-TOKEN; bodies are JSON unless multipart is named.

**Problems** are documents by RFC 9457 (\`application/problem+json\`): what went wrong, what to do about it, the fields it is about, and the request id that stands in our log.

**Drafts** carry an ETag. Saving and submitting name it in If-Match: without it the answer is 428, with one that has moved on 412 together with the draft as it stands now.

**Lists** come in pages: \`next\` of one page is \`cursor\` of the following one, null on the last.`;

/** OpenAPI 3.1 document of the declared routes; no route in it is written by hand. */
export function openApiDocument(declared: Record<string, RouteDefinition>, address: string): object {
  const registry = new OpenAPIRegistry();
  registry.registerComponent('securitySchemes', 'session', {
    type: 'apiKey',
    in: 'cookie',
    name: 'shimlore.sid',
  });
  registry.registerComponent('schemas', 'Problem', jsonSchemaOf(Problem));
  for (const [name, route] of Object.entries(declared)) {
    registry.registerPath({
      method: route.method,
      path: route.path.replace(/:([a-zA-Z]+)/g, '{$1}'),
      operationId: name,
      tags: [route.tag],
      summary: route.summary,
      description: descriptionOf(route),
      ...(route.access.includes('visitor') ? {} : { security: [{ session: [] }] }),
      request: requestOf(route),
      responses: responsesOf(route),
    });
  }
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: { title: 'Shimlore', version: '1', description: about },
    servers: [{ url: address }],
  });
}

function requestOf(route: RouteDefinition): NonNullable<PathConfig['request']> {
  const headers = {
    ...(route.ifMatch
      ? { 'if-match': z.string().describe('ETag of the draft as it was read, such as "3"') }
      : {}),
    ...(needsCsrfToken(route)
      ? { 'x-xsrf-token': z.string().describe('Value of the cookie XSRF-TOKEN') }
      : {}),
  };
  return {
    ...(route.params ? { params: route.params as z.ZodObject } : {}),
    ...(route.query ? { query: route.query as z.ZodObject } : {}),
    ...(route.body
      ? { body: { required: true, content: bodyContent(route.body, route.multipart === true) } }
      : {}),
    ...(Object.keys(headers).length > 0 ? { headers: z.object(headers) } : {}),
  };
}

function bodyContent(body: z.ZodType, multipart: boolean): BodyContent {
  if (!multipart) return { 'application/json': { schema: body } };
  return {
    'multipart/form-data': { schema: jsonSchemaOf((body as z.ZodObject).extend({ file: z.file() })) },
  };
}

function responsesOf(route: RouteDefinition): PathConfig['responses'] {
  const done = route.response
    ? {
        [route.status ?? 200]: {
          description: 'Done',
          content: { 'application/json': { schema: route.response } },
        },
      }
    : { [route.status ?? 204]: { description: 'Done' } };
  const problem = (description: string): PathConfig['responses'][string] => ({
    description,
    content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
  });
  return {
    ...done,
    ...(route.access.includes('visitor') ? {} : { 401: problem('Nobody is signed in') }),
    ...(route.access.includes('member') ? {} : { 403: problem('The role does not cover this') }),
    ...(route.ifMatch ? { 412: problem('The draft has moved on'), 428: problem('If-Match is missing') } : {}),
    default: problem('Problem document (RFC 9457)'),
  };
}

function descriptionOf(route: RouteDefinition): string {
  const who = route.access.includes('visitor') ? 'anyone' : route.access.join(', ');
  const problems = (route.problems ?? []).map((type) => `\`${type}\` (${problemTypes[type as ProblemType]})`);
  return [
    `Who may call it: ${who}.`,
    ...(problems.length > 0 ? [`Problems: ${problems.join('; ')}.`] : []),
  ].join('\n\n');
}

function needsCsrfToken(route: RouteDefinition): boolean {
  return route.method !== 'get' && !route.csrfExempt;
}

/** What a caller sends, as JSON Schema; files are binary strings. */
function jsonSchemaOf(schema: z.ZodType): object {
  const { $schema: _, ...rest } = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' });
  return rest;
}
