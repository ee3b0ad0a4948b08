import { z } from 'zod';
import { EditionContent } from './edition-content.js';
import { Instant } from './primitives.js';
import { route, signedIn } from './route.js';

const When = Instant.nullable();
/** Why the desk took something off the pages, and when; null while it stands. */
const takenDown = { takenDownAt: When, takenDownReason: z.string().nullable() };
/** File in the folder `photos` of the archive; null where there is no photo. */
const PhotoFile = z.string().nullable();
/** A worksheet with its figures, as shared/contract/worksheet.ts has it. */
const Sheet = z.unknown();
const rows = <S extends z.ZodRawShape>(shape: S) => z.array(z.strictObject(shape));

/**
 * `data.json` of the archive: everything that one person wrote or keeps here. Parts, features and revisions stand by
 * name, lengths are mm, angles degrees, instants ISO 8601 in UTC. Text is as it was typed (Markdown where pages show it
 * formatted). There are no passwords, tokens or other people's data in it.
 */
export const OwnData = z.strictObject({
  format: z.literal('shimlore-own-data'),
  version: z.literal(1),
  createdAt: Instant,
  account: rows({
    email: z.string(),
    displayName: z.string(),
    role: z.string(),
    noticeMail: z.boolean(),
    mailRhythm: z.string(),
    benchWatch: z.boolean().nullable(),
    safetyMail: z.boolean(),
    mailRefusedAt: When,
    units: z.string(),
    createdAt: Instant,
    confirmedAt: When,
    deletionAt: When,
  }),
  bench: rows({ part: z.string(), revision: z.string().nullable(), since: Instant }),
  ownStock: rows({
    name: z.string(),
    thickness: z.number(),
    uncertainty: z.number(),
    available: z.number().nullable(),
  }),
  readings: rows({
    part: z.string(),
    feature: z.string(),
    revision: z.string(),
    dimension: z.string(),
    /** Mean and standard uncertainty in mm or degrees. */
    value: z.number(),
    uncertainty: z.number(),
    /** What was typed, in `unit`. */
    entered: z.array(z.number()),
    unit: z.string(),
    instrument: z.string(),
    photo: PhotoFile,
    createdAt: Instant,
    setAsideAt: When,
    setAsideReason: z.string().nullable(),
  }),
  trials: rows({
    writeUp: z.string().nullable(),
    fix: z.string(),
    revisions: z.array(z.string()),
    outcome: z.string(),
    note: z.string(),
    figure: z.number().nullable(),
    worksheet: Sheet,
    createdAt: Instant,
    ...takenDown,
  }),
  fitReports: rows({
    joint: z.string(),
    revisionA: z.string(),
    revisionB: z.string(),
    sat: z.boolean(),
    note: z.string(),
    createdAt: Instant,
    ...takenDown,
  }),
  questions: rows({
    address: z.string().nullable(),
    title: z.string(),
    text: z.string(),
    parts: z.array(z.string()),
    readings: z.array(z.unknown()),
    worksheet: Sheet,
    settledBy: z.string().nullable(),
    createdAt: Instant,
    ...takenDown,
  }),
  replies: rows({
    question: z.string().nullable(),
    text: z.string(),
    worksheet: Sheet,
    createdAt: Instant,
    ...takenDown,
  }),
  /** Editions in every state, drafts and those thrown away too. Identities in `content` are those of the site. */
  editions: rows({
    writeUp: z.string().nullable(),
    number: z.number(),
    state: z.string(),
    title: z.string(),
    content: EditionContent.loose(),
    changeNote: z.string(),
    returnReason: z.string().nullable(),
    createdAt: Instant,
    updatedAt: Instant,
    submittedAt: When,
    publishedAt: When,
    discardedAt: When,
  }),
  proposals: rows({
    kind: z.string(),
    proposed: z.unknown(),
    state: z.string(),
    reason: z.string().nullable(),
    createdAt: Instant,
    decidedAt: When,
  }),
  photos: rows({
    file: z.string(),
    alternativeText: z.string(),
    width: z.number(),
    height: z.number(),
    createdAt: Instant,
    ...takenDown,
  }),
  makerRequests: rows({
    maker: z.string(),
    state: z.string(),
    note: z.string(),
    reason: z.string().nullable(),
    createdAt: Instant,
    decidedAt: When,
  }),
  makersSpokenFor: rows({ maker: z.string(), since: Instant }),
  makerAnswers: rows({
    maker: z.string(),
    writeUp: z.string().nullable(),
    text: z.string(),
    createdAt: Instant,
    changedAt: Instant,
    takenBackAt: When,
  }),
  earlierMakerAnswers: rows({ text: z.string(), saidFrom: Instant, saidTo: Instant }),
  makerLetters: rows({ maker: z.string(), writeUp: z.string().nullable(), sentAt: Instant }),
  cautionsPlaced: rows({
    writeUp: z.string().nullable(),
    signalWord: z.string(),
    hazard: z.string(),
    consequence: z.string(),
    avoidance: z.string(),
    placedAt: Instant,
    removedAt: When,
  }),
  libraryCautions: rows({
    name: z.string(),
    change: z.string(),
    hazard: z.string(),
    consequence: z.string(),
    avoidance: z.string(),
    why: z.string(),
    changedAt: Instant,
  }),
  /** Limits that the desk set on the account. */
  limits: rows({
    kind: z.string(),
    reason: z.string(),
    from: Instant,
    until: When,
    liftedAt: When,
    liftReason: z.string(),
  }),
  /** What was decided about the account and what its owner wrote, each with its reason. */
  decisions: rows({
    at: Instant,
    action: z.string(),
    about: z.string(),
    name: z.string(),
    reason: z.string(),
  }),
  opinions: rows({ edition: z.string(), agrees: z.boolean(), line: z.string(), at: Instant }),
  watches: rows({ kind: z.string(), name: z.string().nullable(), since: Instant }),
  notices: rows({ title: z.string(), path: z.string(), because: z.string(), at: Instant, readAt: When }),
  /** What they told the desk of, and what came of it. */
  flags: rows({
    about: z.string(),
    ground: z.string(),
    line: z.string(),
    outcome: z.string(),
    createdAt: Instant,
  }),
  handOversOffered: rows({
    to: z.string(),
    state: z.string(),
    offeredAt: Instant,
    endsAt: Instant,
    decidedAt: When,
  }),
  handOversReceived: rows({ state: z.string(), offeredAt: Instant, endsAt: Instant, decidedAt: When }),
  mails: rows({ to: z.string(), subject: z.string(), queuedAt: Instant, sentAt: When }),
  /** Reports of mail servers that a mail did not arrive. */
  mailReturns: rows({ status: z.string(), permanent: z.boolean(), at: Instant }),
});
export type OwnData = z.infer<typeof OwnData>;
export type SectionName = Exclude<keyof OwnData, 'format' | 'version' | 'createdAt'>;

export const exportRoutes = {
  exportOwnData: route({
    method: 'get',
    path: '/api/account/export',
    tag: 'accounts',
    access: signedIn,
    summary: 'A ZIP archive of everything I wrote or keep here, with my photos',
    problems: ['too-many-requests'],
  }),
};
