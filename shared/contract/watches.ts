import { z } from 'zod';
import { Id, IdText, Instant, PageQuery, line, pageOf } from './primitives.js';
import { route, signedIn } from './route.js';

/** What can be watched. */
export const WatchSubject = z.enum(['part', 'revision', 'joint', 'write-up', 'question']);
export type WatchSubject = z.infer<typeof WatchSubject>;

/** What one person can watch at most. */
export const mostWatches = 500;

const Watched = z.object({ subject: WatchSubject, id: IdText });

/** What is watched; name and path are null once it is no longer there. */
export const WatchEntry = z.object({
  subject: WatchSubject,
  id: Id,
  name: z.string().nullable(),
  /** Address within the site. */
  path: z.string().nullable(),
  createdAt: Instant,
});
export type WatchEntry = z.infer<typeof WatchEntry>;

export const NoticeReason = z.enum(['watch', 'bench', 'person']);

/** What happened, as one person is told of it. */
export const Notice = z.object({
  id: Id,
  /** What kind of thing happened, such as `edition-published`. */
  kind: z.string(),
  title: z.string(),
  text: z.string(),
  path: z.string(),
  at: Instant,
  read: z.boolean(),
  /** Concerns the safety of something they tried. */
  safety: z.boolean(),
  /** Why they are told: they watch it, have it on their bench, or it concerns them. */
  because: NoticeReason,
  /** What they watch or have; null where it concerns them, and once it is no longer there. */
  about: z.object({ subject: WatchSubject, id: Id, name: z.string(), path: z.string() }).nullable(),
});
export type Notice = z.infer<typeof Notice>;

/**
 * Kinds of which there may be many a day, and what several of one page are called: they never go by mail at once, and
 * are one line in a digest and among the notices.
 */
export const gatheredKinds: ReadonlyMap<string, (count: number) => string> = new Map([
  ['reading-recorded', (count: number) => `${count} new readings`],
  ['trial-reported', (count: number) => `${count} new trials`],
  ['fit-reported', (count: number) => `${count} new reports of whether it fits`],
]);

export const NoticeFilter = z.enum(['part', 'revision', 'joint', 'write-up', 'question', 'bench', 'person']);
export type NoticeFilter = z.infer<typeof NoticeFilter>;

const tag = 'watches';
export const watchRoutes = {
  watch: route({
    method: 'put',
    path: '/api/watches/:subject/:id',
    tag,
    access: signedIn,
    limitedMay: true,
    summary: 'Be told of what changes on a part, revision, joint, write-up or question',
    params: Watched,
  }),
  endWatch: route({
    method: 'delete',
    path: '/api/watches/:subject/:id',
    tag,
    access: signedIn,
    limitedMay: true,
    summary: 'Be told of it no longer; ending what is not watched changes nothing',
    params: Watched,
  }),
  listMyWatches: route({
    method: 'get',
    path: '/api/my/watches',
    tag,
    access: signedIn,
    summary: 'What the caller watches, the newest first',
    query: PageQuery,
    response: pageOf(WatchEntry),
  }),
  listMyWatchKeys: route({
    method: 'get',
    path: '/api/my/watches/keys',
    tag,
    access: signedIn,
    summary: `What the caller watches without names, such as \`part/12\`; at most ${mostWatches}`,
    response: z.object({ keys: z.array(z.string()) }),
  }),
};

export const noticeRoutes = {
  listMyNotices: route({
    method: 'get',
    path: '/api/my/notices',
    tag,
    access: signedIn,
    summary: 'What the caller was told, the newest first',
    query: PageQuery.extend({ unread: z.literal('true').optional(), about: NoticeFilter.optional() }),
    response: pageOf(Notice),
  }),
  countMyNotices: route({
    method: 'get',
    path: '/api/my/notices/count',
    tag,
    access: signedIn,
    summary: 'How many notices are unread; counted up to 100',
    response: z.object({ unread: z.number().int().min(0).max(100) }),
  }),
  markNoticesRead: route({
    method: 'post',
    path: '/api/my/notices/read',
    tag,
    access: signedIn,
    limitedMay: true,
    summary: 'Mark some notices read, or all up to one; `readAt` of the answer takes it back',
    body: z.union([z.strictObject({ ids: z.array(Id).min(1).max(200) }), z.strictObject({ through: Id })]),
    response: z.object({ readAt: Instant }),
  }),
  markNoticesUnread: route({
    method: 'post',
    path: '/api/my/notices/unread',
    tag,
    access: signedIn,
    limitedMay: true,
    summary: 'Take one marking back: what was marked read at that instant is unread again',
    body: z.strictObject({ readAt: Instant }),
  }),
};

/** Subject and identity as they stand in an address: `part/12`. */
export const WatchKey = line(60, 1).regex(
  /^(?:part|revision|joint|write-up|question)\/[1-9]\d{0,15}$/,
  'is not a watch',
);
