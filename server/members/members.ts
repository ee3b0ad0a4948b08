import type { Knex } from 'knex';
import { memberRoutes as routes } from '../../shared/contract/members.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import { createLimitService, type LimitParts } from './limit.service.js';
import { memberLimitStore, type HoldingLimit } from './member-limit.store.js';
import { createMemberReader } from './members.service.js';

/** Looks up the limit that holds on an account; asked on every request of a member. */
export type LimitLookup = (accountId: number) => Promise<HoldingLimit | undefined>;

export function createLimitLookup({ knex, clock }: { knex: Knex; clock: () => Date }): LimitLookup {
  return (accountId) => memberLimitStore.holdingOf(knex, accountId, clock());
}

/** Members as the desk sees them, and the limits it sets. */
export function createMembers(parts: LimitParts): { bindings: RouteBinding[] } {
  const reader = createMemberReader(parts);
  const limits = createLimitService(parts);
  return {
    bindings: [
      bind(routes.readMyLimit, async ({ caller }) => ({
        limit: await reader.readMyLimit(memberOf(caller).accountId),
      })),
      bind(routes.listMembers, ({ query }) => reader.listMembers(query)),
      bind(routes.readMember, ({ caller, params }) => reader.readMember(memberOf(caller), params.id)),
      bind(routes.limitMember, async ({ caller, params, body }) => {
        await limits.limitMember(memberOf(caller), params.id, body);
        return reader.readMember(memberOf(caller), params.id);
      }),
      bind(routes.liftLimit, async ({ caller, params, body }) => {
        const accountId = await limits.liftLimit(memberOf(caller), params.id, body);
        return reader.readMember(memberOf(caller), accountId);
      }),
    ],
  };
}
