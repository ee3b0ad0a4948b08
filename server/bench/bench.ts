import type { Knex } from 'knex';
import type { HardwareService } from '../hardware/hardware.js';
import type { RouteBinding } from '../http/binding.js';
import { benchBindings } from './bench.routes.js';
import { createBenchService, type BenchService } from './bench.service.js';
import { createBenchStore } from './bench.store.js';

export type { BenchService };

/** The parts and revisions that a member owns. */
export function createBench(around: { knex: Knex; hardware: HardwareService; clock: () => Date }): {
  bindings: RouteBinding[];
  service: BenchService;
} {
  const service = createBenchService(createBenchStore(around.knex), around.hardware, around.clock);
  return { bindings: benchBindings(service), service };
}
