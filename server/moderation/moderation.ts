import type { Knex } from 'knex';
import type { AuditLog } from '../audit/audit.js';
import type { RouteBinding } from '../http/binding.js';
import type { Happenings } from '../watches/happenings.js';
import type { IndexNotice } from '../write-ups/trial.service.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { createCautionService, type CautionService } from './caution.service.js';
import type { DeskClaims } from './claims.js';
import { createDecisionService, type DeskMail } from './decision.service.js';
import { createDeskService } from './desk.service.js';
import { createDeskStore } from './desk.store.js';
import { createPlacedCautionStore } from './placed-caution.store.js';
import { moderationBindings } from './moderation.routes.js';

export interface ModerationSurroundings {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly writeUps: WriteUpService;
  readonly mail: DeskMail;
  readonly searchOutbox: IndexNotice;
  readonly audit: AuditLog;
  readonly happenings: Happenings;
  readonly claims: DeskClaims;
}

/** The moderators' desk: queue, cautions, decisions. */
export function createModeration(around: ModerationSurroundings): {
  bindings: RouteBinding[];
  cautions: CautionService;
} {
  const parts = {
    ...around,
    desk: createDeskStore(around.knex),
    placed: createPlacedCautionStore(around.knex),
  };
  const cautions = createCautionService(parts);
  return {
    cautions,
    bindings: moderationBindings({
      ...createDeskService(parts),
      ...cautions,
      ...createDecisionService(parts),
    }),
  };
}
