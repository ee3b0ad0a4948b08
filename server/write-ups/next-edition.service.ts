import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { MergeGround } from '../../shared/contract/proposed-editions.js';
import type { Draft } from '../../shared/contract/write-ups.js';
import type { MemberCaller } from '../http/caller.js';
import { NotFound } from '../http/problems.js';
import type { DraftReader } from './draft-reader.js';
import type { DraftStore } from './draft.store.js';
import { NoSuchWriteUp, WrongState } from './edition-problems.js';
import { publicationStore } from './publication.store.js';
import type { PublishedStore } from './published.store.js';
import type { WithdrawalService } from './withdrawal.service.js';

export interface NextEditionParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly drafts: DraftStore;
  readonly published: PublishedStore;
  readonly reader: DraftReader;
  readonly withdrawals: WithdrawalService;
}

export type NextEditionService = ReturnType<typeof createNextEditionService>;

/**
 * How another edition of a published write-up begins: by its authors, or proposed by anybody who is signed in. One that is
 * withdrawn is mended by its authors and moderators.
 */
export function createNextEditionService({
  knex,
  clock,
  drafts,
  published,
  reader,
  withdrawals,
}: NextEditionParts) {
  return {
    /** The caller's open edition of the write-up, or a new one with the published text and the same keys of its fixes. */
    async startEdition(caller: MemberCaller, slug: string): Promise<Draft> {
      const writeUp = await withdrawals.withHistory(caller, slug);
      const id = await knex.transaction(async (trx) => {
        const base = await lockPublished(trx, writeUp.id);
        const open = await drafts.openEditionOf(trx, writeUp.id, caller.accountId);
        return open ?? addDraft(trx, caller, { writeUpId: writeUp.id, ...base, changeNote: '' });
      });
      return reader.readOwn(caller, id);
    },

    /** A new edition with the text of an earlier one, on the base of what is published; WrongState where one is under way. */
    async bringEditionBack(caller: MemberCaller, slug: string, number: number): Promise<Draft> {
      const writeUp = await withdrawals.withHistory(caller, slug);
      const earlier = (await published.editionsOf(writeUp.id)).find((edition) => edition.number === number);
      const content = earlier && (await published.contents([earlier.id])).get(earlier.id);
      if (!content)
        throw new NotFound(
          `There is no published edition ${number}.`,
          'Choose one from the list of editions.',
        );
      const id = await knex.transaction(async (trx) => {
        const { baseEditionId } = await lockPublished(trx, writeUp.id);
        if (baseEditionId === earlier.id) {
          throw new WrongState('That edition is the one that is published.', 'Choose an earlier one.');
        }
        if ((await drafts.openEditionOf(trx, writeUp.id, caller.accountId)) !== undefined) {
          throw new WrongState(
            'You have another edition of this write-up under way.',
            'Finish it or throw it away first; it is in the list of your write-ups.',
          );
        }
        const changeNote = `Brings edition ${number} back`;
        return addDraft(trx, caller, { writeUpId: writeUp.id, baseEditionId, content, changeNote });
      });
      return reader.readOwn(caller, id);
    },

    async readMergeGround(caller: MemberCaller, id: number): Promise<MergeGround> {
      return reader.mergeGround(await reader.ownEdition(caller, id));
    },
  };

  /** Holds the write-up; gives the edition that is published, or was before it was withdrawn. */
  async function lockPublished(
    trx: Knex,
    writeUpId: number,
  ): Promise<{ baseEditionId: number; content: EditionContent }> {
    const baseEditionId = (await publicationStore.lockWriteUp(trx, writeUpId))?.publishedEditionId ?? null;
    if (baseEditionId === null) throw new NoSuchWriteUp();
    const content = (await published.contents([baseEditionId])).get(baseEditionId);
    if (!content) throw new NoSuchWriteUp();
    return { baseEditionId, content };
  }

  async function addDraft(
    trx: Knex,
    caller: MemberCaller,
    draft: { writeUpId: number; baseEditionId: number; content: EditionContent; changeNote: string },
  ): Promise<number> {
    const number = await drafts.nextNumber(trx, draft.writeUpId);
    return drafts.addDraft(trx, { ...draft, number, authorId: caller.accountId, at: clock() });
  }
}
