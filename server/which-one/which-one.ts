import type { Knex } from 'knex';
import { whichOneRoutes as routes, type WhichOne } from '../../shared/contract/which-one.js';
import type { HardwareService } from '../hardware/hardware.js';
import { bind, type RouteBinding } from '../http/binding.js';
import { createWhichOneStore } from './which-one.store.js';

/** What tells the revisions of a part apart; the chances are worked out where the reader is (shared/fit/which-revision.ts). */
export function createWhichOne(around: { knex: Knex; clock: () => Date; hardware: HardwareService }): {
  bindings: RouteBinding[];
} {
  const store = createWhichOneStore(around.knex);

  /** NotFound for a slug that no part has or had. */
  async function readWhichOne(slug: string): Promise<WhichOne> {
    const part = await around.hardware.partBySlug(slug);
    const [all, marks, dimensions] = await Promise.all([
      around.hardware.revisionsOfPart(part.id),
      store.marksOf(part),
      store.dimensionsOf(part),
    ]);
    // Nobody holds one that is only announced.
    const revisions = all.filter((revision) => !revision.announced);
    return { part, asOf: around.clock().toISOString().slice(0, 10), revisions, marks, dimensions };
  }

  return { bindings: [bind(routes.readWhichOne, ({ params }) => readWhichOne(params.slug))] };
}
