import { isDeepStrictEqual } from 'node:util';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { MergeGround, PublishedText } from '../../shared/contract/proposed-editions.js';
import type { Draft } from '../../shared/contract/write-ups.js';
import type { MemberCaller } from '../http/caller.js';
import type { DraftStore, EditionRow } from './draft.store.js';
import { photoIdsOf } from './edition-links.js';
import { lineOf, placeAmong, type PlaceAmongPublished } from './edition-lines.js';
import { NoSuchDraft, NoSuchWriteUp } from './edition-problems.js';
import type { PhotoLookup } from './edition-view.js';
import type { PublishedStore } from './published.store.js';

export type DraftReader = ReturnType<typeof createDraftReader>;

/** Reads editions that are under way, with where they stand among the published ones. */
export function createDraftReader({
  drafts,
  published,
  photos,
}: {
  drafts: DraftStore;
  published: PublishedStore;
  photos: PhotoLookup;
}) {
  return {
    ownEdition,
    draftOf,
    placeOf,
    mergeGround,

    async readOwn(caller: MemberCaller, id: number): Promise<Draft> {
      return draftOf(await ownEdition(caller, id));
    },
  };

  /** NoSuchDraft where it is somebody else's or thrown away. */
  async function ownEdition(caller: MemberCaller, id: number): Promise<EditionRow> {
    const edition = await drafts.editionOfAuthor(id, caller.accountId);
    if (!edition || edition.discardedAt !== null) throw new NoSuchDraft();
    return edition;
  }

  async function placeOf(row: EditionRow): Promise<PlaceAmongPublished> {
    const place = placeAmong(row.slug === null ? [] : await published.editionsOf(row.writeUpId), row);
    // What is published builds on an earlier one as a matter of course.
    return row.state === 'published' ? { ...place, overtakenBy: null } : place;
  }

  async function draftOf(row: EditionRow): Promise<Draft> {
    const ids = photoIdsOf(row.content);
    const [found, place] = await Promise.all([photos.photosByIds(ids), placeOf(row)]);
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
      ...place,
    };
  }

  /** What an edition began from and what is published by now; NoSuchWriteUp while nothing is. */
  async function mergeGround(row: EditionRow): Promise<MergeGround> {
    const { baseEditionId, publishedEditionId } = row;
    if (publishedEditionId === null) throw new NoSuchWriteUp();
    const [editions, contents] = await Promise.all([
      published.editionsOf(row.writeUpId),
      published.contents([publishedEditionId, ...(baseEditionId === null ? [] : [baseEditionId])]),
    ]);
    const pictures = await photos.photosByIds([...contents.values()].flatMap(photoIdsOf));
    const textOf = (id: number | null): PublishedText | null => {
      const edition = editions.find((each) => each.id === id);
      const content = id === null ? undefined : contents.get(id);
      if (!edition || !content) return null;
      return {
        edition: lineOf(edition),
        content,
        photos: photoIdsOf(content).flatMap((photoId) => pictures.get(photoId) ?? []),
      };
    };
    const base = textOf(baseEditionId);
    const current = textOf(publishedEditionId);
    if (!current) throw new NoSuchWriteUp();
    return { base, current, changed: changedFields(base?.content ?? null, current.content) };
  }
}

/** Top-level fields in which two contents differ; all of them where there is nothing to compare with. */
export function changedFields(from: EditionContent | null, to: EditionContent): string[] {
  const fields = Object.keys(to) as (keyof EditionContent)[];
  return fields.filter((field) => !isDeepStrictEqual(from?.[field], to[field]));
}
