import type { Db } from '@/lib/database';
import { allSpecies } from './catalogue';
import { generalCautions } from './cautions';

/**
 * Brings the table of species, which records point to, in step with the catalogue. Gives a warning, in
 * words, for each species that the table still holds and the catalogue no longer does.
 * @throws Error naming file, line and field where a file of the catalogue or of the cautions is wrong
 */
export async function syncSpecies(db: Db): Promise<string[]> {
  generalCautions(); // read here, so that a slip in their file stops the start and not a page
  const rows = allSpecies().map(({ slug, scientific, genus, wood }) => ({ slug, scientific, genus, wood }));
  await db('species').insert(rows).onConflict('slug').merge();
  const gone = await db('species')
    .whereNotIn(
      'slug',
      rows.map(({ slug }) => slug),
    )
    .select<{ slug: string }[]>('slug');
  return gone.map(({ slug }) => `Records may name ${slug}, which content/species no longer holds.`);
}
