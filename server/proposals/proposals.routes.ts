import { proposalRoutes as routes } from '../../shared/contract/proposals.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { MergeService } from './merge.service.js';
import type { ProposalService } from './proposals.service.js';

export function proposalBindings(
  proposals: ProposalService,
  merges: MergeService,
  limits: RateLimits,
): RouteBinding[] {
  return [
    bind(routes.propose, async ({ caller, body }) => {
      const { accountId } = memberOf(caller);
      await limits.take('proposal', String(accountId));
      return proposals.propose(accountId, body);
    }),
    bind(routes.listMyProposals, ({ caller, query }) =>
      proposals.listMine(memberOf(caller).accountId, query),
    ),
    bind(routes.listDeskProposals, ({ query }) => proposals.listWaiting(query)),
    bind(routes.readDeskProposal, ({ params }) => proposals.readForDesk(params.id)),
    bind(routes.takeProposal, ({ caller, params, body }) =>
      proposals.take(params.id, memberOf(caller).accountId, body.entry),
    ),
    bind(routes.declineProposal, ({ caller, params, body }) =>
      proposals.decline(params.id, memberOf(caller).accountId, body.reason),
    ),
    bind(routes.merge, ({ caller, body }) => merges.merge(memberOf(caller).accountId, body)),
  ];
}
