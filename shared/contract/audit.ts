import { z } from 'zod';
import { Day, Id, IdText, Instant, PageQuery, line, pageOf } from './primitives.js';
import { administrators, moderators, route } from './route.js';

/** One entry of the audit log, readable as it is. Entries are only ever added. */
export const AuditLine = z.object({
  id: Id,
  at: Instant,
  /** Null: the site itself. */
  actor: z.object({ id: Id, displayName: z.string() }).nullable(),
  /** What was done, as a name: `edition-published`. */
  action: z.string(),
  subject: z.object({ kind: z.string(), id: Id, name: z.string() }),
  reason: z.string(),
  /** What the action changed, each in words: "from: member". */
  details: z.array(z.string()),
});
export type AuditLine = z.infer<typeof AuditLine>;

const Name = z.string().regex(/^[a-z-]{1,60}$/, 'takes lower-case letters and hyphens');

const filter = {
  /** Words in the name of who did it. */
  who: line(60).optional(),
  action: Name.optional(),
  kind: Name.optional(),
  /** Words in the name of the thing or in the reason. */
  words: line(100).optional(),
  /** First and last day, in UTC. */
  from: Day.optional(),
  to: Day.optional(),
};
export const AuditFilter = z.strictObject(filter);
export type AuditFilter = z.infer<typeof AuditFilter>;

export const AuditExportForm = z.enum(['csv', 'jsonl']);

const tag = 'administration';

export const auditRoutes = {
  listAudit: route({
    method: 'get',
    path: '/api/admin/audit',
    tag,
    access: administrators,
    summary: 'The audit log, the newest first',
    query: PageQuery.extend(filter),
    response: pageOf(AuditLine),
  }),
  listAuditNames: route({
    method: 'get',
    path: '/api/admin/audit/names',
    tag,
    access: administrators,
    summary: 'The actions and the kinds of things that the log has entries of',
    response: z.object({ actions: z.array(z.string()), kinds: z.array(z.string()) }),
  }),
  exportAudit: route({
    method: 'get',
    path: '/api/admin/audit/export',
    tag,
    access: administrators,
    summary: 'The filtered log as a file, the oldest first: CSV (RFC 4180) or JSON Lines',
    query: AuditFilter.extend({ form: AuditExportForm }),
    response: z.string(),
  }),
  readSubjectAudit: route({
    method: 'get',
    path: '/api/desk/audit/:kind/:id',
    tag: 'desk',
    access: moderators,
    summary: 'The newest hundred entries on one thing; on a write-up, those on its editions and cautions too',
    params: z.object({ kind: Name, id: IdText }),
    response: z.object({ items: z.array(AuditLine) }),
  }),
};
