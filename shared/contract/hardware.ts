import { z } from 'zod';
import { Day, Id, IdText, Instant, PageQuery, Slug, line, pageOf } from './primitives.js';
import { Photo } from './photos.js';
import { anyone, moderators, route, signedIn } from './route.js';
import { FeatureKind, PartKind } from './vocabulary.js';

export const MakerRef = z.object({ id: Id, slug: Slug, name: z.string() });
export type MakerRef = z.infer<typeof MakerRef>;

export const RevisionRef = z.object({
  id: Id,
  partId: Id,
  label: z.string(),
  /** Its maker has announced it and does not sell it yet. */
  announced: z.literal(true).optional(),
});
export type RevisionRef = z.infer<typeof RevisionRef>;

export const PartRef = z.object({ id: Id, slug: Slug, name: z.string(), kind: PartKind, maker: MakerRef });
export type PartRef = z.infer<typeof PartRef>;

/** A part with its revisions from the oldest to the newest. */
export const PartSummary = PartRef.extend({
  about: z.string(),
  revisions: z.array(RevisionRef),
  writeUps: z.number().int(),
});
export type PartSummary = z.infer<typeof PartSummary>;

/** A photo that shows how to tell a revision, and what to look at in it. */
export const RevisionPhoto = z.object({ photo: Photo, caption: z.string() });
export type RevisionPhoto = z.infer<typeof RevisionPhoto>;

export const mostRevisionPhotos = 6;

export const Revision = RevisionRef.extend({
  /** Half-open: sold from this day on (meant to be, while it is only announced) … */
  soldFrom: Day.nullable(),
  /** … up to, not including, this day; null while it is sold. */
  soldTo: Day.nullable(),
  /** When its maker announced it here; null where it came into the catalogue without. */
  announcedAt: Instant.nullable(),
  howToTell: z.string(),
  whatChanged: z.string(),
  photos: z.array(RevisionPhoto),
});
export type Revision = z.infer<typeof Revision>;

export const Feature = z.object({ id: Id, slug: Slug, name: z.string(), kind: FeatureKind });
export type Feature = z.infer<typeof Feature>;

export const PartPage = PartRef.extend({
  about: z.string(),
  photo: z
    .object({
      hash: z.string(),
      alt: z.string(),
      width: z.number(),
      height: z.number(),
      widths: z.array(z.number()),
      placeholder: z.string(),
    })
    .nullable(),
  revisions: z.array(Revision),
  features: z.array(Feature),
  writeUps: z.array(
    z.object({ slug: Slug, title: z.string(), holdsFor: z.array(z.string()), notFor: z.array(z.string()) }),
  ),
});
export type PartPage = z.infer<typeof PartPage>;

export const Symptom = z.object({ id: Id, slug: Slug, label: z.string(), group: z.string() });
export type Symptom = z.infer<typeof Symptom>;

/** One part on somebody's bench; the revision is null while its owner has not found out which one it is. */
export const BenchItem = z.object({ id: Id, part: PartSummary, revision: RevisionRef.nullable() });
export type BenchItem = z.infer<typeof BenchItem>;

const tag = 'hardware';
export const hardwareRoutes = {
  listMakers: route({
    method: 'get',
    path: '/api/makers',
    tag,
    access: anyone,
    summary: 'All makers by name',
    response: z.object({ items: z.array(MakerRef) }),
  }),
  listParts: route({
    method: 'get',
    path: '/api/parts',
    tag,
    access: anyone,
    summary: 'Parts by name, with their revisions',
    query: PageQuery.extend({ q: line(100).optional(), kind: PartKind.optional(), maker: Slug.optional() }),
    response: pageOf(PartSummary),
  }),
  readPart: route({
    method: 'get',
    path: '/api/parts/:slug',
    tag,
    access: anyone,
    summary: 'One part: revisions, features, write-ups',
    params: z.object({ slug: Slug }),
    response: PartPage,
  }),
  listSymptoms: route({
    method: 'get',
    path: '/api/symptoms',
    tag,
    access: anyone,
    summary: 'The controlled list of symptoms',
    response: z.object({ items: z.array(Symptom) }),
  }),
  addRevisionPhoto: route({
    method: 'post',
    path: '/api/revisions/:id/photos',
    tag,
    access: moderators,
    status: 201,
    summary: 'Show a photo of mine at how to tell a revision',
    params: z.object({ id: IdText }),
    body: z.strictObject({ photoId: Id, caption: line(200, 3) }),
    response: RevisionPhoto,
    problems: ['already-there'],
  }),
  removeRevisionPhoto: route({
    method: 'delete',
    path: '/api/revisions/:id/photos/:photoId',
    tag,
    access: moderators,
    summary: 'Show a photo no longer at a revision',
    params: z.object({ id: IdText, photoId: IdText }),
  }),
};

export const benchRoutes = {
  readBench: route({
    method: 'get',
    path: '/api/bench',
    tag: 'bench',
    access: signedIn,
    summary: 'My parts and their revisions',
    response: z.object({ items: z.array(BenchItem) }),
  }),
  addToBench: route({
    method: 'post',
    path: '/api/bench',
    tag: 'bench',
    access: signedIn,
    limitedMay: true,
    status: 201,
    summary: 'Put a part on my bench',
    body: z.strictObject({ partId: Id, revisionId: Id.nullable() }),
    response: BenchItem,
    problems: ['already-there'],
  }),
  changeBenchItem: route({
    method: 'patch',
    path: '/api/bench/:id',
    tag: 'bench',
    access: signedIn,
    limitedMay: true,
    summary: 'Say which revision it is',
    params: z.object({ id: IdText }),
    body: z.strictObject({ revisionId: Id.nullable() }),
    response: BenchItem,
  }),
  removeFromBench: route({
    method: 'delete',
    path: '/api/bench/:id',
    tag: 'bench',
    access: signedIn,
    limitedMay: true,
    summary: 'Take a part off my bench',
    params: z.object({ id: IdText }),
  }),
};
