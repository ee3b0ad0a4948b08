import { createHmac, timingSafeEqual } from 'node:crypto';
import { z } from 'zod';
import type { ApiKey } from './key-store.js';

const Rule = z.union([z.null(), z.object({ filter: z.unknown().optional() })]);
const Claims = z.object({
  apiKeyUid: z.string(),
  exp: z.number().nullable().optional(),
  searchRules: z.union([z.array(z.string()), z.record(z.string(), Rule)]),
});

const hashes: Readonly<Record<string, string>> = { HS256: 'sha256', HS384: 'sha384', HS512: 'sha512' };

export interface TenantToken {
  readonly key: ApiKey;
  /** Index names or patterns with the filter that every search there gets. */
  readonly rules: ReadonlyMap<string, unknown>;
}

/**
 * Reads a tenant token: a JWT signed with a key's text. Answers undefined unless the signature is right, the
 * key is known and the token has not run out.
 */
export function readTenantToken(
  token: string,
  findKey: (uid: string) => ApiKey | undefined,
  now: Date,
): TenantToken | undefined {
  const [head = '', body = '', signature = '', ...more] = token.split('.');
  if (more.length > 0) return undefined;
  const header = z.object({ alg: z.string() }).safeParse(decoded(head));
  const claims = Claims.safeParse(decoded(body));
  const hash = header.success ? hashes[header.data.alg] : undefined;
  if (!claims.success || hash === undefined) return undefined;
  const { apiKeyUid, exp, searchRules } = claims.data;
  const key = findKey(apiKeyUid);
  if (key?.uid !== apiKeyUid) return undefined;
  const expected = createHmac(hash, key.key).update(`${head}.${body}`).digest();
  const given = Buffer.from(signature, 'base64url');
  if (given.length !== expected.length || !timingSafeEqual(given, expected)) return undefined;
  if (typeof exp === 'number' && exp * 1000 <= now.getTime()) return undefined;
  const rules = Array.isArray(searchRules)
    ? searchRules.map((name) => [name, undefined] as const)
    : Object.entries(searchRules).map(([name, rule]) => [name, rule?.filter] as const);
  return { key, rules: new Map(rules) };
}

function decoded(part: string): unknown {
  try {
    return JSON.parse(Buffer.from(part, 'base64url').toString('utf8'));
  } catch {
    return undefined;
  }
}
