/** Rows by a key, in the order in which they came. */
export function groupBy<Row, Key>(rows: readonly Row[], keyOf: (row: Row) => Key): Map<Key, Row[]> {
  const groups = new Map<Key, Row[]>();
  for (const row of rows) {
    const key = keyOf(row);
    const group = groups.get(key);
    if (group) group.push(row);
    else groups.set(key, [row]);
  }
  return groups;
}

/** Value of a JSON column: MariaDB stores JSON as text, and the driver hands it over as such or parsed. */
export function fromJson<T>(value: unknown): T {
  return (typeof value === 'string' ? JSON.parse(value) : value) as T;
}

/** Whether the database refused a row because a unique key has it already. */
export function isDuplicate(error: unknown): boolean {
  return (error as { code?: unknown }).code === 'ER_DUP_ENTRY';
}
