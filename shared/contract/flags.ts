import { z } from 'zod';
import { DeskSubject, DeskSubjectKind } from './desk-subjects.js';
import { Id, IdText, Instant, ItemKey, line } from './primitives.js';
import { moderators, route, signedIn } from './route.js';
import { DeskReason } from './taken-down.js';
import { PersonRef } from './write-ups.js';

/** Why somebody tells the desk of a thing. */
export const flagGrounds = ['unsafe', 'wrong', 'rude-or-spam', 'private-data', 'copied'] as const;
export const FlagGround = z.enum(flagGrounds);
export type FlagGround = z.infer<typeof FlagGround>;
export const flagGroundWords: Record<FlagGround, string> = {
  unsafe: 'unsafe: somebody or something could be hurt',
  wrong: 'wrong: it says what is not so',
  'rude-or-spam': 'rude, or advertising',
  'private-data': "somebody's private data",
  copied: 'copied without leave',
};

export const TellDesk = z.strictObject({
  kind: DeskSubjectKind,
  /** Of a fix: the write-up it stands in. */
  id: Id,
  /** Of a fix; null for anything else. */
  fixKey: ItemKey.nullable(),
  ground: FlagGround,
  line: line(500, 10),
});
export type TellDesk = z.infer<typeof TellDesk>;

export const FlagOutcome = z.enum(['kept', 'taken-down', 'dealt-with']);
export type FlagOutcome = z.infer<typeof FlagOutcome>;

/** A thing that members told the desk of, with the words of each. */
export const DeskFlag = z.object({
  id: Id,
  state: z.enum(['waiting', ...FlagOutcome.options]),
  since: Instant,
  /** Null where it is no longer there. */
  subject: DeskSubject.nullable(),
  title: z.string(),
  flags: z.array(z.object({ person: PersonRef, ground: FlagGround, line: z.string(), at: Instant })),
  reason: z.string().nullable(),
});
export type DeskFlag = z.infer<typeof DeskFlag>;

const tag = 'desk';
const byId = z.object({ id: IdText });

export const flagRoutes = {
  tellDesk: route({
    method: 'post',
    path: '/api/flags',
    tag,
    access: signedIn,
    status: 201,
    summary:
      'Tell the desk of something that is unsafe, wrong, rude, private or copied; once a person and thing',
    body: TellDesk,
    response: z.object({ told: z.literal(true) }),
    problems: ['already-there', 'too-many-requests'],
  }),
  readDeskFlag: route({
    method: 'get',
    path: '/api/desk/flags/:id',
    tag,
    access: moderators,
    summary: 'Something members told the desk of: the thing, and what each says',
    params: byId,
    response: DeskFlag,
  }),
  settleFlag: route({
    method: 'post',
    path: '/api/desk/flags/:id/settle',
    tag,
    access: moderators,
    summary:
      'Keep it, take it down, or (write-ups and fixes) say how it was dealt with; whoever told the desk hears of it',
    params: byId,
    body: z.strictObject({ outcome: FlagOutcome, reason: DeskReason }),
    problems: ['already-there', 'claimed-by-another'],
  }),
};
