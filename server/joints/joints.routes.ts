import { jointRoutes as routes } from '../../shared/contract/joints.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { JointService } from './joints.service.js';

export function jointBindings(joints: JointService): RouteBinding[] {
  return [
    bind(routes.listJoints, async ({ query }) => ({ items: await joints.list(query.part) })),
    bind(routes.readJoint, ({ params }) => joints.page(params.slug)),
    bind(routes.reportFit, ({ params, caller, body }) =>
      joints.report(params.slug, memberOf(caller).accountId, body),
    ),
    bind(routes.checkFit, ({ query }) => joints.check(query.revision)),
    bind(routes.compareParts, async ({ query }) => ({
      items: await joints.compare(query.part, query.revision),
    })),
  ];
}
