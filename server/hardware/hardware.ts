import type { Knex } from 'knex';
import { hardwareBindings } from './hardware.routes.js';
import { createHardwareService, type HardwareService } from './hardware.service.js';
import { createHardwareStore } from './hardware.store.js';
import { createPartPageStore } from './part-page.store.js';
import type { RouteBinding } from '../http/binding.js';

export type { HardwareService };

/** The catalogue of makers, parts and revisions, and the list of symptoms. */
export function createHardware({ knex }: { knex: Knex }): {
  bindings: RouteBinding[];
  service: HardwareService;
} {
  const service = createHardwareService(createHardwareStore(knex), createPartPageStore(knex));
  return { bindings: hardwareBindings(service), service };
}
