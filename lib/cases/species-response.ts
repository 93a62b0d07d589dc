import type { Db } from '@/lib/database';
import { Kept } from '@/lib/lists/kept';
import { seen, type SeenEntry } from '@/lib/seen/seen';
import { dataVersion, speciesSubject } from '@/lib/versions/versions';
import type { SpeciesResponse } from './schema';
import { seenEntries } from './seen-entries';

/** Kept by species and by the version of what was accepted of it, so that a kept figure is never an old one. */
const entriesKept = new Kept<SeenEntry[]>(60);
const responsesKept = new Kept<SpeciesResponse>(500);

/** Every case of a species: what was seen at so many weeks, and what is expected once there is a model. */
export async function speciesResponse(db: Db, species: string, weeks: number): Promise<SpeciesResponse> {
  const version = await dataVersion(db, [speciesSubject(species)]);
  const key = `${species} ${version} ${weeks}`;
  const kept = responsesKept.get(key);
  if (kept) return kept;
  const { cases, otherCuts } = seen(await entriesOf(db, species, version), weeks);
  return responsesKept.set(key, {
    species,
    weeks,
    cases: cases.map((one) => ({ ...one, expected: null })),
    otherCuts,
  });
}

async function entriesOf(db: Db, species: string, version: string): Promise<SeenEntry[]> {
  const key = `${species} ${version}`;
  return entriesKept.get(key) ?? entriesKept.set(key, await seenEntries(db, species));
}
