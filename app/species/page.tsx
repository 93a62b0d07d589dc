import type { Metadata } from 'next';
import { FindSpecies } from '@/components/species/FindSpecies';
import { SpeciesTable } from '@/components/species/SpeciesTable';
import { allSpecies } from '@/lib/species/catalogue';
import { findSpecies, type Narrowed } from '@/lib/species/find';

export function generateMetadata(): Metadata {
  return {
    title: 'Species',
    description: `The catalogue: ${allSpecies().length} trees, shrubs, palms and vines, how dense their wood is, and whether they resprout from old wood.`,
  };
}

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

const WOODS = ['soft', 'medium', 'hard', 'unknown'] as const;
const OLD_WOOD = ['yes', 'weak', 'no'] as const;

export default async function SpeciesIndex({ searchParams }: Props) {
  const asked = await searchParams;
  const q = typeof asked.q === 'string' ? asked.q.slice(0, 500) : '';
  const narrowed: Narrowed = {
    wood: WOODS.find((wood) => wood === asked.wood),
    oldWood: OLD_WOOD.find((answer) => answer === asked.oldWood),
  };
  const found = findSpecies(q, narrowed);
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1>Species</h1>
      <FindSpecies q={q} wood={narrowed.wood ?? ''} oldWood={narrowed.oldWood ?? ''} />
      {found.length > 0 ? (
        <SpeciesTable species={found} />
      ) : (
        <p className="mt-6 max-w-measure">
          No species of this name{narrowed.wood || narrowed.oldWood ? ' with these filters' : ''}. Try the
          scientific name, a shorter piece of it, or <a href="/species">all of them</a>. The catalogue reads
          English, Spanish and French names.
        </p>
      )}
    </main>
  );
}
