import type { EditionContent, Fix, JointSide, PhotoUse } from '../../shared/contract/edition-content.js';
import type { PartRef, RevisionRef } from '../../shared/contract/hardware.js';
import type { Photo } from '../../shared/contract/photos.js';
import type {
  EditionView,
  FixView,
  JointSideView,
  PhotoShown,
  RichText,
} from '../../shared/contract/write-ups.js';
import { cautionsAt } from '../../shared/safety/caution-places.js';
import type { HardwareService } from '../hardware/hardware.js';
import type { CautionStore } from './caution.store.js';
import { partIdsOf, photoIdsOf } from './edition-links.js';
import type { FixRow, FixStore } from './fix.store.js';

/** What write-ups need of the photo store. */
export interface PhotoLookup {
  photosByIds(ids: readonly number[]): Promise<Map<number, Photo>>;
}

export interface ViewParts {
  readonly hardware: HardwareService;
  readonly photos: PhotoLookup;
  readonly renderText: (source: string) => RichText;
  readonly fixes: FixStore;
  readonly cautions: CautionStore;
}

export type EditionViews = ReturnType<typeof createEditionViews>;

/** Draws an edition up as its page shows it: published, as it once was, or as a draft. Six queries side by side. */
export function createEditionViews({ hardware, photos, renderText, fixes, cautions }: ViewParts) {
  return {
    /** Cautions and standings are always those of today, and no caution is left out. A joint with a part not chosen yet is left out. */
    async viewOf(content: EditionContent, writeUpId: number): Promise<EditionView> {
      const partIds = partIdsOf(content);
      const [parts, revisionsOf, symptoms, pictures, known, placed] = await Promise.all([
        hardware.partsByIds(partIds),
        hardware.revisionsByPartIds(partIds),
        hardware.symptomsBySlugs(content.symptoms),
        photos.photosByIds(photoIdsOf(content)),
        fixes.fixesOf(writeUpId),
        cautions.cautionsOf(writeUpId),
      ]);
      const revisions = new Map([...revisionsOf.values()].flat().map((revision) => [revision.id, revision]));

      return {
        title: content.title,
        summary: content.summary,
        joints: content.joints.flatMap((joint) => {
          const a = sideOf(joint.a, parts, revisionsOf);
          const b = sideOf(joint.b, parts, revisionsOf);
          return a && b ? [{ a, b }] : [];
        }),
        symptoms: content.symptoms.flatMap((slug) => symptoms.get(slug) ?? []),
        noticed: renderText(content.noticed),
        cause: renderText(content.cause),
        readings: content.readings.map(({ revisionId, ...reading }) => {
          const revision = revisionId === null ? undefined : revisions.get(revisionId);
          return { ...reading, revision: revision ?? null, part: partNameOf(revision) };
        }),
        fixes: content.fixes.map((fix) => ({
          ...textOf(fix),
          ...evidenceOf(known.get(fix.key)),
          cautions: cautionsAt(content, placed, { fixKey: fix.key, stepKey: null }),
        })),
        photos: content.photos.flatMap((use) => {
          const photo = pictures.get(use.photoId);
          return photo ? [{ ...shownAs(photo, use), caption: use.caption }] : [];
        }),
        sources: renderText(content.sources),
        cautions: cautionsAt(content, placed, { fixKey: null, stepKey: null }),
      };

      function partNameOf(revision: RevisionRef | undefined): string | null {
        return (revision && parts.get(revision.partId)?.name) ?? null;
      }

      /** A step's photo says and shows what it does where it stands among the photos of the write-up. */
      function photoOfStep(photoId: number | null): PhotoShown | null {
        const photo = photoId === null ? undefined : pictures.get(photoId);
        return photo
          ? shownAs(
              photo,
              content.photos.find((use) => use.photoId === photoId),
            )
          : null;
      }

      function textOf(fix: Fix): Omit<FixView, 'cautions' | keyof ReturnType<typeof evidenceOf>> {
        const { key, title, kind, permanence, tools, materials, afterwards, afterwardsNote, acceptance } =
          fix;
        return {
          key,
          title,
          kind,
          permanence,
          tools,
          materials,
          afterwards,
          afterwardsNote,
          acceptance,
          // Editions from before worksheets lack the field.
          worksheet: fix.worksheet ?? null,
          why: renderText(fix.why),
          steps: fix.steps.map((step) => ({
            key: step.key,
            text: renderText(step.text),
            photo: photoOfStep(step.photoId),
            cautions: cautionsAt(content, placed, { fixKey: fix.key, stepKey: step.key }),
          })),
          revisions: fix.revisionIds.flatMap((id) => {
            const revision = revisions.get(id);
            return revision ? [{ ...revision, partName: partNameOf(revision) ?? '' }] : [];
          }),
        };
      }
    },
  };
}

/** Editions from before callouts lack the field. */
function shownAs(photo: Photo, use: PhotoUse | undefined): PhotoShown {
  return { photo, alt: use?.alt || photo.alt, callouts: use?.callouts ?? [] };
}

/** A fix that was never published nor on the desk has nothing behind it yet. */
function evidenceOf(fix: FixRow | undefined): Pick<FixView, 'standing' | 'madeRightFrom' | 'trialCounts'> {
  return {
    standing: fix?.standing ?? 'told',
    madeRightFrom: fix?.madeRightFrom ?? null,
    trialCounts: fix?.trialCounts ?? { held: 0, heldForAWhile: 0, didNotHelp: 0 },
  };
}

function sideOf(
  side: JointSide,
  parts: ReadonlyMap<number, PartRef>,
  revisionsOf: ReadonlyMap<number, RevisionRef[]>,
): JointSideView | undefined {
  const part = side.partId === null ? undefined : parts.get(side.partId);
  if (!part) return undefined;
  const holds = new Map(side.revisions.map((mark) => [mark.revisionId, mark.holds]));
  const all = revisionsOf.get(part.id) ?? [];
  return {
    part,
    feature: side.feature,
    revisions: all.flatMap((revision) => {
      const marked = holds.get(revision.id);
      return marked === undefined ? [] : [{ ...revision, holds: marked }];
    }),
    notKnown: all.filter((revision) => !holds.has(revision.id)),
  };
}
