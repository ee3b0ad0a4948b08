import type { Knex } from 'knex';
import type { RichText } from '../../shared/contract/write-ups.js';
import type { MakerRole } from '../accounts/maker-role.js';
import type { AuditLog } from '../audit/audit.js';
import { createAnnouncingService } from '../hardware/announcing.service.js';
import type { HardwareService } from '../hardware/hardware.js';
import type { RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { JointService } from '../joints/joints.service.js';
import type { MakerMail } from '../mail/maker-mail.js';
import type { DeskClaims } from '../moderation/claims.js';
import type { Happenings } from '../watches/happenings.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { createAnswerService } from './answers.service.js';
import { createConcerned } from './concerned.js';
import { createCorrectingService } from './correcting.service.js';
import { createMakerPageService } from './maker-page.service.js';
import { makerBindings } from './makers.routes.js';
import { createSpeakingService } from './speaking.service.js';
import { createTellingService } from './telling.service.js';
import { wantedReadingsStore } from './wanted-readings.store.js';

/** Makers: who speaks for them, what they answer, announce and make right, and telling them of write-ups. */
export function createMakers(around: {
  knex: Knex;
  clock: () => Date;
  limits: RateLimits;
  mail: MakerMail;
  hardware: HardwareService;
  writeUps: WriteUpService;
  joints: JointService;
  renderText: (source: string) => RichText;
  makerRole: MakerRole;
  audit: AuditLog;
  happenings: Happenings;
  claims: DeskClaims;
  publicAddress: string;
}): { bindings: RouteBinding[] } {
  const concerned = createConcerned(around);
  const services = {
    pages: createMakerPageService(around),
    speaking: createSpeakingService(around),
    answers: createAnswerService({ ...around, concerned }),
    correcting: createCorrectingService({
      ...around,
      concerned,
      announcing: createAnnouncingService(around),
      wanted: wantedReadingsStore,
    }),
    telling: createTellingService({ ...around, concerned }),
  };
  return { bindings: makerBindings(services, around.limits) };
}
