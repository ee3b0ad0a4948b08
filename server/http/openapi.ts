import { OpenAPIRegistry, OpenApiGeneratorV31 } from '@asteasolutions/zod-to-openapi';
import { z } from 'zod';
import { Problem, problemTypes } from '../../shared/contract/problem.js';
import type { RouteDefinition } from '../../shared/contract/route.js';

/** OpenAPI 3.1 document of the declared routes; nothing in it is written by hand. */
export function openApiDocument(declared: Record<string, RouteDefinition>, address: string): object {
  const registry = new OpenAPIRegistry();
  registry.registerComponent('securitySchemes', 'session', { type: 'apiKey', in: 'cookie', name: 'shimlore.sid' });
  for (const [name, route] of Object.entries(declared)) {
    registry.registerPath({
      method: route.method,
      path: route.path.replace(/:([a-zA-Z]+)/g, '{$1}'),
      operationId: name,
      tags: [route.tag],
      summary: route.summary,
      description: describe(route),
      ...(route.access.includes('visitor') ? {} : { security: [{ session: [] }] }),
      request: {
        ...(route.params ? { params: route.params as z.ZodObject } : {}),
        ...(route.query ? { query: route.query as z.ZodObject } : {}),
        ...(route.body ? { body: { required: true, content: bodyContent(route) } } : {}),
        ...(route.ifMatch ? { headers: z.object({ 'if-match': z.string() }) } : {}),
      },
      responses: {
        ...(route.response
          ? { [route.status ?? 200]: { description: 'Done', content: { 'application/json': { schema: route.response } } } }
          : { [route.status ?? 204]: { description: 'Done' } }),
        default: { description: 'Problem document (RFC 9457)', content: { 'application/problem+json': { schema: Problem } } },
      },
    });
  }
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Shimlore',
      version: '1',
      description: 'Fit problems between telescope parts: search, write-ups, bench, desk. Lengths in millimetres unless a unit is named.',
    },
    servers: [{ url: address }],
  });
}

function bodyContent(route: RouteDefinition): Record<string, { schema: z.ZodType }> {
  if (!route.multipart) return { 'application/json': { schema: route.body! } };
  const withFile = (route.body as z.ZodObject).extend({ file: z.file() });
  return { 'multipart/form-data': { schema: withFile } };
}

function describe(route: RouteDefinition): string {
  const who = route.access.includes('visitor') ? 'anyone' : route.access.join(', ');
  const problems = (route.problems ?? []).map((type) => `\`${type}\` (${problemTypes[type as keyof typeof problemTypes]})`);
  return [`Who may call it: ${who}.`, ...(problems.length > 0 ? [`Problems: ${problems.join('; ')}.`] : [])].join('\n\n');
}
