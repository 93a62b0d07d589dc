import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { Still } from '@/components/page/Still';
import { SpeciesAccount } from '@/components/species/SpeciesAccount';
import { Weeks } from '@/lib/cases/schema';
import { speciesResponse } from '@/lib/cases/species-response';
import { database } from '@/lib/database';
import { newestAccepted } from '@/lib/entries/newest-accepted';
import { commonName, speciesBySlug } from '@/lib/species/catalogue';
import { dataVersion, NAMES, speciesSubject } from '@/lib/versions/versions';

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
  const version = await dataVersion(db, [speciesSubject(species.slug), NAMES]);
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <Still
        keptBy={`species ${species.slug} ${weeks} ${version}`}
        render={async () => {
          const [response, entries] = await Promise.all([
            speciesResponse(db, species.slug, weeks),
            newestAccepted(db, species.slug),
          ]);
          return <SpeciesAccount species={species} response={response} entries={entries} />;
        }}
      />
    </main>
  );
}
