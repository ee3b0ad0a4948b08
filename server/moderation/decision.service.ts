import type { Knex } from 'knex';
import type { AuditLog } from '../audit/audit.js';
import { missingFromContent } from '../../shared/contract/edition-completeness.js';
import type { Happenings } from '../watches/happenings.js';
import { partIdsOf, revisionIdsOf } from '../write-ups/edition-links.js';
import { isOvertaken } from '../write-ups/edition-lines.js';
import { EditionOvertaken, NotComplete } from '../write-ups/edition-problems.js';
import type { IndexNotice } from '../write-ups/trial.service.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { CautionMissing, openHazards } from './caution-missing.js';
import type { DeskClaims } from './claims.js';
import { noSuchEdition } from './desk.service.js';
import type { DeskStore } from './desk.store.js';

/** What the desk needs of the mail: to queue a word to the author in the same transaction. */
export interface DeskMail {
  queueEditionPublished(
    trx: Knex,
    event: { authorId: number; editionId: number; number: number; title: string; slug: string },
  ): Promise<void>;
  queueEditionReturned(
    trx: Knex,
    event: { authorId: number; editionId: number; number: number; title: string; reason: string },
  ): Promise<void>;
}

export interface DecisionParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly writeUps: WriteUpService;
  readonly desk: DeskStore;
  readonly mail: DeskMail;
  readonly searchOutbox: IndexNotice;
  readonly audit: AuditLog;
  readonly happenings: Happenings;
  readonly claims: Pick<DeskClaims, 'demandFree'>;
}

export type DecisionService = ReturnType<typeof createDecisionService>;

/** A moderator's word on an edition. Each is one transaction: of two at once, the second finds the edition decided. */
export function createDecisionService({
  knex,
  clock,
  writeUps,
  desk,
  mail,
  searchOutbox,
  audit,
  happenings,
  claims,
}: DecisionParts) {
  return {
    /** NotComplete, CautionMissing, EditionOvertaken WrongState or ClaimedByAnother say what stands in the way; nothing is changed then. */
    async publishEdition(
      moderatorId: number,
      editionId: number,
      note: string,
    ): Promise<{ slug: string; number: number }> {
      const writeUpId = await writeUpOf(editionId);
      await claims.demandFree({ kind: 'edition', id: editionId }, moderatorId);
      return knex.transaction(async (trx) => {
        const held = await writeUps.holdSubmitted(trx, writeUpId, editionId);
        const { content, authorId } = held.edition;
        if (isOvertaken(held.edition)) throw new EditionOvertaken(await writeUps.mergeGround(held.edition));
        const missing = missingFromContent(content);
        if (missing.length > 0) throw new NotComplete(missing);
        const open = openHazards(content, await writeUps.cautionsOf(writeUpId, trx));
        if (open.length > 0) {
          const remedy = 'Place a caution for each hazard named, or return the edition.';
          throw new CautionMissing(
            'The edition names hazards that no caution answers.',
            remedy,
            content,
            open,
          );
        }
        const at = clock();
        const { slug, number } = await writeUps.publishHeld(trx, held, at);
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'edition-published',
          subject: { kind: 'edition', id: editionId, name: content.title },
          reason: note,
        });
        await happenings.add(trx, {
          kind: 'edition-published',
          key: `edition-published:${editionId}`,
          title: number === 1 ? `New: ${content.title}` : `Edition ${number}: ${content.title}`,
          text: held.edition.changeNote || content.summary,
          path: `/write-ups/${slug}`,
          actorId: authorId,
          about: { parts: partIdsOf(content), revisions: revisionIdsOf(content), writeUps: [writeUpId] },
        });
        await searchOutbox.add(trx, writeUpId);
        await mail.queueEditionPublished(trx, { authorId, editionId, number, title: content.title, slug });
        return { slug, number };
      });
    },

    async returnEdition(moderatorId: number, editionId: number, reason: string): Promise<void> {
      const writeUpId = await writeUpOf(editionId);
      await claims.demandFree({ kind: 'edition', id: editionId }, moderatorId);
      await knex.transaction(async (trx) => {
        const { edition } = await writeUps.holdSubmitted(trx, writeUpId, editionId);
        const { authorId, number, content } = edition;
        await desk.markReturned(trx, editionId, reason, clock());
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'edition-returned',
          subject: { kind: 'edition', id: editionId, name: content.title },
          reason,
        });
        await mail.queueEditionReturned(trx, { authorId, editionId, number, title: content.title, reason });
      });
    },
  };

  // Read outside the transaction: it never changes, and a first read inside would fix what the transaction sees.
  async function writeUpOf(editionId: number): Promise<number> {
    const edition = await writeUps.editionById(editionId);
    if (!edition) throw noSuchEdition();
    return edition.writeUpId;
  }
}
