import { hardwareRoutes as routes } from '../../shared/contract/hardware.js';
import { bind, type RouteBinding } from '../http/binding.js';
import type { HardwareService } from './hardware.service.js';

export function hardwareBindings(hardware: HardwareService): RouteBinding[] {
  return [
    bind(routes.listMakers, async () => ({ items: await hardware.listMakers() })),
    bind(routes.listParts, ({ query }) => hardware.listParts(query)),
    bind(routes.readPart, ({ params }) => hardware.readPart(params.slug)),
    bind(routes.listSymptoms, async () => ({ items: await hardware.listSymptoms() })),
  ];
}
