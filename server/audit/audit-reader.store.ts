import type { Knex } from 'knex';
import type { AuditFilter, AuditLine } from '../../shared/contract/audit.js';
import { detailWords } from '../../shared/text/audit-words.js';
import { fromJson } from '../rows.js';

interface Row {
  id: number;
  at: Date;
  action: string;
  subjectKind: string;
  subjectId: number;
  subjectName: string;
  reason: string;
  details: unknown;
  actorId: number | null;
  actorName: string | null;
}

const dayMs = 24 * 60 * 60 * 1000;
const mostOnOneThing = 100;

export type AuditReaderStore = ReturnType<typeof createAuditReaderStore>;

/** Reads the audit log; page by page, so that no answer holds more of it than a page. */
export function createAuditReaderStore(knex: Knex) {
  const lines = () =>
    knex('audit_log as l')
      .leftJoin('accounts as a', 'a.id', 'l.actor_id')
      .select('l.id', 'l.at', 'l.action', 'l.reason', 'l.details', {
        subjectKind: 'l.subject_kind',
        subjectId: 'l.subject_id',
        subjectName: 'l.subject_name',
        actorId: 'a.id',
        actorName: 'a.display_name',
      });

  return {
    /** The newest first, those before `beforeId` only. */
    async newestFirst(filter: AuditFilter, beforeId: number | undefined, rows: number): Promise<AuditLine[]> {
      const query = narrowed(lines(), filter).orderBy('l.id', 'desc').limit(rows);
      if (beforeId !== undefined) void query.where('l.id', '<', beforeId);
      return ((await query) as Row[]).map(toLine);
    },

    /** The oldest first, those after `afterId` only. */
    async oldestFirst(filter: AuditFilter, afterId: number, rows: number): Promise<AuditLine[]> {
      const query = narrowed(lines(), filter).where('l.id', '>', afterId).orderBy('l.id').limit(rows);
      return ((await query) as Row[]).map(toLine);
    },

    async names(): Promise<{ actions: string[]; kinds: string[] }> {
      const [actions, kinds] = await Promise.all([
        knex('audit_log').distinct().orderBy('action').pluck('action') as Promise<string[]>,
        knex('audit_log').distinct().orderBy('subject_kind').pluck('subject_kind') as Promise<string[]>,
      ]);
      return { actions, kinds };
    },

    /** Entries on one thing, the newest first; on a write-up, those on its editions and its cautions too. */
    async onSubject(kind: string, id: number): Promise<AuditLine[]> {
      const query = lines().orderBy('l.id', 'desc').limit(mostOnOneThing);
      void query.where((either) => {
        void either.where({ 'l.subject_kind': kind, 'l.subject_id': id });
        if (kind !== 'write-up') return;
        const ofWriteUp = (table: string) => knex(table).where('write_up_id', id).select('id');
        void either
          .orWhere((of) =>
            of.where('l.subject_kind', 'edition').whereIn('l.subject_id', ofWriteUp('editions')),
          )
          .orWhere((of) =>
            of.where('l.subject_kind', 'caution').whereIn('l.subject_id', ofWriteUp('cautions')),
          );
      });
      return ((await query) as Row[]).map(toLine);
    },
  };
}

function narrowed(query: Knex.QueryBuilder, filter: AuditFilter): Knex.QueryBuilder {
  const { who, action, kind, words, from, to } = filter;
  if (who) void query.where('a.display_name', 'like', patternOf(who));
  if (action) void query.where('l.action', action);
  if (kind) void query.where('l.subject_kind', kind);
  if (words) {
    void query.where((either) =>
      either.where('l.subject_name', 'like', patternOf(words)).orWhere('l.reason', 'like', patternOf(words)),
    );
  }
  if (from) void query.where('l.at', '>=', new Date(from));
  // The last day is meant whole.
  if (to) void query.where('l.at', '<', new Date(Date.parse(to) + dayMs));
  return query;
}

function patternOf(words: string): string {
  return `%${words.replace(/[\\%_]/g, '\\$&')}%`;
}

function toLine(row: Row): AuditLine {
  return {
    id: row.id,
    at: row.at.toISOString(),
    actor: row.actorId === null ? null : { id: row.actorId, displayName: row.actorName ?? '' },
    action: row.action,
    subject: { kind: row.subjectKind, id: row.subjectId, name: row.subjectName },
    reason: row.reason,
    details: detailWords(row.details === null ? null : fromJson(row.details)),
  };
}
