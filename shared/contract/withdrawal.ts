import { z } from 'zod';
import { Id, Instant, Slug, passage } from './primitives.js';
import { moderators, route } from './route.js';

/** Why a write-up is withdrawn or put back; its authors read it, and with a withdrawal so does everybody. */
export const WithdrawalReason = passage(1000, 10);

/** What stands at the address of a write-up that the desk has withdrawn. */
export const WithdrawalNotice = z.object({
  title: z.string(),
  reason: z.string(),
  at: Instant,
  /** Who did it, by role only. */
  by: z.literal('the desk'),
  /** Where to go instead. */
  instead: z.object({ slug: Slug, title: z.string() }).nullable(),
  /** Whether the caller may read its editions: authors and moderators may. */
  mayReadHistory: z.boolean(),
});
export type WithdrawalNotice = z.infer<typeof WithdrawalNotice>;

/** A write-up as the desk has it, whether it is published or withdrawn. */
export const DeskWriteUp = z.object({
  id: Id,
  slug: Slug,
  title: z.string(),
  authors: z.array(z.object({ id: Id, displayName: z.string() })),
  editionCount: z.number().int(),
  firstPublishedAt: Instant,
  withdrawal: WithdrawalNotice.nullable(),
});
export type DeskWriteUp = z.infer<typeof DeskWriteUp>;

const slugParams = z.object({ slug: Slug });
const tag = 'desk';

export const withdrawalRoutes = {
  readDeskWriteUp: route({
    method: 'get',
    path: '/api/desk/write-ups/:slug',
    tag,
    access: moderators,
    summary: 'A write-up that is or was published, with its withdrawal',
    params: slugParams,
    response: DeskWriteUp,
  }),
  withdrawWriteUp: route({
    method: 'post',
    path: '/api/desk/write-ups/:slug/withdraw',
    tag,
    access: moderators,
    summary:
      'Withdraw a published write-up: its address answers 410 with the reason and where to go instead; text, history, trials and benches are kept',
    params: slugParams,
    body: z.strictObject({
      reason: WithdrawalReason,
      /** Slug of a published write-up to go to instead. */
      instead: Slug.nullable(),
    }),
    response: DeskWriteUp,
    problems: ['edition-state'],
  }),
  putBackWriteUp: route({
    method: 'post',
    path: '/api/desk/write-ups/:slug/put-back',
    tag,
    access: moderators,
    summary:
      'Put a withdrawn write-up back, with the edition that was published; refused while a hazard has no caution',
    params: slugParams,
    body: z.strictObject({ reason: WithdrawalReason }),
    response: DeskWriteUp,
    problems: ['edition-state', 'caution-missing'],
  }),
};
