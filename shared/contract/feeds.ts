import { z } from 'zod';
import { Slug } from './primitives.js';
import { anyone, route } from './route.js';

const tag = 'published knowledge';
/** Feeds by RFC 4287; the newest thirty entries. */
export const feedRoutes = {
  writeUpFeed: route({
    method: 'get',
    path: '/feeds/write-ups.atom',
    tag,
    access: anyone,
    summary: 'Atom feed of published write-ups and their new editions',
  }),
  cautionFeed: route({
    method: 'get',
    path: '/feeds/cautions.atom',
    tag,
    access: anyone,
    summary: 'Atom feed of cautions that the desk placed',
  }),
  partFeed: route({
    method: 'get',
    path: '/feeds/parts/:slug.atom',
    tag,
    access: anyone,
    summary: 'Atom feed of write-ups, cautions and questions about one part',
    params: z.object({ slug: Slug }),
  }),
};
