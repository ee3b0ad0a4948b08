import type { Knex } from 'knex';
import { z } from 'zod';
import { missingFromContent } from '../../shared/contract/edition-completeness.js';
import { emptyContent, type EditionContent } from '../../shared/contract/edition-content.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import type { EditionState } from '../../shared/contract/vocabulary.js';
import type { Draft, EditionView, MyWriteUp } from '../../shared/contract/write-ups.js';
import type { MemberCaller } from '../http/caller.js';
import { readCursor, toPage } from '../http/pages.js';
import { NotValid } from '../http/problems.js';
import type { Happenings } from '../watches/happenings.js';
import { changedFields, type DraftReader } from './draft-reader.js';
import type { DraftStore, EditionRow, SavedText } from './draft.store.js';
import {
  EditionMovedOn,
  EditionOvertaken,
  NoSuchDraft,
  NotComplete,
  WrongState,
  wrongState,
} from './edition-problems.js';
import type { EditionViews } from './edition-view.js';
import { publicationStore } from './publication.store.js';
import type { PublishedStore } from './published.store.js';
import type { ReferenceCheck } from './reference-check.js';

const PlaceInMine = z.object({ at: z.iso.datetime(), id: z.number().int() });

export interface DraftParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly drafts: DraftStore;
  readonly published: PublishedStore;
  readonly references: ReferenceCheck;
  readonly views: EditionViews;
  readonly reader: DraftReader;
  readonly happenings: Happenings;
}

export type DraftService = ReturnType<typeof createDraftService>;

/** An author's way from the empty form to the desk. Drafts of others are not there, as far as a caller can tell. */
export function createDraftService({
  knex,
  clock,
  drafts,
  published,
  references,
  views,
  reader,
  happenings,
}: DraftParts) {
  return {
    async startWriteUp(caller: MemberCaller, title: string): Promise<Draft> {
      const { draftId } = await knex.transaction((trx) =>
        startDraftWithin(trx, caller.accountId, { ...emptyContent, title }),
      );
      return reader.readOwn(caller, draftId);
    },

    startDraftWithin,

    /** The account's edition of the write-up that is under way, if there is one. */
    openDraftOf: drafts.openEditionOf,

    readDraft: reader.readOwn,

    async previewDraft(caller: MemberCaller, id: number): Promise<EditionView> {
      const edition = await reader.ownEdition(caller, id);
      return views.viewOf(edition.content, edition.writeUpId);
    },

    /**
     * NotValid for broken references; EditionMovedOn for a version that is not the newest; EditionOvertaken for a merge with an
     * edition that is not the published one any more.
     */
    async saveDraft(caller: MemberCaller, id: number, version: number, text: SavedText): Promise<Draft> {
      const edition = await reader.ownEdition(caller, id);
      demandWorkable(edition);
      if (edition.version !== version) throw await movedOn(edition, text);
      const broken = await references.findBroken(text.content, {
        accountId: caller.accountId,
        writeUpId: edition.writeUpId,
      });
      if (broken.length > 0)
        throw new NotValid(broken.map((field) => ({ ...field, path: `content.${field.path}` })));
      const outcome = await knex.transaction(async (trx) => {
        const { baseEditionId } = text;
        const isOld = async () => baseEditionId !== (await lockedPublication(trx, edition));
        if (baseEditionId !== undefined && (await isOld())) return 'overtaken';
        return (await drafts.save(trx, id, caller.accountId, version, text, clock())) ? 'saved' : 'moved-on';
      });
      if (outcome === 'overtaken') throw await overtaken(caller, id);
      if (outcome === 'moved-on') throw await whyNot(caller, id, text);
      return reader.readOwn(caller, id);
    },

    /** EditionOvertaken where another edition than its base is published; the owners of the write-up are told of a proposal. */
    async submitDraft(caller: MemberCaller, id: number, version: number): Promise<Draft> {
      const edition = await reader.ownEdition(caller, id);
      demandWorkable(edition);
      if (edition.version !== version) throw await movedOn(edition);
      const missing = await missingFrom(edition);
      if (missing.length > 0) throw new NotComplete(missing);
      const outcome = await knex.transaction(async (trx) => {
        if ((await lockedPublication(trx, edition)) !== edition.baseEditionId) return 'overtaken';
        if (!(await drafts.submit(trx, id, caller.accountId, version, clock()))) return 'moved-on';
        await tellOwners(trx, edition);
        return 'submitted';
      });
      if (outcome === 'overtaken') throw await overtaken(caller, id);
      if (outcome === 'moved-on') throw await whyNot(caller, id);
      return reader.readOwn(caller, id);
    },

    async recallDraft(caller: MemberCaller, id: number): Promise<Draft> {
      await reader.ownEdition(caller, id);
      if (!(await drafts.recall(id, caller.accountId, clock()))) {
        throw wrongState(await reader.ownEdition(caller, id), 'an edition on the desk');
      }
      return reader.readOwn(caller, id);
    },

    async discardDraft(caller: MemberCaller, id: number): Promise<void> {
      const edition = await reader.ownEdition(caller, id);
      if (!(await drafts.discard(id, caller.accountId, clock())))
        throw wrongState(edition, 'a draft or a returned edition');
    },

    /** WrongState where it was not thrown away, or where another edition of the same write-up is under way. */
    async restoreDraft(caller: MemberCaller, id: number): Promise<Draft> {
      const edition = await drafts.editionOfAuthor(id, caller.accountId);
      if (!edition) throw new NoSuchDraft();
      await knex.transaction(async (trx) => {
        await publicationStore.lockWriteUp(trx, edition.writeUpId);
        const open = await drafts.openEditionOf(trx, edition.writeUpId, caller.accountId);
        if (open !== undefined && open !== id) {
          throw new WrongState(
            'Another edition of this write-up is under way.',
            'Finish it or throw it away first.',
          );
        }
        if (!(await drafts.restore(trx, id, caller.accountId, clock()))) {
          throw new WrongState('It was not thrown away.', 'Go on with it as it is.');
        }
      });
      return reader.readOwn(caller, id);
    },

    async listMine(
      caller: MemberCaller,
      query: { state?: EditionState | undefined; cursor?: string | undefined; limit: number },
    ): Promise<{ items: MyWriteUp[]; next: string | null }> {
      const place = readCursor(PlaceInMine, query.cursor);
      const rows = await drafts.mine(caller.accountId, {
        state: query.state,
        after: place && { at: new Date(place.at), id: place.id },
        rows: query.limit + 1,
      });
      const items = rows.map((row) => ({ ...row, updatedAt: row.updatedAt.toISOString() }));
      return toPage(items, query.limit, (row) => ({ at: row.updatedAt, id: row.editionId }));
    },
  };
  /** A new write-up whose first draft has this text. */
  async function startDraftWithin(
    trx: Knex,
    authorId: number,
    content: EditionContent,
  ): Promise<{ writeUpId: number; draftId: number }> {
    const at = clock();
    const writeUpId = await drafts.addWriteUp(trx, authorId, at);
    const first = { writeUpId, number: 1, authorId, baseEditionId: null, changeNote: '' };
    return { writeUpId, draftId: await drafts.addDraft(trx, { ...first, content, at }) };
  }

  /** What an edition lacks before the desk can take it. */
  async function missingFrom(edition: EditionRow): Promise<FieldProblem[]> {
    const missing = missingFromContent(edition.content).concat(
      await references.findStrayRevisions(edition.content),
    );
    if (edition.slug !== null && edition.changeNote.trim().length < 5) {
      missing.push({
        path: 'changeNote',
        message: 'has fewer than 5 characters',
        remedy: 'Say what this edition changes, and why.',
      });
    }
    return missing;
  }

  async function movedOn(current: EditionRow, sent?: SavedText): Promise<EditionMovedOn> {
    const changed = sent ? changedFields(current.content, sent.content) : [];
    if (sent && sent.changeNote !== current.changeNote) changed.push('changeNote');
    return new EditionMovedOn(await reader.draftOf(current), changed);
  }

  /** The edition that is published while the transaction holds the write-up. */
  async function lockedPublication(trx: Knex, edition: EditionRow): Promise<number | null> {
    return (await publicationStore.lockWriteUp(trx, edition.writeUpId))?.publishedEditionId ?? null;
  }

  async function overtaken(caller: MemberCaller, id: number): Promise<EditionOvertaken> {
    return new EditionOvertaken(await reader.mergeGround(await reader.ownEdition(caller, id)));
  }

  /** Tells those to whom a published write-up belongs, and nobody else, that somebody proposes an edition of it. */
  async function tellOwners(trx: Knex, edition: EditionRow): Promise<void> {
    const keepers = await published.keeperIds(trx, edition.writeUpId);
    const owners = keepers.filter((accountId) => accountId !== edition.authorId);
    if (owners.length === 0) return;
    await happenings.add(trx, {
      kind: 'edition-proposed',
      key: `edition-proposed:${edition.id}`,
      title: `${edition.authorName} proposes an edition of “${edition.content.title}”`,
      text: edition.changeNote,
      path: `/my/proposed-editions/${edition.id}`,
      actorId: edition.authorId,
      about: {},
      people: owners.map((accountId) => ({ accountId, atOnce: false })),
    });
  }

  /** The compare-and-set found another row than the check before it: somebody was quicker. */
  async function whyNot(caller: MemberCaller, id: number, sent?: SavedText): Promise<Error> {
    const edition = await reader.ownEdition(caller, id);
    return isWorkable(edition)
      ? movedOn(edition, sent)
      : wrongState(edition, 'a draft or a returned edition');
  }
}

function isWorkable(edition: EditionRow): boolean {
  return edition.state === 'draft' || edition.state === 'returned';
}

function demandWorkable(edition: EditionRow): void {
  if (!isWorkable(edition)) throw wrongState(edition, 'a draft or a returned edition');
}
