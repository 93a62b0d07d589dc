import type { Db } from '@/lib/database';

/**
 * What is kept in memory is kept by the version of what it was made of. The versions stand in the database and rise in the
 * transaction that changes something, so that a kept answer is never an old one, in whichever process it is kept.
 */
export const ACCEPTED = 'accepted';
export const NAMES = 'names';
export const speciesSubject = (slug: string): string => `species:${slug}`;

/** The versions of these subjects as one text; `0` for one that has never changed. */
export async function dataVersion(db: Db, subjects: readonly string[]): Promise<string> {
  const rows = await db('data_versions')
    .whereIn('subject', [...subjects])
    .select<{ subject: string; version: number | string }[]>('subject', 'version');
  const versions = new Map(rows.map(({ subject, version }) => [subject, String(version)]));
  return subjects.map((subject) => versions.get(subject) ?? '0').join('.');
}

/** Raises the versions of these subjects. Call it in the transaction of the change. */
export async function raiseVersions(db: Db, subjects: readonly string[]): Promise<void> {
  // One order everywhere, so that two changes never lock each other out.
  for (const subject of [...new Set(subjects)].sort()) {
    await db.raw(
      'INSERT INTO data_versions (subject, version) VALUES (?, 1) ON DUPLICATE KEY UPDATE version = version + 1',
      [subject],
    );
  }
}
