import { z } from 'zod';

/** Database identity: a positive integer that fits JavaScript's exact range. */
export const Id = z.number().int().positive().max(Number.MAX_SAFE_INTEGER);

/** The same identity as it stands in a path or a query string. */
export const IdText = z.coerce
  .number()
  .int('is a whole number')
  .positive('is a positive number')
  .max(Number.MAX_SAFE_INTEGER);

/** Identity of a fix, reading, step or callout across editions; made by the editor. */
export const ItemKey = z
  .string()
  .regex(/^[a-z0-9-]{8,36}$/, 'takes 8 to 36 lower-case letters, digits and hyphens');

/** Lower-case words joined by hyphens, as they stand in addresses. */
export const Slug = z
  .string()
  .min(1)
  .max(120)
  .regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/, 'takes lower-case letters, digits and single hyphens');

/** An instant as ISO 8601 in UTC. */
export const Instant = z.iso.datetime();

/** A calendar day, ISO 8601. */
export const Day = z.iso.date();

/** One line of plain text: no control characters, white space at the ends removed. */
export const line = (max: number, min = 0) =>
  z
    .string()
    .trim()
    .min(min, min === 1 ? 'is needed' : `takes at least ${min} characters`)
    .max(max, `takes at most ${max} characters`)
    .regex(/^[^\p{Cc}]*$/u, 'takes one line without control characters');

/** Text of several lines (Markdown where said); tabs and line ends are the only control characters. */
export const passage = (max: number, min = 0) =>
  z
    .string()
    .min(min, min === 1 ? 'is needed' : `takes at least ${min} characters`)
    .max(max, `takes at most ${max} characters`)
    .regex(/^(?:[^\p{Cc}]|[\t\n\r])*$/u, 'takes no control characters but tabs and line ends');

/** Opaque place in a list; comes from the `next` of the page before. */
export const Cursor = z.string().min(1).max(400);

/** Query of every list: keyset pages of at most 100. */
export const PageQuery = z.strictObject({
  cursor: Cursor.optional(),
  limit: z.coerce.number().int().min(1).max(100).default(20),
});

/** A page of a list; `next` is null on the last one. */
export const pageOf = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), next: z.string().nullable() });

export const Empty = z.null();
