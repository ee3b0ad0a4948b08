import type { Photo } from '../../../../shared/contract/photos';
import type { EditionLine } from '../../../../shared/contract/write-ups';
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
