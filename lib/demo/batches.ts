import type { Db } from '@/lib/database';

const ROWS_AT_ONCE = 1000;

/** Inserts rows in batches. */
export async function put(db: Db, table: string, rows: readonly object[]): Promise<void> {
  for (const some of chunks(rows)) await db(table).insert(some);
}

export function chunks<T>(items: readonly T[]): T[][] {
  const number = Math.ceil(items.length / ROWS_AT_ONCE);
  return Array.from({ length: number }, (_, index) =>
    items.slice(index * ROWS_AT_ONCE, (index + 1) * ROWS_AT_ONCE),
  );
}
