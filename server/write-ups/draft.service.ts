import { isDeepStrictEqual } from 'node:util';
import type { Knex } from 'knex';
import { z } from 'zod';
import { missingFromContent } from '../../shared/contract/edition-completeness.js';
import { emptyContent, type EditionContent } from '../../shared/contract/edition-content.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import type { EditionState } from '../../shared/contract/vocabulary.js';
import type { Draft, EditionView, MyWriteUp } from '../../shared/contract/write-ups.js';
import { isModerator, type MemberCaller } from '../http/caller.js';
import { readCursor, toPage } from '../http/pages.js';
import { NotAllowed, NotValid } from '../http/problems.js';
import type { DraftStore, EditionRow, SavedText } from './draft.store.js';
import { photoIdsOf } from './edition-links.js';
import {
  EditionMovedOn,
  NoSuchDraft,
  NoSuchWriteUp,
  NotComplete,
  WrongState,
  wrongState,
} from './edition-problems.js';
import type { EditionViews, PhotoLookup } from './edition-view.js';
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
  readonly photos: PhotoLookup;
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
  photos,
}: DraftParts) {
  return {
    async startWriteUp(caller: MemberCaller, title: string): Promise<Draft> {
      const at = clock();
      const id = await knex.transaction(async (trx) => {
        const writeUpId = await drafts.addWriteUp(trx, caller.accountId, at);
        const content = { ...emptyContent, title };
        return drafts.addDraft(trx, { writeUpId, number: 1, authorId: caller.accountId, content, at });
      });
      return readOwn(caller, id);
    },

    /** The caller's open edition of the write-up, or a new one with the published text and the same keys of its fixes. */
    async startEdition(caller: MemberCaller, slug: string): Promise<Draft> {
      const writeUp = await published.bySlug(slug);
      if (!writeUp) throw new NoSuchWriteUp();
      const id = await knex.transaction(async (trx) => {
        await publicationStore.lockWriteUp(trx, writeUp.id);
        const authors = await published.authorIds(trx, writeUp.id);
        if (!authors.includes(caller.accountId) && !isModerator(caller)) {
          throw new NotAllowed(
            'Only its authors and moderators start another edition of a write-up.',
            'Report a trial, or write your own.',
          );
        }
        const open = await drafts.openEditionOf(trx, writeUp.id, caller.accountId);
        if (open !== undefined) return open;
        const content = await published.publishedContent(trx, writeUp.id);
        if (!content) throw new NoSuchWriteUp();
        const number = await drafts.nextNumber(trx, writeUp.id);
        return drafts.addDraft(trx, {
          writeUpId: writeUp.id,
          number,
          authorId: caller.accountId,
          content,
          at: clock(),
        });
      });
      return readOwn(caller, id);
    },

    readDraft: readOwn,

    async previewDraft(caller: MemberCaller, id: number): Promise<EditionView> {
      const edition = await ownEdition(caller, id);
      return views.viewOf(edition.content, edition.writeUpId);
    },

    /** NotValid for broken references; EditionMovedOn for a version that is not the newest. */
    async saveDraft(caller: MemberCaller, id: number, version: number, text: SavedText): Promise<Draft> {
      const edition = await ownEdition(caller, id);
      demandWorkable(edition);
      if (edition.version !== version) throw await movedOn(edition, text);
      const broken = await references.findBroken(text.content, {
        accountId: caller.accountId,
        writeUpId: edition.writeUpId,
      });
      if (broken.length > 0)
        throw new NotValid(broken.map((field) => ({ ...field, path: `content.${field.path}` })));
      if (!(await drafts.save(id, caller.accountId, version, text, clock())))
        throw await whyNot(caller, id, text);
      return readOwn(caller, id);
    },

    async submitDraft(caller: MemberCaller, id: number, version: number): Promise<Draft> {
      const edition = await ownEdition(caller, id);
      demandWorkable(edition);
      if (edition.version !== version) throw await movedOn(edition);
      const missing = await missingFrom(edition);
      if (missing.length > 0) throw new NotComplete(missing);
      if (!(await drafts.submit(id, caller.accountId, version, clock()))) throw await whyNot(caller, id);
      return readOwn(caller, id);
    },

    async recallDraft(caller: MemberCaller, id: number): Promise<Draft> {
      await ownEdition(caller, id);
      if (!(await drafts.recall(id, caller.accountId, clock()))) {
        throw wrongState(await ownEdition(caller, id), 'an edition on the desk');
      }
      return readOwn(caller, id);
    },

    async discardDraft(caller: MemberCaller, id: number): Promise<void> {
      const edition = await ownEdition(caller, id);
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
      return readOwn(caller, id);
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

  async function ownEdition(caller: MemberCaller, id: number): Promise<EditionRow> {
    const edition = await drafts.editionOfAuthor(id, caller.accountId);
    if (!edition || edition.discardedAt !== null) throw new NoSuchDraft();
    return edition;
  }

  async function readOwn(caller: MemberCaller, id: number): Promise<Draft> {
    return draftOf(await ownEdition(caller, id));
  }

  async function draftOf(row: EditionRow): Promise<Draft> {
    const ids = photoIdsOf(row.content);
    const found = await photos.photosByIds(ids);
    return {
      id: row.id,
      writeUpId: row.writeUpId,
      slug: row.slug,
      number: row.number,
      state: row.state,
      author: { id: row.authorId, displayName: row.authorName },
      changeNote: row.changeNote,
      content: row.content,
      version: row.version,
      updatedAt: row.updatedAt.toISOString(),
      returnReason: row.returnReason,
      photos: ids.flatMap((photoId) => found.get(photoId) ?? []),
    };
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
    return new EditionMovedOn(await draftOf(current), sent ? changedFields(current, sent) : []);
  }

  /** The compare-and-set found another row than the check before it: somebody was quicker. */
  async function whyNot(caller: MemberCaller, id: number, sent?: SavedText): Promise<Error> {
    const edition = await ownEdition(caller, id);
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

/** Top-level fields in which what is there differs from what was sent. */
function changedFields(current: SavedText, sent: SavedText): string[] {
  const fields = Object.keys(sent.content) as (keyof EditionContent)[];
  const changed: string[] = fields.filter(
    (field) => !isDeepStrictEqual(current.content[field], sent.content[field]),
  );
  return current.changeNote === sent.changeNote ? changed : [...changed, 'changeNote'];
}
