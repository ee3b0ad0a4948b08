import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { EditionComparison, EditionLine } from '../../shared/contract/write-ups.js';
import { editionDifference } from '../../shared/text/edition-difference.js';
import type { ContentNames } from '../../shared/text/edition-fields.js';
import type { HardwareService } from '../hardware/hardware.js';
import { partIdsOf, photoIdsOf } from './edition-links.js';
import type { PhotoLookup } from './edition-view.js';

export interface ComparedEdition {
  readonly line: EditionLine;
  readonly content: EditionContent;
}

export type EditionComparer = ReturnType<typeof createEditionComparer>;

/** Compares two editions word by word, with the names of what they point at. Four look-ups, whatever their size. */
export function createEditionComparer(hardware: HardwareService, photos: PhotoLookup) {
  return {
    /** `from` null: everything in `to` is new. */
    async compare(from: ComparedEdition | null, to: ComparedEdition): Promise<EditionComparison> {
      const names = await namesIn([...(from ? [from.content] : []), to.content]);
      return {
        from: from?.line ?? null,
        to: to.line,
        ...editionDifference(from?.content ?? null, to.content, names),
      };
    },
  };

  async function namesIn(contents: readonly EditionContent[]): Promise<ContentNames> {
    const partIds = contents.flatMap(partIdsOf);
    const [parts, revisionsOf, symptoms, pictures] = await Promise.all([
      hardware.partsByIds(partIds),
      hardware.revisionsByPartIds(partIds),
      hardware.symptomsBySlugs(contents.flatMap((content) => content.symptoms)),
      photos.photosByIds(contents.flatMap(photoIdsOf)),
    ]);
    const revisions = new Map([...revisionsOf.values()].flat().map((revision) => [revision.id, revision]));
    const uses = contents.flatMap((content) => content.photos).reverse();
    const part = (id: number): string => parts.get(id)?.name ?? 'a part that is gone';
    return {
      part,
      revision(id) {
        const revision = revisions.get(id);
        return revision ? `${part(revision.partId)} ${revision.label}` : 'a revision of another part';
      },
      symptom: (slug) => symptoms.get(slug)?.label ?? slug,
      photo(id) {
        const told = uses.find((use) => use.photoId === id && use.alt !== '');
        return told?.alt ?? pictures.get(id)?.alt ?? 'a photo that is gone';
      },
    };
  }
}
