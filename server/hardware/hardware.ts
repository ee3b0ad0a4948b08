import type { Knex } from 'knex';
import { hardwareBindings } from './hardware.routes.js';
import { createHardwareService, type HardwareService } from './hardware.service.js';
import { createHardwareStore } from './hardware.store.js';
import { createPartPageStore } from './part-page.store.js';
import type { RouteBinding } from '../http/binding.js';
import { createRevisionPhotoService } from './revision-photos.service.js';
import { createRevisionStore } from './revision.store.js';

export type { HardwareService };

/** The catalogue of makers, parts and revisions, and the list of symptoms. */
export function createHardware({ knex }: { knex: Knex }): {
  bindings: RouteBinding[];
  service: HardwareService;
} {
  const revisions = createRevisionStore(knex);
  const service = createHardwareService({
    store: createHardwareStore(knex),
    pages: createPartPageStore(knex, revisions),
    revisions,
  });
  const photos = createRevisionPhotoService({ knex, store: revisions });
  return { bindings: hardwareBindings(service, photos), service };
}
