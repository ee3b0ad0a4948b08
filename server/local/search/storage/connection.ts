import Database from 'libsql';

export type SqlValue = string | number | null;

type Statement = ReturnType<InstanceType<typeof Database>['prepare']>;

/** Beyond this many kept statements all are let go: filters and queries make new texts without end. */
const keptStatements = 400;

/** One connection to one SQLite file. All calls are synchronous. */
export class Connection {
  private readonly database: InstanceType<typeof Database>;
  private readonly statements = new Map<string, Statement>();

  /** Opens or makes the file. A commit has reached the disk when it returns (WAL, synchronous=FULL). */
  constructor(path: string) {
    this.database = new Database(path);
    for (const pragma of ['journal_mode=WAL', 'synchronous=FULL', 'busy_timeout=5000', 'temp_store=MEMORY']) {
      this.database.prepare(`PRAGMA ${pragma}`).all([]);
    }
  }

  all<Row>(sql: string, values: readonly SqlValue[] = []): Row[] {
    return this.prepared(sql).all(values.map(bindable)) as Row[];
  }

  first<Row>(sql: string, values: readonly SqlValue[] = []): Row | undefined {
    return this.all<Row>(sql, values)[0];
  }

  /** Runs a statement that returns no rows; answers how many rows it changed and the last row number. */
  run(sql: string, values: readonly SqlValue[] = []): { changes: number; lastRow: number } {
    const result = this.prepared(sql).run(values.map(bindable));
    return { changes: result.changes, lastRow: Number(result.lastInsertRowid) };
  }

  exec(sql: string): void {
    this.database.exec(sql);
  }

  transaction<Result>(work: () => Result): Result {
    this.exec('BEGIN IMMEDIATE');
    try {
      const result = work();
      this.exec('COMMIT');
      return result;
    } catch (error) {
      this.rollback();
      throw error;
    }
  }

  /** As transaction, for work that lets other requests in between; nothing else may write meanwhile. */
  async longTransaction<Result>(work: () => Promise<Result>): Promise<Result> {
    this.exec('BEGIN IMMEDIATE');
    try {
      const result = await work();
      this.exec('COMMIT');
      return result;
    } catch (error) {
      this.rollback();
      throw error;
    }
  }

  close(): void {
    this.statements.clear();
    this.database.close();
  }

  private rollback(): void {
    if (this.database.inTransaction) this.exec('ROLLBACK');
    this.statements.clear();
  }

  private prepared(sql: string): Statement {
    const kept = this.statements.get(sql);
    if (kept) return kept;
    if (this.statements.size >= keptStatements) this.statements.clear();
    const statement = this.database.prepare(sql);
    this.statements.set(sql, statement);
    return statement;
  }
}

/** The driver cuts texts at U+0000; such a text is stored and compared with U+FFFD in its place. */
function bindable(value: SqlValue): SqlValue {
  return typeof value === 'string' && value.includes('\0') ? value.replaceAll('\0', '\uFFFD') : value;
}
