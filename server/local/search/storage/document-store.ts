import { setImmediate } from 'node:timers/promises';
import { stem } from '../lexicon/stem.js';
import { wordsOf } from '../lexicon/words.js';
import type { Connection, SqlValue } from './connection.js';
import { covers, keepsFacts } from './attributes.js';
import { flatten, type Document, type PathValue } from './flatten.js';
import { columnsOf, type IndexState } from './index-catalogue.js';
import { clearDerivedTables } from './index-tables.js';

/** Characters of one text that are folded for comparison; longer values compare by their beginning. */
const longestFact = 468;

/** How a value compares in filters and facets: without case and outer spaces. */
export const folded = (text: string): string =>
  text.trim().toLowerCase().normalize('NFC').slice(0, longestFact);

/** Writes documents of one index and all that is derived from them, inside the caller's transaction. */
export class DocumentWriter {
  /** Changes to the number of documents per word, to be applied in memory after the commit. */
  readonly wordChanges = new Map<string, number>();

  constructor(
    private readonly connection: Connection,
    private index: IndexState,
  ) {}

  read(id: string): { num: number; document: Document } | undefined {
    const row = this.connection.first<{ num: number; body: string }>(
      `SELECT num, body FROM documents_${this.index.id} WHERE doc_id = ?`,
      [id],
    );
    return row && { num: row.num, document: JSON.parse(row.body) as Document };
  }

  /** Puts a document in the place of the one with its id, or adds it. */
  put(id: string, document: Document): void {
    const table = `documents_${this.index.id}`;
    const before = this.read(id);
    const body = JSON.stringify(document);
    if (before) {
      this.forget(before.num, before.document);
      this.connection.run(`UPDATE ${table} SET body = ? WHERE num = ?`, [body, before.num]);
      this.derive(before.num, document);
      return;
    }
    const { lastRow } = this.connection.run(`INSERT INTO ${table} (doc_id, body) VALUES (?, ?)`, [id, body]);
    this.derive(lastRow, document);
  }

  /** Takes a document out; answers whether there was one. */
  remove(id: string): boolean {
    const before = this.read(id);
    if (!before) return false;
    this.forget(before.num, before.document);
    this.connection.run(`DELETE FROM documents_${this.index.id} WHERE num = ?`, [before.num]);
    return true;
  }

  /** Takes out all documents; answers how many there were. */
  removeAll(): number {
    const { changes } = this.connection.run(`DELETE FROM documents_${this.index.id}`);
    clearDerivedTables(this.connection, this.index.id, columnsOf(this.index).length);
    return changes;
  }

  /**
   * Derives everything again from the stored documents, under changed settings or fields. Lets other requests in
   * between batches.
   */
  async rebuild(index: IndexState): Promise<void> {
    this.index = index;
    this.wordChanges.clear();
    clearDerivedTables(this.connection, index.id, columnsOf(index).length);
    const batch = 200;
    for (let last = 0; ;) {
      const rows = this.connection.all<{ num: number; body: string }>(
        `SELECT num, body FROM documents_${index.id} WHERE num > ? ORDER BY num LIMIT ${batch}`,
        [last],
      );
      for (const { num, body } of rows) this.derive(num, JSON.parse(body) as Document);
      const end = rows.at(-1);
      if (!end) return;
      last = end.num;
      await setImmediate();
    }
  }

  /** Writes the changed numbers of documents per word; the last thing before the commit. */
  flushWords(): void {
    const table = `lexicon_${this.index.id}`;
    for (const [word, change] of this.wordChanges) {
      if (change === 0) continue;
      this.connection.run(
        `INSERT INTO ${table} VALUES (?, ?) ON CONFLICT (word) DO UPDATE SET documents = documents + excluded.documents`,
        [word, change],
      );
      if (change < 0) this.connection.run(`DELETE FROM ${table} WHERE word = ? AND documents <= 0`, [word]);
    }
  }

  private derive(num: number, document: Document): void {
    const values = flatten(document);
    this.putFacts(num, values);
    const columns = columnsOf(this.index);
    if (columns.length === 0) return;
    const { stems, words } = searchedWords(values, columns);
    const marks = columns.map(() => '?').join(', ');
    const names = columns.map((_, column) => `c${column}`).join(', ');
    this.connection.run(`INSERT INTO words_${this.index.id} (rowid, ${names}) VALUES (?, ${marks})`, [
      num,
      ...stems,
    ]);
    this.count(words, 1);
  }

  private forget(num: number, document: Document): void {
    const { id } = this.index;
    this.connection.run(`DELETE FROM words_${id} WHERE rowid = ?`, [num]);
    this.connection.run(`DELETE FROM facts_${id} WHERE doc = ?`, [num]);
    this.count(searchedWords(flatten(document), columnsOf(this.index)).words, -1);
  }

  private count(words: ReadonlySet<string>, change: number): void {
    for (const word of words) this.wordChanges.set(word, (this.wordChanges.get(word) ?? 0) + change);
  }

  private putFacts(num: number, values: readonly PathValue[]): void {
    const rows: SqlValue[][] = [];
    for (const { path, kind, value } of values) {
      if (!keepsFacts(this.index.settings, path)) continue;
      const shown = value === null ? null : String(value);
      const number = typeof value === 'number' && Number.isFinite(value) ? value : null;
      rows.push([num, path, shown === null ? '' : folded(shown), kind, shown, number]);
    }
    const most = 100;
    for (let at = 0; at < rows.length; at += most) {
      const part = rows.slice(at, at + most);
      const marks = part.map(() => '(?, ?, ?, ?, ?, ?)').join(', ');
      this.connection.run(`INSERT OR IGNORE INTO facts_${this.index.id} VALUES ${marks}`, part.flat());
    }
  }
}

function searchedWords(values: readonly PathValue[], columns: readonly string[]) {
  const stems = columns.map(() => [] as string[]);
  const words = new Set<string>();
  for (const { path, kind, value } of values) {
    if (value === null || kind === 'emptyText') continue;
    const column = columns.findIndex((attribute) => covers(attribute, path));
    if (column < 0) continue;
    for (const { word, parts } of wordsOf(String(value))) {
      for (const form of [word, ...parts]) {
        words.add(form);
        stems[column]?.push(stem(form));
      }
    }
  }
  return { stems: stems.map((list) => list.join(' ')), words };
}
