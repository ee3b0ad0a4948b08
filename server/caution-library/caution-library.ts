import type { Response } from 'express';
import { cautionLibraryRoutes as routes, type LibraryEntry } from '../../shared/contract/caution-library.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import { createLibraryService, type LibraryParts } from './library.service.js';

/** The library of cautions, with its history, and the cautions that were taken from it. */
export function createCautionLibrary(parts: LibraryParts): { bindings: RouteBinding[] } {
  const library = createLibraryService(parts);
  return {
    bindings: [
      bind(routes.readCautionLibrary, async () => ({ items: await library.readLibrary() })),
      bind(routes.readLibraryEntry, async ({ params, response }) =>
        tagged(response, await library.readEntry(params.id)),
      ),
      bind(routes.addLibraryEntry, async ({ caller, body, response }) =>
        tagged(response, await library.addEntry(memberOf(caller).accountId, body)),
      ),
      bind(routes.changeLibraryEntry, async ({ caller, params, version, body, response }) =>
        tagged(response, await library.changeEntry(memberOf(caller).accountId, params.id, version, body)),
      ),
      bind(routes.retireLibraryEntry, async ({ caller, params, version, body, response }) =>
        tagged(response, await library.retireEntry(memberOf(caller).accountId, params.id, version, body.why)),
      ),
      bind(routes.putBackLibraryEntry, async ({ caller, params, version, body, response }) =>
        tagged(
          response,
          await library.putBackEntry(memberOf(caller).accountId, params.id, version, body.why),
        ),
      ),
      bind(routes.orderCautionLibrary, async ({ caller, body }) => ({
        items: await library.order(memberOf(caller).accountId, body.ids),
      })),
      bind(routes.listLibraryVersions, async ({ params }) => ({
        items: await library.listVersions(params.id),
      })),
      bind(routes.compareLibraryVersions, ({ params, query }) => library.compareVersions(params.id, query)),
      bind(routes.listLibraryUses, async ({ params }) => ({ items: await library.listUses(params.id) })),
      bind(routes.applyLibraryEntry, async ({ caller, params, version, body }) => ({
        items: await library.applyEntry(memberOf(caller).accountId, params.id, version, body.cautionIds),
      })),
    ],
  };
}

/** Every answer that carries an entry carries its version as ETag, which the next change names. */
function tagged(response: Response, entry: LibraryEntry): LibraryEntry {
  response.set('ETag', `"${entry.version}"`);
  return entry;
}
