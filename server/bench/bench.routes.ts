import { benchRoutes as routes } from '../../shared/contract/hardware.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { BenchService } from './bench.service.js';

export function benchBindings(bench: BenchService): RouteBinding[] {
  return [
    bind(routes.readBench, async ({ caller }) => ({
      items: await bench.readBench(memberOf(caller).accountId),
    })),
    bind(routes.addToBench, ({ caller, body }) => bench.addToBench(memberOf(caller).accountId, body)),
    bind(routes.changeBenchItem, ({ caller, params, body }) =>
      bench.changeRevision(memberOf(caller).accountId, params.id, body.revisionId),
    ),
    bind(routes.removeFromBench, async ({ caller, params }) => {
      await bench.removeFromBench(memberOf(caller).accountId, params.id);
    }),
  ];
}
