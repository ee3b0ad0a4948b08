import type { Knex } from 'knex';
import { deskPostRoutes as postRoutes } from '../../shared/contract/desk-posts.js';
import { deskQueueRoutes as routes } from '../../shared/contract/desk-queue.js';
import { flagRoutes } from '../../shared/contract/flags.js';
import type { AuditLog } from '../audit/audit.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { DeskWords } from '../mail/desk-mail.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import type { DeskClaims } from './claims.js';
import { createDeskLookService } from './desk-look.service.js';
import { createDeskQueueService } from './desk-queue.service.js';
import { createDeskQueueStore } from './desk-queue.store.js';
import { createFlagService } from './flag.service.js';
import type { TakeDownService } from './take-down.service.js';

/** The desk's one queue, who has what in hand, what members tell it of, and what it looks at after it is posted. */
export function createDesk(around: {
  knex: Knex;
  clock: () => Date;
  audit: AuditLog;
  mail: DeskWords;
  writeUps: Pick<WriteUpService, 'cautionsOfMany'>;
  claims: DeskClaims;
  takeDown: TakeDownService;
  limits: RateLimits;
}): { bindings: RouteBinding[] } {
  const { knex, claims, takeDown, limits } = around;
  const queue = createDeskQueueService({ ...around, store: createDeskQueueStore(knex) });
  const flags = createFlagService(around);
  const looks = createDeskLookService(around);
  return {
    bindings: [
      bind(routes.readDesk, ({ caller, query }) => queue.readDesk(memberOf(caller).accountId, query)),
      bind(routes.readClaim, async ({ params }) => ({ claim: await claims.standing(params) })),
      bind(routes.claimItem, ({ caller, params, body }) =>
        claims.claim(params, memberOf(caller).accountId, body.takeOverFrom),
      ),
      bind(routes.giveUpClaim, ({ caller, params }) => claims.giveUp(params, memberOf(caller).accountId)),
      bind(routes.takeDown, ({ caller, params, body }) =>
        knex.transaction((trx) =>
          takeDown.takeDown(trx, { ...params, ...body, moderatorId: memberOf(caller).accountId }),
        ),
      ),
      bind(routes.putBack, ({ caller, params, body }) =>
        knex.transaction((trx) =>
          takeDown.putBack(trx, { ...params, ...body, moderatorId: memberOf(caller).accountId }),
        ),
      ),
      bind(flagRoutes.tellDesk, async ({ caller, body }) => {
        const { accountId } = memberOf(caller);
        await limits.take('flag', String(accountId));
        await flags.tellDesk(accountId, body);
        return { told: true as const };
      }),
      bind(flagRoutes.readDeskFlag, ({ params }) => flags.readFlag(params.id)),
      bind(flagRoutes.settleFlag, ({ caller, params, body }) =>
        flags.settle(memberOf(caller).accountId, params.id, body),
      ),
      bind(postRoutes.readFirstPost, ({ params }) => looks.readFirstPost(params.id)),
      bind(postRoutes.findPostFine, ({ caller, params }) =>
        looks.findPostFine(memberOf(caller).accountId, params.id),
      ),
      bind(postRoutes.takePostDown, ({ caller, params, body }) =>
        looks.takePostDown(memberOf(caller).accountId, params.id, body.reason),
      ),
      bind(postRoutes.readDeskPhoto, ({ params }) => looks.readPhoto(params.id)),
      bind(postRoutes.findPhotoFine, ({ caller, params }) =>
        looks.findPhotoFine(memberOf(caller).accountId, params.id),
      ),
      bind(postRoutes.takePhotoDown, ({ caller, params, body }) =>
        looks.takePhotoDown(memberOf(caller).accountId, params.id, body.reason),
      ),
    ],
  };
}
