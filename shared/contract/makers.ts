import { z } from 'zod';
import { Email } from './accounts.js';
import { Feature, MakerRef, PartRef, PartSummary, Revision, RevisionRef } from './hardware.js';
import { Day, Id, IdText, Instant, Slug, line, passage } from './primitives.js';
import { anyone, makers, moderators, route, signedIn } from './route.js';
import { PersonRef, RichText } from './write-ups.js';

export const makerRequestStates = ['waiting-for-mail', 'waiting', 'granted', 'declined', 'ended'] as const;
export const MakerRequestState = z.enum(makerRequestStates);
export type MakerRequestState = z.infer<typeof MakerRequestState>;

/** Somebody's wish to speak for a maker, and what became of it. */
export const MakerRequest = z.object({
  id: Id,
  state: MakerRequestState,
  /** By a link mailed to the maker's domain, or by the desk's decision. */
  how: z.enum(['mail', 'desk']),
  note: z.string(),
  reason: z.string().nullable(),
  createdAt: Instant,
  decidedAt: Instant.nullable(),
});
export type MakerRequest = z.infer<typeof MakerRequest>;

export const DeskMakerRequest = MakerRequest.extend({
  maker: MakerRef,
  person: PersonRef,
  mailDomain: z.string().nullable(),
  /** Others who speak for the maker already. */
  speakers: z.array(PersonRef),
});
export type DeskMakerRequest = z.infer<typeof DeskMakerRequest>;

/** A domain as it stands behind the @ of an address. */
export const MailDomain = z
  .string()
  .trim()
  .toLowerCase()
  .max(253)
  .regex(
    /^(?:[a-z0-9](?:[a-z0-9-]{0,61}[a-z0-9])?\.)+[a-z](?:[a-z0-9-]{0,61}[a-z0-9])$/,
    'is not a complete domain, such as maker.example',
  );

export const MakerPage = MakerRef.extend({
  about: z.string(),
  /** Mail to an address there proves that one speaks for the maker; null while the desk has not named one. */
  mailDomain: z.string().nullable(),
  parts: z.array(PartSummary),
  speakers: z.array(PersonRef.extend({ since: Instant })),
  answers: z.array(z.object({ slug: Slug, title: z.string(), changedAt: Instant })),
  /** Announced and not sold yet. */
  announced: z.array(
    z.object({
      part: PartRef.pick({ slug: true, name: true }),
      revision: RevisionRef,
      soldFrom: Day.nullable(),
      whatChanges: z.string(),
    }),
  ),
  madeRight: z.array(
    z.object({ slug: Slug, title: z.string(), from: RevisionRef.extend({ partName: z.string() }) }),
  ),
  iSpeak: z.boolean(),
  /** The caller's latest request. */
  myRequest: MakerRequest.nullable(),
  /** For moderators only. */
  contactAddress: z.string().nullable(),
});
export type MakerPage = z.infer<typeof MakerPage>;

export const AskToSpeak = z.discriminatedUnion('how', [
  z.strictObject({ how: z.literal('mail'), address: Email }),
  z.strictObject({ how: z.literal('desk'), note: passage(2000, 20) }),
]);
export type AskToSpeak = z.infer<typeof AskToSpeak>;

export const MakerAnswer = z.object({
  maker: MakerRef,
  text: RichText,
  person: PersonRef,
  createdAt: Instant,
  changedAt: Instant,
  /** What it said before, the newest first. */
  earlier: z.array(z.object({ text: RichText, from: Instant, to: Instant })),
});
export type MakerAnswer = z.infer<typeof MakerAnswer>;

/** One maker of the parts of a write-up's joints. */
export const ConcernedMaker = z.object({
  maker: MakerRef,
  iSpeak: z.boolean(),
  /** Its parts in the write-up with all their revisions, oldest first. */
  parts: z.array(PartRef.extend({ revisions: z.array(RevisionRef) })),
  /** Whether the desk has an address to write to. */
  canBeTold: z.boolean(),
  /** Letters about this write-up, the newest first. */
  letters: z.array(z.object({ person: PersonRef, sentAt: Instant })),
});
export type ConcernedMaker = z.infer<typeof ConcernedMaker>;

export const MakerSide = z.object({
  answers: z.array(MakerAnswer),
  makers: z.array(ConcernedMaker),
  /** Whether the caller is an author of the write-up or a moderator. */
  mayTell: z.boolean(),
});
export type MakerSide = z.infer<typeof MakerSide>;

export const AnnounceRevision = z.strictObject({
  label: line(60, 1),
  soldFrom: Day.nullable(),
  whatChanges: passage(2000, 10),
  howToTell: passage(2000, 10),
});
export type AnnounceRevision = z.infer<typeof AnnounceRevision>;

/** What a maker asks owners to measure on a revision: dimensions of the part's joints with few readings or none. */
export const WantedReadings = z.object({
  revision: RevisionRef,
  announced: z.boolean(),
  features: z.array(
    z.object({
      feature: Feature,
      /** Joints that the feature is one side of. */
      joints: z.array(z.object({ slug: Slug, name: z.string() })),
      dimensions: z.array(
        z.object({
          name: z.string(),
          label: z.string(),
          howTo: z.string(),
          readings: z.number().int(),
        }),
      ),
    }),
  ),
});
export type WantedReadings = z.infer<typeof WantedReadings>;

const fixKeys = z.array(z.string().min(8).max(36)).min(1, 'takes at least one fix').max(20);

export const LetterTable = z.object({
  caption: z.string(),
  head: z.array(z.string()),
  rows: z.array(z.array(z.string())),
});
export type LetterTable = z.infer<typeof LetterTable>;

export const MakerLetter = z.object({
  maker: MakerRef,
  /** Where it goes: whole for moderators, shortened for others. */
  to: z.string(),
  subject: z.string(),
  paragraphs: z.array(z.string()),
  tables: z.array(LetterTable),
  /** The drawing of the joint as SVG; null where too little is known to draw it. */
  drawing: z.string().nullable(),
  attachments: z.array(z.object({ fileName: z.string(), mediaType: z.string(), bytes: z.number().int() })),
  /** Who told the maker of it this calendar month (UTC). */
  sent: z.object({ person: PersonRef, sentAt: Instant }).nullable(),
});
export type MakerLetter = z.infer<typeof MakerLetter>;

const tag = 'makers';
const bySlug = z.object({ slug: Slug });
const byId = z.object({ id: IdText });
const ofMaker = z.object({ slug: Slug, maker: Slug });
const reason = passage(1000, 10);

export const makerRoutes = {
  readMaker: route({
    method: 'get',
    path: '/api/makers/:slug',
    tag,
    access: anyone,
    summary: 'A maker: its parts, who speaks for it, what it answered, announced and made right',
    params: bySlug,
    response: MakerPage,
  }),
  askToSpeak: route({
    method: 'post',
    path: '/api/makers/:slug/requests',
    tag,
    access: signedIn,
    status: 201,
    summary: 'Ask to speak for a maker: a link is mailed to an address at its domain, or the desk decides',
    params: bySlug,
    body: AskToSpeak,
    response: MakerRequest,
    problems: ['already-there', 'too-many-requests'],
  }),
  proveByMail: route({
    method: 'post',
    path: '/api/maker-proofs',
    tag,
    access: signedIn,
    summary: 'Use the mailed link up, signed in as the one who asked; single use, 24 hours',
    body: z.strictObject({ token: z.string().min(20).max(100) }),
    response: z.object({ maker: MakerRef }),
    problems: ['token-not-valid', 'too-many-requests'],
  }),
  stopSpeaking: route({
    method: 'delete',
    path: '/api/makers/:slug/speaking',
    tag,
    access: signedIn,
    summary: 'Speak for a maker no longer, or take a request back that waits',
    params: bySlug,
  }),
  readMakerRequest: route({
    method: 'get',
    path: '/api/desk/maker-requests/:id',
    tag,
    access: moderators,
    summary: 'A request to speak for a maker, with what the desk needs to decide',
    params: byId,
    response: DeskMakerRequest,
  }),
  decideMakerRequest: route({
    method: 'post',
    path: '/api/desk/maker-requests/:id/decision',
    tag,
    access: moderators,
    summary: 'Grant or decline a request with a reason that goes to the asker',
    params: byId,
    body: z.strictObject({ granted: z.boolean(), reason }),
    problems: ['already-there', 'claimed-by-another'],
  }),
  endSpeaking: route({
    method: 'post',
    path: '/api/desk/makers/:slug/end',
    tag,
    access: moderators,
    summary: 'End that somebody speaks for a maker, with a reason that goes to them',
    params: bySlug,
    body: z.strictObject({ accountId: Id, reason }),
  }),
  changeMakerAddresses: route({
    method: 'put',
    path: '/api/desk/makers/:slug/addresses',
    tag,
    access: moderators,
    summary: "Name the maker's mail domain, which proves who speaks for it, and the address letters go to",
    params: bySlug,
    body: z.strictObject({ mailDomain: MailDomain.nullable(), contactAddress: Email.nullable() }),
  }),
  readMakerSide: route({
    method: 'get',
    path: '/api/write-ups/:slug/makers',
    tag,
    access: anyone,
    summary: 'What the makers of the parts say on a write-up, and who told them of it',
    params: bySlug,
    response: MakerSide,
  }),
  putMakerAnswer: route({
    method: 'put',
    path: '/api/write-ups/:slug/makers/:maker/answer',
    tag,
    access: makers,
    summary: "The maker's one answer on a write-up about its parts; the text before is kept",
    params: ofMaker,
    body: z.strictObject({ text: passage(6000, 10) }),
    response: MakerAnswer,
    problems: ['too-many-requests'],
  }),
  takeBackMakerAnswer: route({
    method: 'post',
    path: '/api/write-ups/:slug/makers/:maker/answer/take-back',
    tag,
    access: makers,
    summary: "Show the maker's answer no longer: whoever speaks for it, or a moderator with a reason",
    params: ofMaker,
    body: z.strictObject({ reason: line(300) }),
  }),
  markMadeRight: route({
    method: 'post',
    path: '/api/write-ups/:slug/made-right',
    tag,
    access: makers,
    summary: 'Say from which revision of its part on the maker has corrected what the fixes mend',
    params: bySlug,
    body: z.strictObject({
      revisionId: Id,
      /** Null: every fix of the write-up. */
      fixKeys: fixKeys.nullable(),
    }),
    response: z.object({ fixKeys: z.array(z.string()) }),
  }),
  unmarkMadeRight: route({
    method: 'post',
    path: '/api/write-ups/:slug/made-right/undo',
    tag,
    access: makers,
    summary: 'Take back that fixes are made right: whoever speaks for that maker, or a moderator',
    params: bySlug,
    body: z.strictObject({ fixKeys }),
    response: z.object({ fixKeys: z.array(z.string()) }),
  }),
  announceRevision: route({
    method: 'post',
    path: '/api/parts/:slug/announced-revisions',
    tag,
    access: makers,
    status: 201,
    summary: 'Announce a revision of a part: it stands in the catalogue as announced until it is sold',
    params: bySlug,
    body: AnnounceRevision,
    response: Revision,
    problems: ['already-there', 'too-many-requests'],
  }),
  changeAnnounced: route({
    method: 'put',
    path: '/api/announced-revisions/:id',
    tag,
    access: makers,
    summary: 'Change what is said of a revision that is not sold yet',
    params: byId,
    body: AnnounceRevision,
    response: Revision,
    problems: ['already-there'],
  }),
  sellRevision: route({
    method: 'post',
    path: '/api/announced-revisions/:id/sold',
    tag,
    access: makers,
    summary: 'Say that an announced revision is sold now',
    params: byId,
    body: z.strictObject({ soldFrom: Day }),
    response: Revision,
  }),
  withdrawAnnounced: route({
    method: 'delete',
    path: '/api/announced-revisions/:id',
    tag,
    access: makers,
    summary: 'Take an announced revision out of the catalogue while nothing hangs on it',
    params: byId,
    problems: ['already-there'],
  }),
  listWantedReadings: route({
    method: 'get',
    path: '/api/parts/:slug/wanted-readings',
    tag,
    access: anyone,
    summary: 'What the maker asks owners to measure on revisions that it announced',
    params: bySlug,
    response: z.object({ items: z.array(WantedReadings) }),
  }),
  readMakerLetter: route({
    method: 'get',
    path: '/api/write-ups/:slug/makers/:maker/letter',
    tag,
    access: signedIn,
    summary: 'The letter that would tell the maker of a write-up (its authors and moderators)',
    params: ofMaker,
    response: MakerLetter,
  }),
  sendMakerLetter: route({
    method: 'post',
    path: '/api/write-ups/:slug/makers/:maker/letter',
    tag,
    access: signedIn,
    status: 201,
    summary: 'Tell the maker of a write-up, with the evidence and the drawing; once in a calendar month',
    params: ofMaker,
    body: z.strictObject({ note: passage(2000) }),
    response: MakerLetter,
    problems: ['already-there'],
  }),
};
