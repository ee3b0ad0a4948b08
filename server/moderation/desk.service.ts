import type { DeskEdition } from '../../shared/contract/moderation.js';
import { answerHazards, findHazards } from '../../shared/safety/hazards.js';
import { NotFound } from '../http/problems.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import type { DeskStore } from './desk.store.js';

export type DeskService = ReturnType<typeof createDeskService>;

/** What moderators read. */
export function createDeskService({ writeUps, desk }: { writeUps: WriteUpService; desk: DeskStore }) {
  return {
    /** An edition that is or was on the desk; what an author still works on for the first time is not shown. */
    async readDeskEdition(id: number): Promise<DeskEdition> {
      const edition = await writeUps.editionById(id);
      if (!edition || edition.state === 'draft' || edition.discardedAt !== null) throw noSuchEdition();
      const { writeUpId, content, number, changeNote } = edition;
      const author = { id: edition.authorId, displayName: edition.authorName };
      const [view, published, cautions, place, opinions] = await Promise.all([
        writeUps.viewOf(content, writeUpId),
        desk.publishedEdition(writeUpId),
        writeUps.cautionsOf(writeUpId),
        writeUps.placeOf(edition),
        writeUps.opinionsOn(id, edition.submittedAt),
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
        ...place,
        opinions,
        hazards: answerHazards(findHazards(content), cautions),
        cautions,
      };
    },
  };
}

export function noSuchEdition(): NotFound {
  return new NotFound('There is no such edition on the desk.', 'Read the queue again.');
}
