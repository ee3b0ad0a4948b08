import { withdrawalRoutes as routes } from '../../shared/contract/withdrawal.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import { createWithdrawalDesk, type WithdrawalDesk, type WithdrawalParts } from './withdrawal.service.js';

/** Write-ups that the desk withdraws and puts back. */
export function createWithdrawals(parts: WithdrawalParts): {
  bindings: RouteBinding[];
  desk: WithdrawalDesk;
} {
  const desk = createWithdrawalDesk(parts);
  return {
    desk,
    bindings: [
      bind(routes.readDeskWriteUp, ({ params }) => desk.readDeskWriteUp(params.slug)),
      bind(routes.withdrawWriteUp, ({ caller, params, body }) =>
        desk.withdrawWriteUp(memberOf(caller).accountId, params.slug, body),
      ),
      bind(routes.putBackWriteUp, ({ caller, params, body }) =>
        desk.putBackWriteUp(memberOf(caller).accountId, params.slug, body.reason),
      ),
    ],
  };
}
