import { z } from 'zod';
import type { DeskEdition, DeskLine } from '../../shared/contract/moderation.js';
import { answerHazards, findHazards } from '../../shared/safety/hazards.js';
import { readCursor, toPage } from '../http/pages.js';
import { NotFound } from '../http/problems.js';
import { groupBy } from '../rows.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { openHazards } from './caution-missing.js';
import type { DeskStore } from './desk.store.js';

const PlaceInQueue = z.object({ at: z.iso.datetime(), id: z.number().int() });

export type DeskService = ReturnType<typeof createDeskService>;

/** What moderators read. */
export function createDeskService({ writeUps, desk }: { writeUps: WriteUpService; desk: DeskStore }) {
  return {
    async readDesk(query: {
      cursor?: string | undefined;
      limit: number;
    }): Promise<{ items: DeskLine[]; next: string | null }> {
      const place = readCursor(PlaceInQueue, query.cursor);
      const after = place && { at: new Date(place.at), id: place.id };
      const rows = await desk.waiting({ after, rows: query.limit + 1 });
      const page = toPage(rows, query.limit, (row) => ({
        at: row.submittedAt.toISOString(),
        id: row.editionId,
      }));
      const cautions = await writeUps.cautionsOfMany([...new Set(page.items.map((row) => row.writeUpId))]);
      const cautionsOf = groupBy(cautions, (caution) => caution.writeUpId);
      const items = page.items.map((row) => ({
        editionId: row.editionId,
        number: row.number,
        title: row.title,
        author: { id: row.authorId, displayName: row.authorName },
        submittedAt: row.submittedAt.toISOString(),
        changeNote: row.changeNote,
        openHazards: openHazards(row.content, cautionsOf.get(row.writeUpId) ?? []).length,
      }));
      return { items, next: page.next };
    },

    /** An edition that is or was on the desk; what an author still works on for the first time is not shown. */
    async readDeskEdition(id: number): Promise<DeskEdition> {
      const edition = await writeUps.editionById(id);
      if (!edition || edition.state === 'draft' || edition.discardedAt !== null) throw noSuchEdition();
      const { writeUpId, content, number, changeNote } = edition;
      const author = { id: edition.authorId, displayName: edition.authorName };
      const [view, published, cautions] = await Promise.all([
        writeUps.viewOf(content, writeUpId),
        desk.publishedEdition(writeUpId),
        writeUps.cautionsOf(writeUpId),
      ]);
      const handedIn = (edition.submittedAt ?? edition.updatedAt).toISOString();
      const line = { id, number, author, changeNote, publishedAt: handedIn, title: content.title };
      return {
        editionId: id,
        writeUpId,
        slug: edition.slug,
        number,
        state: edition.state,
        author,
        submittedAt: edition.submittedAt?.toISOString() ?? null,
        changeNote,
        view,
        comparison:
          published && published.line.id !== id ? await writeUps.compare(published, { line, content }) : null,
        hazards: answerHazards(findHazards(content), cautions),
        cautions,
      };
    },
  };
}

export function noSuchEdition(): NotFound {
  return new NotFound('There is no such edition on the desk.', 'Read the queue again.');
}
