import type { Knex } from 'knex';
import { Id } from '../../shared/contract/primitives.js';
import type { Notice, NoticeFilter } from '../../shared/contract/watches.js';
import { readCursor, toPage } from '../http/pages.js';
import { noticeStore as store, type NoticeRow } from './notice.store.js';
import { namesOf, subjectKey, type SubjectName, type SubjectRef } from './subject-names.store.js';

export type NoticeService = ReturnType<typeof createNoticeService>;

/** What somebody was told, as their page shows it. */
export function createNoticeService({ knex, clock }: { knex: Knex; clock: () => Date }) {
  return {
    /** One page, the newest first. NotValid for a cursor of another list. */
    async list(
      accountId: number,
      query: {
        unread?: 'true' | undefined;
        about?: NoticeFilter | undefined;
        cursor?: string | undefined;
        limit: number;
      },
    ): Promise<{ items: Notice[]; next: string | null }> {
      const rows = await store.newest(knex, {
        accountId,
        beforeId: readCursor(Id, query.cursor),
        unread: query.unread === 'true',
        about: query.about,
        rows: query.limit + 1,
      });
      const page = toPage(rows, query.limit, ({ id }) => id);
      const names = await namesOf(
        knex,
        page.items.flatMap((row) => refOf(row) ?? []),
      );
      return { items: page.items.map((row) => toNotice(row, names)), next: page.next };
    },

    countUnread: (accountId: number): Promise<number> => store.countUnread(knex, accountId),

    /** Marks them read; the instant it gives back names this marking. */
    async markRead(
      accountId: number,
      which: { ids: readonly number[] } | { through: number },
    ): Promise<Date> {
      const readAt = clock();
      await store.markRead(knex, accountId, which, readAt);
      return readAt;
    },

    markUnread: (accountId: number, readAt: Date): Promise<void> => store.markUnread(knex, accountId, readAt),
  };
}

function refOf({ subject, subjectId }: NoticeRow): SubjectRef | null {
  return subject === null || subjectId === null ? null : { subject, id: subjectId };
}

function toNotice(row: NoticeRow, names: ReadonlyMap<string, SubjectName>): Notice {
  const ref = refOf(row);
  const name = ref && names.get(subjectKey(ref));
  return {
    id: row.id,
    kind: row.kind,
    title: row.title,
    text: row.text,
    path: row.path,
    at: row.at.toISOString(),
    read: row.readAt !== null,
    safety: row.safety,
    because: row.because,
    about: ref && name ? { ...ref, ...name } : null,
  };
}
