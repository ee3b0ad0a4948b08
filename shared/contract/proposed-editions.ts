import { z } from 'zod';
import { EditionContent } from './edition-content.js';
import { Photo } from './photos.js';
import { Id, IdText, Instant, PageQuery, Slug, line, pageOf } from './primitives.js';
import { route, signedIn } from './route.js';
import { Draft, EditionComparison, EditionLine, PersonRef } from './write-ups.js';

/** A published edition with its text. */
export const PublishedText = z.object({
  edition: EditionLine,
  content: EditionContent,
  photos: z.array(Photo),
});
export type PublishedText = z.infer<typeof PublishedText>;

/** What a draft on a published write-up is merged with. */
export const MergeGround = z.object({
  /** Null where it is not known what the draft began from. */
  base: PublishedText.nullable(),
  current: PublishedText,
  /** Top-level fields in which the two differ. */
  changed: z.array(z.string()),
});
export type MergeGround = z.infer<typeof MergeGround>;

/** What an author of a write-up tells the desk of an edition that somebody else proposes on it. */
export const Opinion = z.object({
  person: PersonRef,
  agrees: z.boolean(),
  line: z.string(),
  at: Instant,
  /** Whether the edition was handed in again after it, and may say something else by now. */
  beforeHandingIn: z.boolean(),
});
export type Opinion = z.infer<typeof Opinion>;

export const ProposedEdition = z.object({
  editionId: Id,
  slug: Slug,
  title: z.string(),
  author: PersonRef,
  changeNote: z.string(),
  submittedAt: Instant,
  /** What the caller told the desk of it. */
  myOpinion: Opinion.nullable(),
});
export type ProposedEdition = z.infer<typeof ProposedEdition>;

const idParams = z.object({ id: IdText });
const tag = 'write-ups';

export const proposedEditionRoutes = {
  bringEditionBack: route({
    method: 'post',
    path: '/api/write-ups/:slug/editions/:number/bring-back',
    tag,
    access: signedIn,
    status: 201,
    summary:
      'Start the next edition with the text of an earlier one; refused while the caller has another under way',
    params: z.object({ slug: Slug, number: IdText }),
    response: Draft,
    problems: ['edition-state'],
  }),
  readMergeGround: route({
    method: 'get',
    path: '/api/drafts/:id/published',
    tag,
    access: signedIn,
    summary: 'What a draft of mine began from, and what is published now',
    params: idParams,
    response: MergeGround,
  }),
  listProposedEditions: route({
    method: 'get',
    path: '/api/my/proposed-editions',
    tag,
    access: signedIn,
    summary: 'Editions on the desk that others propose on write-ups of mine, the last handed in first',
    query: PageQuery,
    response: pageOf(ProposedEdition),
  }),
  readProposedEdition: route({
    method: 'get',
    path: '/api/my/proposed-editions/:id',
    tag,
    access: signedIn,
    summary:
      'An edition that somebody proposes on a write-up of mine, word by word against what is published',
    params: idParams,
    response: ProposedEdition.extend({ comparison: EditionComparison }),
  }),
  giveOpinion: route({
    method: 'put',
    path: '/api/my/proposed-editions/:id/opinion',
    tag,
    access: signedIn,
    summary: 'Tell the desk whether I agree; a second word replaces the first',
    params: idParams,
    body: z.strictObject({ agrees: z.boolean(), line: line(300) }),
    response: Opinion,
  }),
};
