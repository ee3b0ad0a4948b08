import { z } from 'zod';
import { anyone, route } from './route.js';

const Part = z.object({ ok: z.boolean(), detail: z.string() });
export const Health = z.object({ ok: z.boolean(), database: Part, search: Part, mail: Part, photos: Part });
export type Health = z.infer<typeof Health>;

export const systemRoutes = {
  health: route({
    method: 'get',
    path: '/api/health',
    tag: 'system',
    access: anyone,
    summary: 'Whether database, search, mail and photo store answer (503 when one does not)',
    response: Health,
  }),
  openApi: route({
    method: 'get',
    path: '/api/openapi.json',
    tag: 'system',
    access: anyone,
    summary: 'This document',
    response: z.unknown(),
  }),
  apiPage: route({
    method: 'get',
    path: '/api/reference',
    tag: 'system',
    access: anyone,
    summary: 'This document as a page',
  }),
  apiPageFile: route({
    method: 'get',
    path: '/api/reference/:file',
    tag: 'system',
    access: anyone,
    summary: 'Script and style of that page',
    params: z.object({ file: z.enum(['page.js', 'swagger-ui-bundle.js', 'swagger-ui.css']) }),
  }),
};
