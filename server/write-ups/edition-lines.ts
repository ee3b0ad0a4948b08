import type { EditionLine, PersonRef } from '../../shared/contract/write-ups.js';
import type { PublishedEditionRow } from './published.store.js';

/** A published edition as it stands in lists. */
export function lineOf(edition: PublishedEditionRow): EditionLine {
  return {
    id: edition.id,
    number: edition.number,
    author: { id: edition.authorId, displayName: edition.authorName },
    changeNote: edition.changeNote,
    publishedAt: edition.publishedAt.toISOString(),
    title: edition.title,
  };
}

/** Everybody who wrote one of the editions, the first author first. */
export function peopleOf(editionsNewestFirst: readonly PublishedEditionRow[]): PersonRef[] {
  const people = new Map<number, PersonRef>();
  for (const { authorId, authorName } of [...editionsNewestFirst].reverse()) {
    people.set(authorId, { id: authorId, displayName: authorName });
  }
  return [...people.values()];
}

/** Where an edition stands among the published ones of its write-up. */
export interface PlaceAmongPublished {
  /** The edition it was started from or last merged with. */
  readonly base: EditionLine | null;
  /** The edition that was published since, which it knows nothing of. */
  readonly overtakenBy: EditionLine | null;
  readonly writtenBy: PersonRef[];
}

export function placeAmong(
  editionsNewestFirst: readonly PublishedEditionRow[],
  edition: { readonly baseEditionId: number | null; readonly publishedEditionId: number | null },
): PlaceAmongPublished {
  const line = (id: number | null): EditionLine | null => {
    const found = editionsNewestFirst.find((each) => each.id === id);
    return found ? lineOf(found) : null;
  };
  return {
    base: line(edition.baseEditionId),
    overtakenBy: isOvertaken(edition) ? line(edition.publishedEditionId) : null,
    writtenBy: peopleOf(editionsNewestFirst),
  };
}

/** Whether another edition than the one it builds on is published. */
export function isOvertaken(edition: {
  readonly baseEditionId: number | null;
  readonly publishedEditionId: number | null;
}): boolean {
  return edition.baseEditionId !== edition.publishedEditionId;
}
