import { deskRoutes as routes } from '../../shared/contract/moderation.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { CautionService } from './caution.service.js';
import type { DecisionService } from './decision.service.js';
import type { DeskService } from './desk.service.js';

export function moderationBindings(desk: DeskService & CautionService & DecisionService): RouteBinding[] {
  return [
    bind(routes.readDeskEdition, ({ params }) => desk.readDeskEdition(params.id)),
    bind(routes.listLibraryCautions, async () => ({ items: await desk.listLibraryCautions() })),
    bind(routes.placeCaution, ({ caller, body }) => desk.placeCaution(memberOf(caller).accountId, body)),
    bind(routes.changeCaution, ({ caller, params, body }) =>
      desk.changeCaution(memberOf(caller).accountId, params.id, body),
    ),
    bind(routes.moveCaution, ({ caller, params, body }) =>
      desk.moveCaution(memberOf(caller).accountId, params.id, body),
    ),
    bind(routes.removeCaution, ({ caller, params }) =>
      desk.removeCaution(memberOf(caller).accountId, params.id),
    ),
    bind(routes.publishEdition, ({ caller, params, body }) =>
      desk.publishEdition(memberOf(caller).accountId, params.id, body.note),
    ),
    bind(routes.returnEdition, ({ caller, params, body }) =>
      desk.returnEdition(memberOf(caller).accountId, params.id, body.reason),
    ),
  ];
}
