import { join } from 'node:path';
import { Lexicon } from '../lexicon/lexicon.js';
import { defaultSettings, type IndexSettings } from '../settings/settings.js';
import { searchedAttributes } from './attributes.js';
import { Connection } from './connection.js';
import { createIndexTables, dropIndexTables } from './index-tables.js';

/** An index as the last committed change left it. */
export interface IndexState {
  readonly id: number;
  readonly uid: string;
  readonly primaryKey: string | null;
  readonly settings: IndexSettings;
  /** Top-level fields met in documents, in the order met. */
  readonly fields: readonly string[];
  readonly createdAt: string;
  readonly updatedAt: string;
}

interface IndexRow {
  id: number;
  uid: string;
  primary_key: string | null;
  settings: string;
  fields: string;
  created_at: string;
  updated_at: string;
}

/** The file of all indexes: one connection that writes, one that reads what is committed. */
export class IndexCatalogue {
  readonly writer: Connection;
  readonly reader: Connection;
  private readonly lexicons = new Map<number, Lexicon>();

  constructor(dataDir: string) {
    const path = join(dataDir, 'indexes.db');
    this.writer = new Connection(path);
    this.writer.exec(`
      CREATE TABLE IF NOT EXISTS indexes (
        id INTEGER PRIMARY KEY, uid TEXT NOT NULL UNIQUE, primary_key TEXT, settings TEXT NOT NULL,
        fields TEXT NOT NULL, created_at TEXT NOT NULL, updated_at TEXT NOT NULL);
      CREATE TABLE IF NOT EXISTS outcomes (task INTEGER PRIMARY KEY, outcome TEXT NOT NULL);
    `);
    this.reader = new Connection(path);
    this.reader.exec(`
      CREATE TEMP TABLE hits (doc INTEGER PRIMARY KEY, bucket REAL, score REAL);
      CREATE TEMP TABLE gathered (index_id INTEGER, doc INTEGER, PRIMARY KEY (index_id, doc)) WITHOUT ROWID;
    `);
  }

  find(uid: string, connection = this.reader): IndexState | undefined {
    const row = connection.first<IndexRow>('SELECT * FROM indexes WHERE uid = ?', [uid]);
    return row && stateOf(row);
  }

  list(): IndexState[] {
    return this.reader.all<IndexRow>('SELECT * FROM indexes ORDER BY uid').map(stateOf);
  }

  /** Makes an index; inside the writer's transaction, as all that follows. */
  create(uid: string, primaryKey: string | null, now: string): IndexState {
    const { lastRow } = this.writer.run(
      `INSERT INTO indexes (id, uid, primary_key, settings, fields, created_at, updated_at)
       VALUES ((SELECT coalesce(max(id), 0) + 1 FROM indexes), ?, ?, ?, '[]', ?, ?)`,
      [uid, primaryKey, JSON.stringify(defaultSettings), now, now],
    );
    createIndexTables(this.writer, lastRow, 1);
    this.lexicons.delete(lastRow);
    const made = this.find(uid, this.writer);
    if (!made) throw new Error(`Index ${uid} was not made`);
    return made;
  }

  save(index: IndexState): void {
    this.writer.run(
      'UPDATE indexes SET uid = ?, primary_key = ?, settings = ?, fields = ?, updated_at = ? WHERE id = ?',
      [
        index.uid,
        index.primaryKey,
        JSON.stringify(index.settings),
        JSON.stringify(index.fields),
        index.updatedAt,
        index.id,
      ],
    );
  }

  drop(index: IndexState): void {
    dropIndexTables(this.writer, index.id);
    this.writer.run('DELETE FROM indexes WHERE id = ?', [index.id]);
  }

  /** Exchanges the names of two indexes: all else stays where it is. */
  swap(left: IndexState, right: IndexState): void {
    this.writer.run('UPDATE indexes SET uid = ? WHERE id = ?', ['\u0001', left.id]);
    this.writer.run('UPDATE indexes SET uid = ? WHERE id = ?', [left.uid, right.id]);
    this.writer.run('UPDATE indexes SET uid = ? WHERE id = ?', [right.uid, left.id]);
  }

  /** The words of an index, read from the file at first use and kept in memory. */
  lexicon(index: IndexState): Lexicon {
    const kept = this.lexicons.get(index.id);
    if (kept) return kept;
    const lexicon = new Lexicon();
    const rows = this.reader.all<{ word: string; documents: number }>(`SELECT * FROM lexicon_${index.id}`);
    for (const { word, documents } of rows) lexicon.adjust(word, documents);
    this.lexicons.set(index.id, lexicon);
    return lexicon;
  }

  /** Brings the words in memory up to a committed change. */
  adjustLexicon(id: number, changes: ReadonlyMap<string, number>): void {
    const lexicon = this.lexicons.get(id);
    if (lexicon) for (const [word, change] of changes) lexicon.adjust(word, change);
  }

  /** Lets the words in memory go; they are read again at the next search. */
  forgetLexicon(id: number): void {
    this.lexicons.delete(id);
  }

  close(): void {
    this.reader.close();
    this.writer.close();
  }
}

/** Attributes searched in an index, most important first. */
export const columnsOf = (index: IndexState): readonly string[] =>
  searchedAttributes(index.settings, index.fields);

function stateOf(row: IndexRow): IndexState {
  return {
    id: row.id,
    uid: row.uid,
    primaryKey: row.primary_key,
    settings: { ...defaultSettings, ...(JSON.parse(row.settings) as IndexSettings) },
    fields: JSON.parse(row.fields) as string[],
    createdAt: row.created_at,
    updatedAt: row.updated_at,
  };
}
