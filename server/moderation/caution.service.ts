import type { Knex } from 'knex';
import type { AuditLog } from '../audit/audit.js';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { LibraryCaution, PlaceCaution } from '../../shared/contract/moderation.js';
import type { Caution } from '../../shared/contract/write-ups.js';
import type { CautionPlace } from '../../shared/safety/caution-places.js';
import { FieldNotValid, NotFound } from '../http/problems.js';
import type { Happenings } from '../watches/happenings.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { CautionMissing, openHazards } from './caution-missing.js';
import { noSuchEdition } from './desk.service.js';
import type { CautionWords, PlacedCautionStore } from './placed-caution.store.js';

export interface CautionParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly writeUps: WriteUpService;
  readonly placed: PlacedCautionStore;
  readonly audit: AuditLog;
  readonly happenings: Happenings;
}

export type CautionService = ReturnType<typeof createCautionService>;

/**
 * Cautions hang on a write-up, on one of its fixes or on a step of one, not on an edition: whatever an author writes next, they stay until a
 * moderator takes them off.
 */
export function createCautionService({ knex, clock, writeUps, placed, audit, happenings }: CautionParts) {
  return {
    listLibraryCautions(): Promise<LibraryCaution[]> {
      return placed.library();
    },

    async placeCaution(
      moderatorId: number,
      { editionId, fixKey, stepKey, libraryId, ...words }: PlaceCaution,
    ): Promise<Caution> {
      const edition = await writeUps.editionById(editionId);
      if (!edition || edition.state === 'draft' || edition.discardedAt !== null) throw noSuchEdition();
      const { writeUpId } = edition;
      demandPlace(edition.content, { fixKey, stepKey });
      if (libraryId !== null && !(await placed.isInLibrary(libraryId))) {
        throw new FieldNotValid(
          'libraryId',
          'is not in the library',
          'Choose an entry of the library, or none.',
        );
      }
      const at = clock();
      const id = await knex.transaction(async (trx) => {
        await writeUps.holdWriteUp(trx, writeUpId);
        const fixId = fixKey === null ? null : await writeUps.fixIdOf(trx, writeUpId, fixKey);
        const caution = await placed.place(trx, {
          writeUpId,
          fixId,
          stepKey,
          libraryId,
          words,
          placedBy: moderatorId,
          at,
        });
        await note(trx, 'caution-placed', moderatorId, {
          id: caution,
          writeUpId,
          fixKey,
          stepKey,
          hazard: words.hazard,
        });
        await tell(trx, 'caution-placed', moderatorId, { id: caution, writeUpId, fixKey, ...words });
        return caution;
      });
      return { id, fixKey, stepKey, ...words };
    },

    /** Refused where the new words no longer list a hazard for which the published edition needs it. */
    changeCaution: (moderatorId: number, id: number, words: CautionWords): Promise<Caution> =>
      knex.transaction((trx) => rewordWithin(trx, moderatorId, id, words)),

    /** The same, in the caller's transaction. */
    rewordWithin,

    /** Refused where the published edition needs it where it stands. */
    async moveCaution(
      moderatorId: number,
      id: number,
      { editionId, ...place }: CautionPlace & { editionId: number },
    ): Promise<Caution> {
      const edition = await writeUps.editionById(editionId);
      if (!edition || edition.state === 'draft' || edition.discardedAt !== null) throw noSuchEdition();
      demandPlace(edition.content, place);
      return knex.transaction(async (trx) => {
        const { writeUpId, caution, others } = await hold(trx, id);
        if (writeUpId !== edition.writeUpId) throw noSuchEdition();
        const moved = { ...caution, ...place };
        await demandAnswered(trx, writeUpId, [...others, caution], [...others, moved]);
        const fixId = place.fixKey === null ? null : await writeUps.fixIdOf(trx, writeUpId, place.fixKey);
        await placed.move(trx, id, { fixId, stepKey: place.stepKey });
        const { fixKey, stepKey } = caution;
        await note(trx, 'caution-moved', moderatorId, { ...moved, writeUpId }, { from: { fixKey, stepKey } });
        return moved;
      });
    },

    /** Refused where the published edition names a hazard that only this caution answers. */
    async removeCaution(moderatorId: number, id: number): Promise<void> {
      await knex.transaction(async (trx) => {
        const { writeUpId, caution, others } = await hold(trx, id);
        await demandAnswered(trx, writeUpId, [...others, caution], others);
        await placed.takeOff(trx, id, clock());
        await note(trx, 'caution-removed', moderatorId, { ...caution, writeUpId });
      });
    },
  };

  async function rewordWithin(
    trx: Knex,
    moderatorId: number,
    id: number,
    words: CautionWords,
  ): Promise<Caution> {
    const { writeUpId, caution, others } = await hold(trx, id);
    const reworded = { ...caution, ...words };
    await demandAnswered(trx, writeUpId, [...others, caution], [...others, reworded]);
    await placed.reword(trx, id, words);
    await note(
      trx,
      'caution-changed',
      moderatorId,
      { ...reworded, writeUpId },
      { before: wordsOf(caution), after: words },
    );
    await tell(trx, 'caution-changed', moderatorId, { ...reworded, writeUpId });
    return reworded;
  }

  /** A caution that stands, and the others of its write-up, held until the transaction ends. */
  async function hold(
    trx: Knex,
    id: number,
  ): Promise<{ writeUpId: number; caution: Caution; others: Caution[] }> {
    // Read apart from the transaction: it never changes, and a first read inside would fix what the transaction sees.
    const writeUpId = await placed.writeUpOf(id);
    if (writeUpId === undefined) throw noSuchCaution();
    await writeUps.holdWriteUp(trx, writeUpId);
    const standing = await writeUps.cautionsOf(writeUpId, trx);
    const caution = standing.find((each) => each.id === id);
    if (!caution) throw noSuchCaution();
    return { writeUpId, caution, others: standing.filter((each) => each.id !== id) };
  }

  /** What the published edition already lacked before does not stand in the way of a change that makes it no worse. */
  async function demandAnswered(
    trx: Knex,
    writeUpId: number,
    before: Caution[],
    after: Caution[],
  ): Promise<void> {
    const content = await writeUps.publishedContent(trx, writeUpId);
    if (!content) return;
    const openBefore = openHazards(content, before).map(
      (open) => `${open.hazard} ${open.fixKey} ${open.stepKey}`,
    );
    const opened = openHazards(content, after).filter(
      (open) => !openBefore.includes(`${open.hazard} ${open.fixKey} ${open.stepKey}`),
    );
    if (opened.length === 0) return;
    const remedy =
      'Place another caution for these hazards first, or return an edition that no longer names them.';
    throw new CautionMissing('The published edition needs this caution.', remedy, content, opened);
  }

  function note(
    trx: Knex,
    action: 'caution-placed' | 'caution-changed' | 'caution-moved' | 'caution-removed',
    moderatorId: number,
    caution: { id: number; writeUpId: number; fixKey: string | null; stepKey: string | null; hazard: string },
    more: Record<string, unknown> = {},
  ): Promise<void> {
    const { id, writeUpId, fixKey, stepKey, hazard } = caution;
    return audit.note(trx, {
      actorId: moderatorId,
      action,
      subject: { kind: 'caution', id, name: hazard },
      details: { writeUpId, fixKey, ...(stepKey === null ? {} : { stepKey }), ...more },
    });
  }

  /** Only of a published write-up; whoever tried the fix is told at once. */
  async function tell(
    trx: Knex,
    kind: 'caution-placed' | 'caution-changed',
    moderatorId: number,
    caution: CautionWords & { id: number; writeUpId: number; fixKey: string | null },
  ): Promise<void> {
    const { id, writeUpId, fixKey, signalWord, hazard, consequence, avoidance } = caution;
    const writeUp = await writeUps.publishedRef(trx, writeUpId);
    if (!writeUp) return;
    const tried = await writeUps.triersOf(trx, writeUpId, fixKey);
    await happenings.add(trx, {
      kind,
      key: `${kind}:${id}:${clock().getTime()}`,
      title: `${signalWord.toUpperCase()}: ${hazard}`,
      text: `On “${writeUp.title}”: ${consequence} ${avoidance}`,
      path: `/write-ups/${writeUp.slug}`,
      actorId: moderatorId,
      about: { writeUps: [writeUpId] },
      people: tried.map((accountId) => ({ accountId, atOnce: true })),
    });
  }
}

function wordsOf({ signalWord, hazards, hazard, consequence, avoidance }: Caution): CautionWords {
  return { signalWord, hazards, hazard, consequence, avoidance };
}

/** The edition has the fix, and the fix the step. */
function demandPlace(content: EditionContent, { fixKey, stepKey }: CautionPlace): void {
  const fix = content.fixes.find((each) => each.key === fixKey);
  if (fixKey !== null && !fix) {
    throw new FieldNotValid(
      'fixKey',
      'is not a fix of this edition',
      'Choose one of its fixes, or the whole write-up.',
    );
  }
  if (stepKey !== null && !fix?.steps.some((step) => step.key === stepKey)) {
    throw new FieldNotValid('stepKey', 'is not a step of this fix', 'Choose one of its steps, or all of it.');
  }
}

function noSuchCaution(): NotFound {
  return new NotFound('There is no such caution, or it was taken off.', 'Read the edition again.');
}
