import { z } from 'zod';
import { Id, IdText, Instant, PageQuery, line, pageOf, passage } from './primitives.js';
import { moderators, route, signedIn } from './route.js';
import { AccountRole } from './vocabulary.js';

/** What the desk can set on an account: limited may read and keep a bench but not post; blocked cannot sign in. */
export const LimitKind = z.enum(['limited', 'blocked']);
export type LimitKind = z.infer<typeof LimitKind>;

/** What holds for an account, as its owner is told. */
export const LimitNotice = z.object({
  kind: LimitKind,
  reason: z.string(),
  from: Instant,
  /** It holds before this instant; null: until it is lifted. */
  until: Instant.nullable(),
});
export type LimitNotice = z.infer<typeof LimitNotice>;

const Person = z.object({ id: Id, displayName: z.string() });

export const MemberLimit = LimitNotice.extend({
  id: Id,
  setBy: Person,
  /** Whether what they wrote was taken down with it. */
  worksGo: z.boolean(),
  lifted: z.object({ at: Instant, by: Person, reason: z.string() }).nullable(),
  /** Whether it holds now: neither lifted nor run out. */
  holds: z.boolean(),
});
export type MemberLimit = z.infer<typeof MemberLimit>;

export const MemberRow = z.object({
  id: Id,
  displayName: z.string(),
  role: AccountRole,
  createdAt: Instant,
  limit: LimitNotice.nullable(),
});
export type MemberRow = z.infer<typeof MemberRow>;

/** What somebody wrote, counted, with the newest write-ups by name. */
export const MemberWorks = z.object({
  writeUps: z.array(
    z.object({ slug: z.string(), title: z.string(), withdrawn: z.boolean(), soleAuthor: z.boolean() }),
  ),
  questions: z.number().int(),
  replies: z.number().int(),
  trials: z.number().int(),
  readings: z.number().int(),
  fitReports: z.number().int(),
  photos: z.number().int(),
});
export type MemberWorks = z.infer<typeof MemberWorks>;

export const MemberPage = MemberRow.omit({ limit: true }).extend({
  /** Only for administrators. */
  email: z.string().nullable(),
  works: MemberWorks,
  /** The newest first. */
  limits: z.array(MemberLimit),
  /** Whether the caller may set a limit: nobody on themself, moderators on members and makers only. */
  mayLimit: z.boolean(),
});
export type MemberPage = z.infer<typeof MemberPage>;

/** Why; the member reads it. */
export const LimitReason = passage(1000, 10);
/** Ten years; whoever is to stay away longer is limited until lifted. */
export const longestTermDays = 3650;

const idParams = z.object({ id: IdText });
const tag = 'members';

export const memberRoutes = {
  readMyLimit: route({
    method: 'get',
    path: '/api/account/limit',
    tag: 'accounts',
    access: signedIn,
    summary: 'What the desk has set on my account, and why',
    response: z.object({ limit: LimitNotice.nullable() }),
  }),
  listMembers: route({
    method: 'get',
    path: '/api/desk/members',
    tag,
    access: moderators,
    summary: 'Members by name, the newest first, without their addresses',
    query: PageQuery.extend({ q: line(100).optional(), limited: z.enum(['true']).optional() }),
    response: pageOf(MemberRow),
  }),
  readMember: route({
    method: 'get',
    path: '/api/desk/members/:id',
    tag,
    access: moderators,
    summary: 'What a member wrote, and what was set on their account',
    params: idParams,
    response: MemberPage,
  }),
  limitMember: route({
    method: 'post',
    path: '/api/desk/members/:id/limits',
    tag,
    access: moderators,
    status: 201,
    summary: 'Limit or block a member for a term, with a reason; what they wrote stays or goes',
    params: idParams,
    body: z.strictObject({
      kind: LimitKind,
      reason: LimitReason,
      /** Days from now; null: until lifted. */
      days: z.number().int().min(1).max(longestTermDays).nullable(),
      works: z.enum(['stay', 'go']),
    }),
    response: MemberPage,
    problems: ['already-there'],
  }),
  liftLimit: route({
    method: 'post',
    path: '/api/desk/limits/:id/lift',
    tag,
    access: moderators,
    summary: 'Lift a limit before its term; what went with it can be put back',
    params: idParams,
    body: z.strictObject({ reason: LimitReason, works: z.enum(['leave', 'put-back']) }),
    response: MemberPage,
  }),
};
