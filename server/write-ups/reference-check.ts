import type { EditionContent, JointSide } from '../../shared/contract/edition-content.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import type { HardwareService } from '../hardware/hardware.js';
import { partIdsOf, photoIdsOf, sidesOf } from './edition-links.js';
import type { PhotoRightsStore } from './photo-rights.store.js';

export type ReferenceCheck = ReturnType<typeof createReferenceCheck>;

/**
 * Finds what a draft points at that is not there or not its to use. What a draft merely lacks is not looked at: that is
 * asked when it goes to the desk.
 */
export function createReferenceCheck(hardware: HardwareService, rights: PhotoRightsStore) {
  return {
    async findBroken(
      content: EditionContent,
      author: { accountId: number; writeUpId: number },
    ): Promise<FieldProblem[]> {
      const [parts, revisions, symptoms, photos] = await Promise.all([
        hardware.partsByIds(partIdsOf(content)),
        hardware.revisionsByIds(revisionIdsOf(content)),
        hardware.symptomsBySlugs(content.symptoms),
        rights.usablePhotos(photoIdsOf(content), author.accountId, author.writeUpId),
      ]);
      const broken: FieldProblem[] = [];
      const refuse = (path: string, message: string, remedy: string): void => {
        broken.push({ path, message, remedy });
      };
      const checkSide = (side: JointSide, path: string): void => {
        if (side.partId !== null && !parts.has(side.partId)) {
          refuse(`${path}.partId`, 'is not a part of the catalogue', 'Choose the part from the list.');
        }
        const belongs = ({ revisionId }: { revisionId: number }): boolean =>
          side.partId !== null && revisions.get(revisionId)?.partId === side.partId;
        side.revisions.forEach((mark, index) => {
          if (!belongs(mark)) {
            refuse(
              `${path}.revisions.${index}`,
              'is not a revision of this part',
              'Mark revisions of the chosen part only.',
            );
          }
        });
        for (const index of repeated(side.revisions.map((mark) => mark.revisionId))) {
          refuse(`${path}.revisions.${index}`, 'is marked twice', 'Mark each revision once.');
        }
      };
      const checkRevision = (id: number | null, path: string): void => {
        if (id !== null && !revisions.has(id)) {
          refuse(path, 'is not a revision of the catalogue', 'Choose the revision from the list.');
        }
      };
      const checkPhoto = (id: number | null, path: string): void => {
        if (id !== null && !photos.has(id)) {
          refuse(path, 'is not a photo you may use here', 'Add the photo from your own files.');
        }
      };
      const checkKeys = (items: readonly { key: string }[], path: string): void => {
        for (const index of repeated(items.map((item) => item.key))) {
          refuse(`${path}.${index}.key`, 'is used twice', 'Give each its own key.');
        }
      };

      content.joints.forEach((joint, index) => {
        checkSide(joint.a, `joints.${index}.a`);
        checkSide(joint.b, `joints.${index}.b`);
      });
      content.symptoms.forEach((slug, index) => {
        if (!symptoms.has(slug))
          refuse(`symptoms.${index}`, 'is not on the list of symptoms', 'Pick it from the list.');
      });
      content.readings.forEach((reading, index) =>
        checkRevision(reading.revisionId, `readings.${index}.revisionId`),
      );
      content.fixes.forEach((fix, index) => {
        fix.revisionIds.forEach((id, at) => checkRevision(id, `fixes.${index}.revisionIds.${at}`));
        fix.steps.forEach((step, at) => checkPhoto(step.photoId, `fixes.${index}.steps.${at}.photoId`));
        checkKeys(fix.steps, `fixes.${index}.steps`);
      });
      content.photos.forEach((use, index) => checkPhoto(use.photoId, `photos.${index}.photoId`));
      checkKeys(content.readings, 'readings');
      checkKeys(content.fixes, 'fixes');
      return broken;
    },

    /** Readings and fixes that speak of a revision of a part that no joint names; asked when an edition goes to the desk. */
    async findStrayRevisions(content: EditionContent): Promise<FieldProblem[]> {
      const revisions = await hardware.revisionsByIds(revisionIdsOf(content));
      const parts = new Set(partIdsOf(content));
      const stray = (id: number | null): boolean => id !== null && !parts.has(revisions.get(id)?.partId ?? 0);
      const problem = (path: string): FieldProblem => ({
        path,
        message: 'belongs to a part that no joint names',
        remedy: 'Choose a revision of one of the parts above, or none.',
      });
      return [
        ...content.readings.flatMap((reading, index) =>
          stray(reading.revisionId) ? [problem(`readings.${index}.revisionId`)] : [],
        ),
        ...content.fixes.flatMap((fix, index) =>
          fix.revisionIds.flatMap((id, at) =>
            stray(id) ? [problem(`fixes.${index}.revisionIds.${at}`)] : [],
          ),
        ),
      ];
    },
  };
}

/** Every revision that the content names anywhere. */
function revisionIdsOf(content: EditionContent): number[] {
  return [
    ...sidesOf(content).flatMap((side) => side.revisions.map((mark) => mark.revisionId)),
    ...content.readings.flatMap((reading) => reading.revisionId ?? []),
    ...content.fixes.flatMap((fix) => fix.revisionIds),
  ];
}

/** Places at which a value stands that stood before. */
function repeated(values: readonly unknown[]): number[] {
  return values.flatMap((value, index) => (values.indexOf(value) < index ? [index] : []));
}
