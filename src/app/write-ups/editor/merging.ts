import type { Photo } from '../../../../shared/contract/photos';
import { emptyContent } from '../../../../shared/contract/edition-content';
import type { MergeGround } from '../../../../shared/contract/proposed-editions';
import type { Draft, EditionLine } from '../../../../shared/contract/write-ups';
import type { EditionText } from '../../../../shared/editions/edition-text';

/** Two texts that both began as `base`, while somebody makes one of them. */
export interface Merging {
  /** Names what is merged with, so that a newer one is told from it. */
  readonly id: string;
  readonly base: EditionText;
  readonly mine: EditionText;
  readonly theirs: EditionText;
  /** The draft as it was saved elsewhere, or the edition that was published since it was begun. */
  readonly with:
    | { readonly kind: 'draft'; readonly by: string; readonly at: string }
    | { readonly kind: 'edition'; readonly edition: EditionLine };
  readonly photos: ReadonlyMap<number, Photo>;
}

/** The merge of what was typed here with the same draft as it was saved elsewhere. */
export function mergingWithDraft(theirs: Draft, texts: Pick<Merging, 'base' | 'mine' | 'photos'>): Merging {
  return {
    id: `draft ${theirs.version}`,
    ...texts,
    theirs: textOfDraft(theirs),
    with: { kind: 'draft', by: theirs.author.displayName, at: theirs.updatedAt },
  };
}

/** The merge of a draft with the edition that was published since; the note on what it changes stays the draft's own. */
export function mergingWithEdition(
  { base, current }: MergeGround,
  { mine, photos }: Pick<Merging, 'mine' | 'photos'>,
): Merging {
  const { changeNote } = mine;
  return {
    id: `edition ${current.edition.id}`,
    base: { content: base?.content ?? emptyContent, changeNote },
    mine,
    theirs: { content: current.content, changeNote },
    with: { kind: 'edition', edition: current.edition },
    photos,
  };
}

export function textOfDraft(draft: Draft): EditionText {
  return { content: draft.content, changeNote: draft.changeNote };
}
