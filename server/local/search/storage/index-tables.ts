import type { Connection } from './connection.js';

/**
 * Every index has its own tables, named by its number, so that renaming and swapping indexes touches one row:
 * `documents_N` as sent; `words_N` the stems per searched attribute (FTS5, without a copy of the text);
 * `facts_N` values for filters, facets and sorting; `lexicon_N` words and in how many documents they stand.
 */
export function createIndexTables(connection: Connection, id: number, columns: number): void {
  connection.exec(`
    CREATE TABLE documents_${id} (num INTEGER PRIMARY KEY, doc_id TEXT NOT NULL UNIQUE, body TEXT NOT NULL);
    CREATE TABLE facts_${id} (
      doc INTEGER NOT NULL, field TEXT NOT NULL, folded TEXT NOT NULL, kind TEXT NOT NULL, shown TEXT, number REAL,
      PRIMARY KEY (doc, field, folded, kind)) WITHOUT ROWID;
    CREATE INDEX facts_text_${id} ON facts_${id} (field, folded, doc);
    CREATE INDEX facts_number_${id} ON facts_${id} (field, number) WHERE number IS NOT NULL;
    CREATE TABLE lexicon_${id} (word TEXT PRIMARY KEY, documents INTEGER NOT NULL) WITHOUT ROWID;
  `);
  createWordTable(connection, id, columns);
}

/** Empties what is derived from documents and makes the word table anew with this many attributes. */
export function clearDerivedTables(connection: Connection, id: number, columns: number): void {
  connection.exec(`DROP TABLE words_${id}; DELETE FROM facts_${id}; DELETE FROM lexicon_${id};`);
  createWordTable(connection, id, columns);
}

export function dropIndexTables(connection: Connection, id: number): void {
  for (const table of ['documents', 'words', 'facts', 'lexicon'])
    connection.exec(`DROP TABLE ${table}_${id}`);
}

function createWordTable(connection: Connection, id: number, columns: number): void {
  const names = Array.from({ length: Math.max(columns, 1) }, (_, column) => `c${column}`);
  connection.exec(`
    CREATE VIRTUAL TABLE words_${id} USING fts5(
      ${names.join(', ')}, content='', contentless_delete=1, prefix='2 3',
      tokenize="unicode61 remove_diacritics 0 tokenchars '.-'")`);
}
