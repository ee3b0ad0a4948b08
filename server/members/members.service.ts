import type { Knex } from 'knex';
import { z } from 'zod';
import type { LimitNotice, MemberPage, MemberRow } from '../../shared/contract/members.js';
import { Id } from '../../shared/contract/primitives.js';
import type { AccountRole } from '../../shared/contract/vocabulary.js';
import type { MemberCaller } from '../http/caller.js';
import { readCursor, toPage } from '../http/pages.js';
import { NotFound } from '../http/problems.js';
import { memberLimitStore as limits, type HoldingLimit } from './member-limit.store.js';
import { memberStore as members } from './member.store.js';

const ListKey = z.tuple([Id]);

export type MemberReader = ReturnType<typeof createMemberReader>;

/** What the desk reads of members: names, works and limits; addresses are for administrators. */
export function createMemberReader({ knex, clock }: { knex: Knex; clock: () => Date }) {
  return {
    /** What holds for an account now; null where nothing does. */
    async readMyLimit(accountId: number): Promise<LimitNotice | null> {
      const limit = await limits.holdingOf(knex, accountId, clock());
      return limit ? noticeOf(limit) : null;
    },

    async listMembers(query: {
      q?: string | undefined;
      limited?: 'true' | undefined;
      cursor?: string | undefined;
      limit: number;
    }): Promise<{ items: MemberRow[]; next: string | null }> {
      const [beforeId] = readCursor(ListKey, query.cursor) ?? [];
      const rows = await members.newestFirst(knex, {
        words: query.q,
        limitedOnly: query.limited === 'true',
        beforeId,
        rows: query.limit + 1,
        now: clock(),
      });
      const page = toPage(rows, query.limit, (row) => [row.id]);
      return {
        items: page.items.map(({ id, displayName, role, createdAt, limit }) => ({
          id,
          displayName,
          role,
          createdAt: createdAt.toISOString(),
          limit: limit && noticeOf(limit),
        })),
        next: page.next,
      };
    },

    async readMember(caller: MemberCaller, id: number): Promise<MemberPage> {
      const member = await members.byId(knex, id);
      if (!member) throw noSuchMember();
      const [works, history] = await Promise.all([
        members.worksOf(knex, id),
        limits.historyOf(knex, id, clock()),
      ]);
      return {
        id,
        displayName: member.displayName,
        role: member.role,
        createdAt: member.createdAt.toISOString(),
        email: caller.role === 'administrator' ? member.email : null,
        works,
        limits: history,
        mayLimit: mayLimit(caller, member),
      };
    },
  };
}

/** Nobody limits themself; moderators limit members and makers, administrators everybody else. */
export function mayLimit(caller: MemberCaller, member: { id: number; role: AccountRole }): boolean {
  if (caller.accountId === member.id) return false;
  return caller.role === 'administrator' || member.role === 'member' || member.role === 'maker';
}

export function noticeOf({ kind, reason, from, until }: HoldingLimit): LimitNotice {
  return { kind, reason, from: from.toISOString(), until: until?.toISOString() ?? null };
}

export function noSuchMember(): NotFound {
  return new NotFound('There is no such member.', 'Look them up in the list of members.');
}
