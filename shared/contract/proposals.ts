import { z } from 'zod';
import { PartRef, RevisionPhoto } from './hardware.js';
import { Process } from './joints.js';
import { Day, Id, IdText, Instant, PageQuery, Slug, line, pageOf, passage } from './primitives.js';
import { moderators, route, signedIn } from './route.js';
import { FeatureKind, PartKind } from './vocabulary.js';
import { PersonRef } from './write-ups.js';

export const ProposedPart = z.strictObject({
  kind: z.literal('part'),
  /** Name of a maker of the catalogue, or of one that is not there yet. */
  maker: line(120, 1),
  partKind: PartKind,
  name: line(120, 1),
  about: passage(2000),
});
export type ProposedPart = z.infer<typeof ProposedPart>;

export const mostProposedPhotos = 3;

export const ProposedRevision = z.strictObject({
  kind: z.literal('revision'),
  label: line(60, 1),
  soldFrom: Day.nullable(),
  /** Up to, not including, this day; null while it is sold. */
  soldTo: Day.nullable(),
  howToTell: passage(2000),
  whatChanged: passage(2000),
  /** Photos of the proposer's own that show how to tell it. */
  photos: z
    .array(z.strictObject({ photoId: Id, caption: line(200, 3) }))
    .max(mostProposedPhotos, `takes at most ${mostProposedPhotos} photos`)
    .refine(
      (photos) => new Set(photos.map(({ photoId }) => photoId)).size === photos.length,
      'names a photo twice',
    )
    .default([]),
});
export type ProposedRevision = z.infer<typeof ProposedRevision>;

export const ProposedFeature = z.strictObject({
  kind: z.literal('feature'),
  featureKind: FeatureKind,
  name: line(120, 1),
  process: Process,
});
export type ProposedFeature = z.infer<typeof ProposedFeature>;

const inOrder = {
  check: (entry: Proposed): boolean =>
    entry.kind !== 'revision' ||
    entry.soldFrom === null ||
    entry.soldTo === null ||
    entry.soldFrom < entry.soldTo,
  told: { path: ['soldTo'], message: 'comes after the day it was first sold' },
};

/** What somebody proposes for the catalogue. */
export const Proposed = z.discriminatedUnion('kind', [ProposedPart, ProposedRevision, ProposedFeature]);
export type Proposed = z.infer<typeof Proposed>;

export const proposalKinds = ['part', 'revision', 'feature'] as const;
export const proposalStates = ['waiting', 'taken', 'declined'] as const;
export const ProposalState = z.enum(proposalStates);
export type ProposalState = z.infer<typeof ProposalState>;
export const proposalStateWords: Record<ProposalState, string> = {
  waiting: 'waiting at the desk',
  taken: 'taken into the catalogue',
  declined: 'declined',
};

export const Propose = z.strictObject({
  /** The part it belongs to; null for a part. */
  partId: Id.nullable(),
  entry: Proposed.refine(inOrder.check, inOrder.told),
});
export type Propose = z.infer<typeof Propose>;

export const Proposal = z.object({
  id: Id,
  state: ProposalState,
  /** The part it belongs to; of a part, the one it became. */
  part: PartRef.nullable(),
  entry: Proposed,
  /** The photos that the entry names, as far as they are still there. */
  photos: z.array(RevisionPhoto),
  createdAt: Instant,
  reason: z.string().nullable(),
  decidedAt: Instant.nullable(),
});
export type Proposal = z.infer<typeof Proposal>;

export const DeskProposal = Proposal.extend({ person: PersonRef });
export type DeskProposal = z.infer<typeof DeskProposal>;

/** Puts what is twice in the catalogue together: what `from` has goes to `into`, and `from` is gone. */
export const Merge = z.strictObject({
  kind: z.enum(proposalKinds),
  from: Id,
  into: Id,
  /**
   * With a part: which revision of `into` each revision of `from` is. One that is not named moves over as a revision of
   * its own; its label must be free there.
   */
  revisionMap: z
    .array(z.strictObject({ from: Id, into: Id }))
    .max(100)
    .default([]),
});
export type Merge = z.infer<typeof Merge>;

const tag = 'proposals';
const byId = z.object({ id: IdText });

export const proposalRoutes = {
  propose: route({
    method: 'post',
    path: '/api/proposals',
    tag,
    access: signedIn,
    status: 201,
    summary: 'Propose a part, a revision or a feature for the catalogue',
    body: Propose,
    response: Proposal,
    problems: ['already-there', 'too-many-requests'],
  }),
  listMyProposals: route({
    method: 'get',
    path: '/api/my/proposals',
    tag,
    access: signedIn,
    summary: 'What I proposed, the newest first',
    query: PageQuery,
    response: pageOf(Proposal),
  }),
  listDeskProposals: route({
    method: 'get',
    path: '/api/desk/proposals',
    tag,
    access: moderators,
    summary: 'Proposals that wait, the longest wait first',
    query: PageQuery,
    response: pageOf(DeskProposal),
  }),
  readDeskProposal: route({
    method: 'get',
    path: '/api/desk/proposals/:id',
    tag,
    access: moderators,
    summary: 'One proposal, waiting or decided',
    params: byId,
    response: DeskProposal,
  }),
  takeProposal: route({
    method: 'post',
    path: '/api/desk/proposals/:id/take',
    tag,
    access: moderators,
    summary: 'Take a proposal into the catalogue, as it is or amended, and tell the proposer',
    params: byId,
    body: z.strictObject({ entry: Proposed.refine(inOrder.check, inOrder.told).nullable() }),
    response: z.object({ slug: Slug }),
    problems: ['already-there', 'claimed-by-another'],
  }),
  declineProposal: route({
    method: 'post',
    path: '/api/desk/proposals/:id/decline',
    tag,
    access: moderators,
    summary: 'Decline a proposal with a reason that goes to the proposer',
    params: byId,
    body: z.strictObject({ reason: passage(1000, 10) }),
    problems: ['already-there', 'claimed-by-another'],
  }),
  merge: route({
    method: 'post',
    path: '/api/desk/merges',
    tag,
    access: moderators,
    summary:
      'Merge a duplicate part, revision or feature into another; benches, readings, reports and write-ups follow',
    body: Merge,
    response: z.object({ slug: Slug }),
  }),
};
