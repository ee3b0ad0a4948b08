import type { RevisionPhoto } from '../../shared/contract/hardware.js';
import type { Photo } from '../../shared/contract/photos.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import type { Proposed } from '../../shared/contract/proposals.js';
import { NotValid } from '../http/problems.js';

/** What proposals need of photos. */
export interface ProposalPhotos {
  photosByIds(ids: readonly number[]): Promise<Map<number, Photo>>;
  ownPhotoIds(accountId: number, ids: readonly number[]): Promise<Set<number>>;
}

export interface NamedPhoto {
  readonly photoId: number;
  readonly caption: string;
}

/** Photos that a proposed revision names; other proposals name none. */
export function createProposedPhotos(photos: ProposalPhotos) {
  return {
    /** NotValid where one is not the account's own. */
    async demandOwn(accountId: number, entry: Proposed): Promise<void> {
      const own = await photos.ownPhotoIds(accountId, idsIn([entry]));
      demand(entry, own, 'is not a photo of yours', 'Add the photo first.');
    },

    /** Photos that the entry names. */
    idsIn: (entry: Proposed): number[] => idsIn([entry]),

    /** NotValid where the desk names one that the proposer did not. */
    demandOffered(entry: Proposed, proposed: Proposed): void {
      demand(entry, new Set(idsIn([proposed])), 'is not a photo of this proposal', 'Leave it out.');
    },

    /** Those that can be shown with the catalogue; one can be gone by the time the desk decides. */
    async stillThere(entry: Proposed): Promise<NamedPhoto[]> {
      const found = await photos.photosByIds(idsIn([entry]));
      return namedIn(entry).filter(({ photoId }) => found.has(photoId));
    },

    /** The photos of each of the entries, in their order. */
    async shown(entries: readonly Proposed[]): Promise<RevisionPhoto[][]> {
      const found = await photos.photosByIds(idsIn(entries));
      return entries.map((entry) =>
        namedIn(entry).flatMap(({ photoId, caption }) => {
          const photo = found.get(photoId);
          return photo ? [{ photo, caption }] : [];
        }),
      );
    },
  };
}

function namedIn(entry: Proposed): readonly NamedPhoto[] {
  return entry.kind === 'revision' ? entry.photos : [];
}

function idsIn(entries: readonly Proposed[]): number[] {
  return entries.flatMap((entry) => namedIn(entry).map(({ photoId }) => photoId));
}

function demand(entry: Proposed, usable: ReadonlySet<number>, message: string, remedy: string): void {
  const stray = namedIn(entry).flatMap(({ photoId }, index): FieldProblem[] =>
    usable.has(photoId) ? [] : [{ path: `entry.photos.${index}.photoId`, message, remedy }],
  );
  if (stray.length > 0) throw new NotValid(stray);
}
