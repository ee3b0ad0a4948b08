import type { EditionContent, JointSide } from '../../shared/contract/edition-content.js';
import { type Catalogue, known } from './seed-catalogue.js';
import type { DemoContent, DemoSide } from './write-up-shape.js';

/** Photos of one write-up's drawings, by the drawing's SVG. */
export type PhotoIds = ReadonlyMap<string, number>;

/** The content as the write-up service keeps it: names become identities, lists get their keys. */
export function resolveContent(content: DemoContent, catalogue: Catalogue, photos: PhotoIds): EditionContent {
  const revisionId = (key: string): number => known(catalogue.revisions, key);
  const photoIds = content.drawings.map((item) => known(photos, item.svg));
  return {
    title: content.title,
    summary: content.summary,
    joints: content.joints.map((entry) => ({ a: resolveSide(entry.a), b: resolveSide(entry.b) })),
    symptoms: [...content.symptoms],
    noticed: content.noticed,
    cause: content.cause,
    readings: content.readings.map(({ of, ...reading }, index) => ({
      key: `reading-${index + 1}`.padEnd(10, '0'),
      revisionId: of === '' ? null : revisionId(of),
      ...reading,
    })),
    fixes: content.fixes.map((item) => ({
      key: item.key,
      title: item.title,
      kind: item.kind,
      permanence: item.permanence,
      why: item.why,
      tools: [...item.tools],
      materials: [...item.materials],
      steps: item.steps.map((text, index) => ({
        key: `${item.key.slice(0, 30)}-s${index + 1}`,
        text,
        photoId: photoIds[item.stepDrawings[index] ?? -1] ?? null,
      })),
      revisionIds: item.only.flatMap((mark) => lettersOf(mark).map(revisionId)),
      afterwards: [...item.afterwards],
      afterwardsNote: item.afterwardsNote,
      acceptance: item.acceptance,
      worksheet: item.worksheet,
    })),
    photos: content.drawings.map((item, index) => ({
      photoId: photoIds[index]!,
      alt: item.alt,
      caption: item.caption,
      callouts: [...item.callouts],
    })),
    sources: content.sources,
  };

  function resolveSide(side: DemoSide): JointSide {
    const marks = (letters: string, holds: boolean) =>
      lettersOf(`${side.part}:${letters}`).map((key) => ({ revisionId: revisionId(key), holds }));
    return {
      partId: known(catalogue.parts, side.part),
      feature: side.feature,
      revisions: [...marks(side.holds, true), ...marks(side.not, false)],
    };
  }
}

/** `part:A B` and `part:A,B` become `part:A` and `part:B`. */
export function lettersOf(mark: string): string[] {
  const [part = '', letters = ''] = mark.split(':');
  return letters
    .split(/[ ,]+/)
    .filter((letter) => letter !== '')
    .map((letter) => `${part}:${letter}`);
}
