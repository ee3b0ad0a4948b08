import type { Knex } from 'knex';
import type { AuditLog } from '../audit/audit.js';
import type { RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { MeasurementService } from '../measurements/measurements.js';
import type { DeskClaims } from '../moderation/claims.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import type { Happenings } from '../watches/happenings.js';
import { createMergeService, type FollowingWatches, type IndexNotices } from './merge.service.js';
import { createProposalStore } from './proposal.store.js';
import { proposalBindings } from './proposals.routes.js';
import { createProposalService, type ProposalMail } from './proposals.service.js';
import type { ProposalPhotos } from './proposed-photos.js';

/** What members propose for the catalogue, what the desk makes of it, and the merging of what is there twice. */
export function createProposals(around: {
  knex: Knex;
  clock: () => Date;
  limits: RateLimits;
  mail: ProposalMail;
  photos: ProposalPhotos;
  measurements: MeasurementService;
  searchOutbox: IndexNotices;
  audit: AuditLog;
  happenings: Happenings;
  watches: FollowingWatches;
  claims: Pick<DeskClaims, 'demandFree'>;
  deskInbox: DeskInbox;
}): { bindings: RouteBinding[] } {
  const proposals = createProposalService({ ...around, store: createProposalStore(around.knex) });
  return { bindings: proposalBindings(proposals, createMergeService(around), around.limits) };
}
