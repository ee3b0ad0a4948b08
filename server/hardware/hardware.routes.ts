import { hardwareRoutes as routes } from '../../shared/contract/hardware.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { HardwareService } from './hardware.service.js';
import type { RevisionPhotoService } from './revision-photos.service.js';

export function hardwareBindings(hardware: HardwareService, photos: RevisionPhotoService): RouteBinding[] {
  return [
    bind(routes.listMakers, async () => ({ items: await hardware.listMakers() })),
    bind(routes.listParts, ({ query }) => hardware.listParts(query)),
    bind(routes.readPart, ({ params }) => hardware.readPart(params.slug)),
    bind(routes.listSymptoms, async () => ({ items: await hardware.listSymptoms() })),
    bind(routes.addRevisionPhoto, ({ params, caller, body }) =>
      photos.add(memberOf(caller).accountId, params.id, body),
    ),
    bind(routes.removeRevisionPhoto, ({ params }) => photos.remove(params.id, params.photoId)),
  ];
}
