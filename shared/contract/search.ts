import { z } from 'zod';
import { PartRef, RevisionRef } from './hardware.js';
import { Cursor, Id, IdText, Instant, Slug } from './primitives.js';
import { anyone, route } from './route.js';
import { FixKind, Permanence, Standing } from './vocabulary.js';

/** Whether a write-up holds for what the reader has; see shared/fit/applicability.ts. */
export const Applicability = z.object({
  verdict: z.enum(['holds', 'not-known', 'written-for-others', 'not-yours']),
  /** One entry for each part of the joint that the reader has, the gravest first. */
  reasons: z.array(
    z.object({
      verdict: z.enum(['holds', 'not-known', 'written-for-others']),
      part: z.string(),
      /** The reader's revision; null: they have not said which one. */
      mine: RevisionRef.nullable(),
      /** Labels of the revisions it holds for. */
      holdsFor: z.array(z.string()),
    }),
  ),
});
export type Applicability = z.infer<typeof Applicability>;

export const SearchQuery = z.strictObject({
  q: z.string().trim().max(200, 'takes at most 200 characters').default(''),
  part: z.array(Slug).max(20).default([]),
  revision: z.array(IdText).max(40).default([]),
  symptom: z.array(Slug).max(20).default([]),
  permanence: z.array(Permanence).max(3).default([]),
  standing: z.array(Standing).max(4).default([]),
  kind: z.array(FixKind).max(6).default([]),
  /** Revisions the reader has, for a visitor whose bench is kept by the browser; a member's bench is read on the server. */
  mine: z.array(IdText).max(100).default([]),
  cursor: Cursor.optional(),
  limit: z.coerce.number().int().min(1).max(50).default(20),
});
export type SearchQuery = z.infer<typeof SearchQuery>;

/** A run of text; `hit` where it matches the words searched for. */
export const TextRun = z.object({ text: z.string(), hit: z.boolean() });
export type TextRun = z.infer<typeof TextRun>;

export const SearchHit = z.object({
  slug: Slug,
  title: z.array(TextRun),
  excerpt: z.array(TextRun),
  sides: z.array(z.object({ part: PartRef, holdsFor: z.array(RevisionRef), notFor: z.array(RevisionRef) })),
  symptoms: z.array(z.string()),
  fixes: z.array(z.object({ title: z.string(), kind: FixKind, permanence: Permanence, standing: Standing })),
  photo: z
    .object({
      hash: z.string(),
      alt: z.string(),
      placeholder: z.string(),
      width: z.number().int(),
      height: z.number().int(),
      widths: z.array(z.number().int()),
    })
    .nullable(),
  publishedAt: Instant,
  applicability: Applicability,
});
export type SearchHit = z.infer<typeof SearchHit>;

export const FacetValue = z.object({ value: z.string(), label: z.string(), count: z.number().int() });
export type FacetValue = z.infer<typeof FacetValue>;

export const SearchResults = z.object({
  items: z.array(SearchHit),
  next: z.string().nullable(),
  total: z.number().int(),
  facets: z.object({
    part: z.array(FacetValue),
    /** Revisions of the parts chosen in `part`; empty while none is chosen. */
    revision: z.array(FacetValue),
    symptom: z.array(FacetValue),
    permanence: z.array(FacetValue),
    standing: z.array(FacetValue),
    kind: z.array(FacetValue),
  }),
  /** How many revisions of the reader were taken into account. */
  benchSize: z.number().int(),
});
export type SearchResults = z.infer<typeof SearchResults>;

export const searchRoutes = {
  search: route({
    method: 'get',
    path: '/api/search',
    tag: 'search',
    access: anyone,
    summary:
      'Write-ups for a symptom: what holds for the reader’s bench first, then what is not known for it, then the rest',
    query: SearchQuery,
    response: SearchResults,
    problems: ['search-unavailable'],
  }),
};

/** The document of the `write-ups` index; one for each published write-up. */
export const WriteUpDocument = z.object({
  id: Id,
  slug: Slug,
  title: z.string(),
  symptoms: z.array(z.string()),
  noticed: z.string(),
  summary: z.string(),
  parts: z.array(z.string()),
  fixTitles: z.array(z.string()),
  /** Features and readings in words, figures in plain form: "lip diameter 22.5 mm 0.886 in". */
  measured: z.string(),
  cause: z.string(),
  fixText: z.string(),
  symptomSlugs: z.array(z.string()),
  partSlugs: z.array(z.string()),
  /** Revisions it holds for. */
  revisionIds: z.array(Id),
  /** Revisions it was found not to hold for. */
  notRevisionIds: z.array(Id),
  partIds: z.array(Id),
  permanence: z.array(Permanence),
  standing: z.array(Standing),
  kind: z.array(FixKind),
  publishedAt: z.number().int(),
  /** What a result line shows, so that no database read is needed. */
  card: SearchHit.pick({ sides: true, symptoms: true, fixes: true, photo: true, publishedAt: true }),
});
export type WriteUpDocument = z.infer<typeof WriteUpDocument>;
