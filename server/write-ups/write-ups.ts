import type { Knex } from 'knex';
import type { RichText } from '../../shared/contract/write-ups.js';
import type { HardwareService } from '../hardware/hardware.js';
import type { RouteBinding } from '../http/binding.js';
import type { MemberCaller } from '../http/caller.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import type { Happenings } from '../watches/happenings.js';
import { createCautionStore } from './caution.store.js';
import { createEditionComparer } from './comparison.js';
import { createDraftReader } from './draft-reader.js';
import { createDraftService } from './draft.service.js';
import { createDraftStore } from './draft.store.js';
import { createEditionViews, type PhotoLookup } from './edition-view.js';
import { createFixStore } from './fix.store.js';
import { createNextEditionService } from './next-edition.service.js';
import { createMadeRightService } from './made-right.service.js';
import { createPageService } from './page.service.js';
import { createPhotoRightsStore } from './photo-rights.store.js';
import { createProposedEditionService } from './proposed-edition.service.js';
import { createProposedEditionStore } from './proposed-edition.store.js';
import { createPublicationService } from './publication.service.js';
import { createPublishedStore } from './published.store.js';
import { createReferenceCheck } from './reference-check.js';
import { createTrialService, type IndexNotice } from './trial.service.js';
import { createTrialStore } from './trial.store.js';
import { createWithdrawalService } from './withdrawal.service.js';
import { createWithdrawalStore } from './withdrawal.store.js';
import { writeUpBindings } from './write-ups.routes.js';

export interface WriteUpSurroundings {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly hardware: HardwareService;
  readonly photos: PhotoLookup;
  readonly renderText: (source: string) => RichText;
  readonly searchOutbox: IndexNotice;
  readonly happenings: Happenings;
  readonly deskInbox: DeskInbox;
}

export type WriteUpService = ReturnType<typeof createWriteUpService>;

/** Write-ups with their drafts, editions and trials. */
export function createWriteUps(around: WriteUpSurroundings): {
  bindings: RouteBinding[];
  service: WriteUpService;
} {
  const service = createWriteUpService(around);
  return { bindings: writeUpBindings(service), service };
}

function createWriteUpService(around: WriteUpSurroundings) {
  const { knex, clock, hardware, photos, happenings } = around;
  const drafts = createDraftStore(knex);
  const published = createPublishedStore(knex);
  const fixes = createFixStore(knex);
  const trials = createTrialStore(knex);
  const cautions = createCautionStore(knex);
  const views = createEditionViews({ ...around, fixes, cautions });
  const comparer = createEditionComparer(hardware, photos);
  const withdrawals = createWithdrawalService({
    knex,
    published,
    withdrawals: createWithdrawalStore(knex),
  });
  const references = createReferenceCheck(hardware, createPhotoRightsStore(knex));
  const reader = createDraftReader({ drafts, published, photos });
  const proposed = createProposedEditionStore(knex);
  const trialService = createTrialService({ ...around, published, fixes, trials });
  const { judgeStandings } = trialService;
  return {
    ...createPageService({ knex, published, drafts, trials, views, comparer, withdrawals }),
    ...createDraftService({ knex, clock, drafts, published, references, views, reader, happenings }),
    ...createNextEditionService({ knex, clock, drafts, published, reader, withdrawals }),
    ...createProposedEditionService({ clock, drafts, reader, proposed, comparer }),
    reportTrial: trialService.reportTrial,
    reportTrialWithin: trialService.reportTrialWithin,
    judgeAnew: trialService.judgeAnew,
    ...createPublicationService({ drafts, fixes, judgeStandings }),
    ...createMadeRightService({ ...around, fixes, published, judgeStandings }),
    /** Every fix that was ever published, by its key. */
    fixesOf: fixes.fixesOf,
    publishedBySlug: published.withContent,
    /** An edition in whatever state, for the desk. */
    editionById: drafts.edition,
    placeOf: reader.placeOf,
    mergeGround: reader.mergeGround,
    publishedContent: published.publishedContent,
    publishedRef: published.publishedRef,
    triersOf: trials.triersOf,
    authorIdsOf: published.authorIds,
    withdrawals,
    cautionsOf: cautions.cautionsOf,
    /** Those that stand whatever the author writes; for the author of the draft only. */
    cautionsOnDraft: async (caller: MemberCaller, id: number) =>
      cautions.cautionsOf((await reader.readOwn(caller, id)).writeUpId),
    cautionsOfMany: cautions.cautionsOfMany,
    viewOf: views.viewOf,
    compare: comparer.compare,
  };
}
