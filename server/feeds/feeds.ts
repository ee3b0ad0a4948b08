import { createHash } from 'node:crypto';
import type { Response } from 'express';
import type { Knex } from 'knex';
import { feedRoutes as routes } from '../../shared/contract/feeds.js';
import type { RichText } from '../../shared/contract/write-ups.js';
import { bind, type RouteBinding } from '../http/binding.js';
import { atomOf, type Feed } from './atom.js';
import { createFeedService } from './feed.service.js';
import { createFeedStore } from './feed.store.js';

/** How long shared caches may keep a feed, in seconds. */
const keptFor = 300;

export function createFeeds(needs: {
  knex: Knex;
  publicAddress: string;
  renderText: (source: string) => RichText;
  toPlainText: (html: string) => string;
}): { bindings: RouteBinding[] } {
  const service = createFeedService({ ...needs, feeds: createFeedStore(needs.knex) });
  return {
    bindings: [
      bind(routes.writeUpFeed, async ({ response }) => send(response, await service.writeUps())),
      bind(routes.cautionFeed, async ({ response }) => send(response, await service.cautions())),
      bind(routes.partFeed, async ({ response, params }) => send(response, await service.part(params.slug))),
    ],
  };
}

/** Nothing is sent a second time to a reader that has it: Express answers 304 where the tag is the one they name. */
function send(response: Response, feed: Feed): void {
  const xml = atomOf(feed);
  response
    .set({
      'Cache-Control': `public, max-age=${keptFor}`,
      ETag: `"${createHash('sha256').update(xml).digest('base64url').slice(0, 27)}"`,
      'Access-Control-Allow-Origin': '*',
      'Cross-Origin-Resource-Policy': 'cross-origin',
    })
    .type('application/atom+xml')
    .send(xml);
}
