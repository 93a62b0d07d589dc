import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { CasesTable } from '@/components/cases/CasesTable';
import { Denominators } from '@/components/cases/Denominators';
import { OtherCuts } from '@/components/cases/OtherCuts';
import { EntriesTable } from '@/components/entry/EntriesTable';
import { Cautions } from '@/components/species/Cautions';
import { SpeciesHead } from '@/components/species/SpeciesHead';
import { MOST_WEEKS, Weeks } from '@/lib/cases/schema';
import { speciesResponse } from '@/lib/cases/species-response';
import { database } from '@/lib/database';
import { newestAccepted } from '@/lib/entries/newest-accepted';
import { commonName, speciesBySlug } from '@/lib/species/catalogue';

type Props = { params: Promise<{ slug: string }>; searchParams: Promise<{ weeks?: string | string[] }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const species = speciesBySlug((await params).slug);
  if (!species) return { title: 'No such species' };
  const name = commonName(species);
  return {
    title: `${name} after a cut`,
    description: `What ${name.toLowerCase()} (${species.scientific}) did after each depth of cut, tip kept or removed, as growers counted it.`,
  };
}

export default async function SpeciesPage({ params, searchParams }: Props) {
  const species = speciesBySlug((await params).slug);
  if (!species) notFound();
  const weeks = Weeks.catch(8).parse((await searchParams).weeks ?? 8);
  const db = database();
  const [{ cases, otherCuts }, entries] = await Promise.all([
    speciesResponse(db, species.slug, weeks),
    newestAccepted(db, species.slug),
  ]);
  const name = commonName(species).toLowerCase();
  const recorded = cases.some((one) => one.seen.entries > 0);
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <SpeciesHead species={species} />
      <Cautions species={species} />
      <section>
        <h2>What was seen</h2>
        <form className="mt-2 flex flex-wrap items-center gap-3" action={`/species/${species.slug}`}>
          <label htmlFor="weeks">Weeks after the cut</label>
          <input
            id="weeks"
            name="weeks"
            type="number"
            inputMode="numeric"
            min={1}
            max={MOST_WEEKS}
            defaultValue={weeks}
            className="field w-24"
          />
          <button className="action-plain">Show</button>
        </form>
        {recorded ? (
          <>
            <CasesTable
              species={species.slug}
              weeks={weeks}
              cases={cases}
              caption={`Shoots on a branch of ${name}, seen within two weeks of week ${weeks}`}
            />
            <Denominators weeks={weeks} />
          </>
        ) : (
          <p className="mt-4 max-w-measure">
            Nobody has counted {name} near week {weeks}.{' '}
            {entries.length > 0 ? 'Try another number of weeks, or ' : ''}
            <a href="/entries/new">write down the first cut</a>.
          </p>
        )}
        <OtherCuts otherCuts={otherCuts} />
      </section>
      <section id="entries" className="mt-12">
        <h2>Entries</h2>
        {entries.length > 0 ? (
          <EntriesTable entries={entries} />
        ) : (
          <p className="mt-2">No accepted entry of {name} yet.</p>
        )}
      </section>
    </main>
  );
}
