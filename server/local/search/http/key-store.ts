import { createHmac, randomUUID } from 'node:crypto';
import type { Connection } from '../storage/connection.js';
import { ApiError } from './api-error.js';

export interface ApiKey {
  readonly uid: string;
  readonly name: string | null;
  readonly description: string | null;
  readonly key: string;
  readonly actions: readonly string[];
  readonly indexes: readonly string[];
  readonly expiresAt: string | null;
  readonly createdAt: string;
  readonly updatedAt: string;
}

interface KeyRow {
  uid: string;
  name: string | null;
  description: string | null;
  actions: string;
  indexes: string;
  expires_at: string | null;
  created_at: string;
  updated_at: string;
}

export type NewKey = Pick<ApiKey, 'name' | 'description' | 'actions' | 'indexes' | 'expiresAt'> & {
  readonly uid?: string;
};

/** Keys. What a caller sends is never stored: it is derived from the key's uid and the master key. */
export class KeyStore {
  constructor(
    private readonly connection: Connection,
    private readonly masterKey: string | undefined,
    private readonly clock: () => Date,
  ) {
    connection.exec(`
      CREATE TABLE IF NOT EXISTS keys (
        uid TEXT PRIMARY KEY, name TEXT, description TEXT, actions TEXT NOT NULL, indexes TEXT NOT NULL,
        expires_at TEXT, created_at TEXT NOT NULL, updated_at TEXT NOT NULL);
      CREATE TABLE IF NOT EXISTS key_set_up (done INTEGER PRIMARY KEY);
    `);
    if (masterKey !== undefined) this.makeDefaultKeys(masterKey);
  }

  list(offset: number, limit: number): { results: ApiKey[]; total: number } {
    const rows = this.connection.all<KeyRow>(
      'SELECT * FROM keys ORDER BY created_at DESC, name LIMIT ? OFFSET ?',
      [limit, offset],
    );
    const total = this.connection.first<{ n: number }>('SELECT count(*) AS n FROM keys')?.n ?? 0;
    return { results: rows.map((row) => this.keyOf(row)), total };
  }

  /** The key by its uid or by what callers send. */
  find(uidOrKey: string): ApiKey | undefined {
    const row = this.connection.first<KeyRow>('SELECT * FROM keys WHERE uid = ?', [uidOrKey]);
    if (row) return this.keyOf(row);
    return this.connection
      .all<KeyRow>('SELECT * FROM keys')
      .map((each) => this.keyOf(each))
      .find(({ key }) => key === uidOrKey);
  }

  add(key: NewKey): ApiKey {
    const uid = key.uid ?? randomUUID();
    if (this.find(uid))
      throw new ApiError(
        'api_key_already_exists',
        `\`uid\` field value \`${uid}\` is already an existing API key.`,
      );
    const now = this.clock().toISOString();
    this.connection.run('INSERT INTO keys VALUES (?, ?, ?, ?, ?, ?, ?, ?)', [
      uid,
      key.name,
      key.description,
      JSON.stringify(key.actions),
      JSON.stringify(key.indexes),
      key.expiresAt,
      now,
      now,
    ]);
    const added = this.find(uid);
    if (!added) throw new Error(`Key ${uid} was not kept`);
    return added;
  }

  rename(uid: string, change: { readonly name?: string | null; readonly description?: string | null }): void {
    const now = this.clock().toISOString();
    if (change.name !== undefined)
      this.connection.run('UPDATE keys SET name = ? WHERE uid = ?', [change.name, uid]);
    if (change.description !== undefined) {
      this.connection.run('UPDATE keys SET description = ? WHERE uid = ?', [change.description, uid]);
    }
    this.connection.run('UPDATE keys SET updated_at = ? WHERE uid = ?', [now, uid]);
  }

  remove(uid: string): void {
    this.connection.run('DELETE FROM keys WHERE uid = ?', [uid]);
  }

  private makeDefaultKeys(masterKey: string): void {
    if (this.connection.first('SELECT done FROM key_set_up')) return;
    const common = { indexes: ['*'], expiresAt: null };
    this.add({
      ...common,
      uid: derivedUid(masterKey, 'search'),
      name: 'Default Search API Key',
      description: 'Use it to search from the frontend',
      actions: ['search'],
    });
    this.add({
      ...common,
      uid: derivedUid(masterKey, 'admin'),
      name: 'Default Admin API Key',
      description:
        'Use it for anything that is not a search operation. Caution! Do not expose it on a public frontend',
      actions: ['*'],
    });
    this.connection.run('INSERT INTO key_set_up VALUES (1)');
  }

  private keyOf(row: KeyRow): ApiKey {
    return {
      uid: row.uid,
      name: row.name,
      description: row.description,
      key: createHmac('sha256', this.masterKey ?? '')
        .update(row.uid)
        .digest('hex'),
      actions: JSON.parse(row.actions) as string[],
      indexes: JSON.parse(row.indexes) as string[],
      expiresAt: row.expires_at,
      createdAt: row.created_at,
      updatedAt: row.updated_at,
    };
  }
}

/** A uid in the form of a UUID version 4 that the same master key always gives. */
function derivedUid(masterKey: string, name: string): string {
  const hex = createHmac('sha256', masterKey).update(`default ${name} key`).digest('hex');
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-4${hex.slice(13, 16)}-a${hex.slice(17, 20)}-${hex.slice(20, 32)}`;
}
