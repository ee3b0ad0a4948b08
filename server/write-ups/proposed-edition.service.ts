import { z } from 'zod';
import type { Opinion, ProposedEdition } from '../../shared/contract/proposed-editions.js';
import type { EditionComparison, PersonRef } from '../../shared/contract/write-ups.js';
import type { MemberCaller } from '../http/caller.js';
import { readCursor, toPage } from '../http/pages.js';
import { NotFound } from '../http/problems.js';
import type { EditionComparer } from './comparison.js';
import type { DraftReader } from './draft-reader.js';
import type { DraftStore } from './draft.store.js';
import type { ProposedEditionStore, ProposedRow } from './proposed-edition.store.js';

const PlaceInProposed = z.object({ at: z.iso.datetime(), id: z.number().int() });

export interface ProposedEditionParts {
  readonly clock: () => Date;
  readonly drafts: DraftStore;
  readonly reader: DraftReader;
  readonly proposed: ProposedEditionStore;
  readonly comparer: EditionComparer;
}

export type ProposedEditionService = ReturnType<typeof createProposedEditionService>;

/** What the authors of a write-up see of editions that others propose on it, and what they tell the desk. */
export function createProposedEditionService({
  clock,
  drafts,
  reader,
  proposed,
  comparer,
}: ProposedEditionParts) {
  return {
    async listProposedEditions(
      caller: MemberCaller,
      query: { cursor?: string | undefined; limit: number },
    ): Promise<{ items: ProposedEdition[]; next: string | null }> {
      const place = readCursor(PlaceInProposed, query.cursor);
      const rows = await proposed.list(caller.accountId, {
        after: place && { at: new Date(place.at), id: place.id },
        rows: query.limit + 1,
      });
      const items = rows.map((row) => toProposed(row, caller));
      return toPage(items, query.limit, (row) => ({ at: row.submittedAt, id: row.editionId }));
    },

    /** NotFound unless it waits on the desk, is somebody else's, and the write-up is one of the caller's. */
    async readProposedEdition(
      caller: MemberCaller,
      id: number,
    ): Promise<ProposedEdition & { comparison: EditionComparison }> {
      const [row, edition] = await Promise.all([proposed.find(caller.accountId, id), drafts.edition(id)]);
      if (!row || !edition) throw noSuchProposal();
      const { current } = await reader.mergeGround(edition);
      const found = toProposed(row, caller);
      const line = {
        id,
        number: edition.number,
        author: found.author,
        changeNote: row.changeNote,
        publishedAt: found.submittedAt,
        title: row.title,
      };
      return {
        ...found,
        comparison: await comparer.compare(
          { line: current.edition, content: current.content },
          { line, content: edition.content },
        ),
      };
    },

    async giveOpinion(
      caller: MemberCaller,
      id: number,
      opinion: { agrees: boolean; line: string },
    ): Promise<Opinion> {
      if (!(await proposed.find(caller.accountId, id))) throw noSuchProposal();
      await proposed.put({ editionId: id, accountId: caller.accountId, ...opinion, at: clock() });
      const given = (await proposed.find(caller.accountId, id)) ?? null;
      const stored = given && toProposed(given, caller).myOpinion;
      if (!stored) throw noSuchProposal();
      return stored;
    },

    /** Everything that authors of the write-up have said of an edition, the first word first. */
    async opinionsOn(editionId: number, submittedAt: Date | null): Promise<Opinion[]> {
      return (await proposed.opinionsOn(editionId)).map(({ personId, displayName, agrees, line, at }) =>
        toOpinion({ id: personId, displayName }, { agrees, line, at }, submittedAt),
      );
    },
  };
}

function toProposed(row: ProposedRow, caller: MemberCaller): ProposedEdition {
  const { agrees, line, at } = row;
  const me = { id: caller.accountId, displayName: row.readerName ?? '' };
  return {
    editionId: row.editionId,
    slug: row.slug,
    title: row.title,
    author: { id: row.authorId, displayName: row.authorName },
    changeNote: row.changeNote,
    submittedAt: row.submittedAt.toISOString(),
    myOpinion:
      agrees === null || line === null || at === null
        ? null
        : toOpinion(me, { agrees: Boolean(agrees), line, at }, row.submittedAt),
  };
}

function toOpinion(
  person: PersonRef,
  said: { agrees: boolean; line: string; at: Date },
  submittedAt: Date | null,
): Opinion {
  return {
    person,
    agrees: said.agrees,
    line: said.line,
    at: said.at.toISOString(),
    beforeHandingIn: submittedAt !== null && said.at < submittedAt,
  };
}

function noSuchProposal(): NotFound {
  return new NotFound(
    'There is no such edition on the desk for one of your write-ups.',
    'Look it up in the list of your write-ups; it may have been decided by now.',
  );
}
