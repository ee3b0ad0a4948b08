import { createHash, timingSafeEqual } from 'node:crypto';
import type { Request } from 'express';
import { ApiError } from './api-error.js';
import type { ApiKey, KeyStore } from './key-store.js';
import { readTenantToken } from './tenant-token.js';

/** Everything a key can be allowed to do. */
export const actions = [
  '*',
  'search',
  'documents.*',
  'documents.add',
  'documents.get',
  'documents.delete',
  'indexes.*',
  'indexes.create',
  'indexes.get',
  'indexes.update',
  'indexes.delete',
  'indexes.swap',
  'tasks.*',
  'tasks.get',
  'tasks.cancel',
  'tasks.delete',
  'settings.*',
  'settings.get',
  'settings.update',
  'stats.*',
  'stats.get',
  'metrics.*',
  'metrics.get',
  'dumps.*',
  'dumps.create',
  'snapshots.*',
  'snapshots.create',
  'version',
  'keys.create',
  'keys.get',
  'keys.update',
  'keys.delete',
  'experimental.get',
  'experimental.update',
] as const;
export type Action = Exclude<(typeof actions)[number], '*' | `${string}.*`>;

/** What the caller may touch. */
export interface Caller {
  /** Names or patterns (`shop*`) of indexes. */
  readonly indexes: readonly string[];
  /** From a tenant token: filters by index name or pattern; undefined without a token. */
  readonly rules?: ReadonlyMap<string, unknown>;
}

const everything: Caller = { indexes: ['*'] };

const invalidKey = () => new ApiError('invalid_api_key', 'The provided API key is invalid.');

/** Tells who may do what. Without a master key everybody may do everything. */
export class Access {
  constructor(
    private readonly keys: KeyStore,
    private readonly masterKey: string | undefined,
    private readonly clock: () => Date,
  ) {}

  /** The caller, if the action is allowed to them. Throws missing_authorization_header (401) or invalid_api_key (403). */
  caller(request: Request, action: Action): Caller {
    if (this.masterKey === undefined) {
      if (action.startsWith('keys.')) {
        throw new ApiError(
          'missing_master_key',
          'The server is running without a master key. To use this route, start it with SEARCH_MASTER_KEY set.',
        );
      }
      return everything;
    }
    const header = request.headers.authorization;
    if (header === undefined) {
      throw new ApiError(
        'missing_authorization_header',
        'The Authorization header is missing. It must use the bearer authorization method.',
      );
    }
    const [, sent = ''] = /^Bearer\s+(.*)$/is.exec(header) ?? [];
    const token = sent.trim();
    if (isSame(token, this.masterKey)) return everything;
    if (token.split('.').length === 3) return this.tokenCaller(token, action);
    const key = token === '' ? undefined : this.keys.find(token);
    if (!key || !isSame(token, key.key) || !this.allows(key, action)) throw invalidKey();
    return { indexes: key.indexes };
  }

  /** Throws invalid_api_key where the caller has no business with the index. */
  checkIndex(caller: Caller, uid: string): void {
    const { rules } = caller;
    const mayTouch = caller.indexes.some((pattern) => matchesIndex(pattern, uid));
    if (!mayTouch || (rules && ruleFor(rules, uid) === undefined)) throw invalidKey();
  }

  private tokenCaller(token: string, action: Action): Caller {
    const read = readTenantToken(token, (uid) => this.keys.find(uid), this.clock());
    if (!read || action !== 'search' || !this.allows(read.key, 'search')) throw invalidKey();
    return { indexes: read.key.indexes, rules: read.rules };
  }

  private allows(key: ApiKey, action: Action): boolean {
    if (key.expiresAt !== null && Date.parse(key.expiresAt) <= this.clock().getTime()) return false;
    const [family] = action.split('.');
    return key.actions.some((each) => each === '*' || each === action || each === `${family}.*`);
  }
}

/** The filter that a tenant token puts on every search in the index. */
export function tokenFilter(caller: Caller, uid: string): unknown {
  return caller.rules && ruleFor(caller.rules, uid)?.filter;
}

/** The rule for the very name before a pattern, and the longest pattern before shorter ones. */
function ruleFor(rules: ReadonlyMap<string, unknown>, uid: string): { filter: unknown } | undefined {
  if (rules.has(uid)) return { filter: rules.get(uid) };
  const [pattern] = [...rules.keys()]
    .filter((each) => matchesIndex(each, uid))
    .sort((left, right) => right.length - left.length);
  return pattern === undefined ? undefined : { filter: rules.get(pattern) };
}

export function matchesIndex(pattern: string, uid: string): boolean {
  return (
    pattern === '*' || pattern === uid || (pattern.endsWith('*') && uid.startsWith(pattern.slice(0, -1)))
  );
}

function isSame(left: string, right: string): boolean {
  const digest = (text: string) => createHash('sha256').update(text).digest();
  return timingSafeEqual(digest(left), digest(right));
}
