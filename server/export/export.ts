import { pipeline } from 'node:stream/promises';
import type { Knex } from 'knex';
import { exportRoutes } from '../../shared/contract/export.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import { createExportService, type PhotoFiles } from './export.service.js';
import { createOwnDataStore } from './own-data.store.js';

/** One's own data to take away. */
export function createExport(needs: {
  knex: Knex;
  photos: PhotoFiles;
  limits: RateLimits;
  clock: () => Date;
}): { bindings: RouteBinding[] } {
  const service = createExportService({ ...needs, ownData: createOwnDataStore(needs.knex) });
  return {
    bindings: [
      bind(exportRoutes.exportOwnData, async ({ caller, request, response }) => {
        const { archive, createdAt } = await service.openArchive(memberOf(caller).accountId);
        response
          .set('Cache-Control', 'private, no-store')
          .type('application/zip')
          .attachment(`shimlore-own-data-${createdAt.toISOString().slice(0, 10)}.zip`);
        try {
          await pipeline(archive, response);
        } catch (error) {
          // The answer has begun: breaking it off is all that is left, and a caller who went away needs no line.
          if (!response.destroyed || (error as NodeJS.ErrnoException).code !== 'ERR_STREAM_PREMATURE_CLOSE')
            request.log.error({ err: error }, 'an export broke off');
        }
      }),
    ],
  };
}
