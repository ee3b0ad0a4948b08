import type { Knex } from 'knex';
import { ownStockRoutes as routes } from '../../shared/contract/own-stock.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import { AlreadyThere, NotFound } from '../http/problems.js';
import { createOwnStockStore } from './own-stock.store.js';

/** A list longer than this would be a shop, and would slow the search for stacks. */
const mostPieces = 100;

/** What members keep for their worksheets: their own shim stock. */
export function createWorksheets({ knex }: { knex: Knex }): { bindings: RouteBinding[] } {
  const store = createOwnStockStore(knex);
  return {
    bindings: [
      bind(routes.listOwnStock, async ({ caller }) => ({
        items: await store.of(memberOf(caller).accountId),
      })),
      bind(routes.addOwnStock, async ({ caller, body }) => {
        const { accountId } = memberOf(caller);
        if ((await store.of(accountId)).length >= mostPieces)
          throw new AlreadyThere(`Your stock has ${mostPieces} pieces already.`, 'Take one off first.');
        const id = await store.add(accountId, body);
        if (id === 'already-there')
          throw new AlreadyThere('You have a piece of that name.', 'Give it another name.');
        return { id, ...body };
      }),
      bind(routes.removeOwnStock, async ({ caller, params }) => {
        if (!(await store.remove(memberOf(caller).accountId, params.id)))
          throw new NotFound('That piece is not in your stock.');
      }),
    ],
  };
}
