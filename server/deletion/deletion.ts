import type { Logger } from 'pino';
import { deletionRoutes as routes } from '../../shared/contract/deletion.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import { createDeletionService, type DeletionParts } from './deletion.service.js';
import { createDeletionRounds, type DeletionRounds, type PhotoRemover } from './deletion.worker.js';
import { createHandOverService } from './hand-over.service.js';

/** Leaving for good, and what becomes of what one wrote. */
export function createDeletion(
  parts: Omit<DeletionParts, 'handOvers'> & { photos: PhotoRemover; logger: Logger },
): { bindings: RouteBinding[] } & DeletionRounds {
  const handOvers = createHandOverService(parts);
  const deletion = createDeletionService({ ...parts, handOvers });
  return {
    bindings: [
      bind(routes.readDeletion, ({ caller }) => deletion.readDeletion(memberOf(caller).accountId)),
      bind(routes.askForDeletion, ({ caller, body }) =>
        deletion.askForDeletion(memberOf(caller).accountId, body),
      ),
      bind(routes.callDeletionOff, ({ caller }) => deletion.callDeletionOff(memberOf(caller).accountId)),
      bind(routes.listHandOvers, async ({ caller }) => ({
        items: await handOvers.listFor(memberOf(caller).accountId),
      })),
      bind(routes.takeHandOver, async ({ caller, params }) => ({
        items: await handOvers.take(params.id, memberOf(caller).accountId),
      })),
      bind(routes.declineHandOver, async ({ caller, params }) => ({
        items: await handOvers.decline(params.id, memberOf(caller).accountId),
      })),
    ],
    ...createDeletionRounds({ ...parts, deletion }),
  };
}
