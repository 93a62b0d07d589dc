import type { Db } from '@/lib/database';
import { ACCEPTED, raiseVersions, speciesSubject } from '@/lib/versions/versions';

/** Takes note that what everyone sees of these species has changed. */
export async function raiseAccepted(db: Db, species: readonly (string | null)[]): Promise<void> {
  await raiseVersions(db, [
    ACCEPTED,
    ...species.flatMap((slug) => (slug === null ? [] : [speciesSubject(slug)])),
  ]);
}
