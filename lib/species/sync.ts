import type { Db } from '@/lib/database';
import { allSpecies } from './catalogue';

/**
 * Brings the table of species, which records point to, in step with the catalogue. Gives the slugs that the table still
 * holds and the catalogue no longer does.
 */
export async function syncSpecies(db: Db): Promise<string[]> {
  const rows = allSpecies().map(({ slug, scientific, genus, wood }) => ({ slug, scientific, genus, wood }));
  await db('species').insert(rows).onConflict('slug').merge();
  const gone = await db('species')
    .whereNotIn(
      'slug',
      rows.map(({ slug }) => slug),
    )
    .select<{ slug: string }[]>('slug');
  return gone.map(({ slug }) => slug);
}
