import type { Metadata } from 'next';
import { cache } from 'react';
import { EntryActions } from '@/components/entry/EntryActions';
import { EntryRecord } from '@/components/entry/EntryRecord';
import { PlaceLine } from '@/components/entry/PlaceLine';
import { Still } from '@/components/page/Still';
import { Cautions } from '@/components/species/Cautions';
import { database } from '@/lib/database';
import { readEntryPage } from '@/lib/entries/page';
import type { EntryView } from '@/lib/entries/schema';
import type { Units } from '@/lib/units/units';
import { currentActor } from '@/lib/people/session';
import { commonName, speciesBySlug } from '@/lib/species/catalogue';
import { capital, STATUS_WORDS } from '@/lib/words/words';

/** A revision's record changes in one thing alone: which of its readings the bench set aside. */
function recordKey({ id, revision, readings }: EntryView, units: Units): string {
  const aside = readings.map(({ setAside }) => (setAside ? '1' : '0')).join('');
  return `record ${id} ${revision} ${aside} ${units}`;
}

type Props = { params: Promise<{ id: string }> };

const found = cache(async (id: string) => readEntryPage(database(), await currentActor(), id));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { view } = await found((await params).id);
  const species = view.species ? speciesBySlug(view.species) : undefined;
  const name = species ? commonName(species) : 'a tree';
  return {
    title: view.title ?? `${name}, an entry`,
    description: `What ${name.toLowerCase()} did after ${view.class ? `a ${view.class} cut` : 'a cut'}: a record by ${view.owner}.`,
    ...(view.status === 'accepted' ? {} : { robots: { index: false } }),
  };
}

export default async function EntryPage({ params }: Props) {
  const { view, facts } = await found((await params).id);
  const actor = await currentActor();
  const species = view.species ? speciesBySlug(view.species) : undefined;
  const units = actor?.units ?? 'metric';
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <article>
        <h1>{view.title ?? 'Untitled entry'}</h1>
        <p className="mt-2 text-soft">
          {species ? (
            <>
              <a href={`/species/${species.slug}`}>{commonName(species)}</a> <i>{species.scientific}</i>
            </>
          ) : (
            'No species yet'
          )}
          {view.cultivar && <> ‘{view.cultivar}’</>} · recorded by{' '}
          {view.credits.map(({ name }) => name).join(' and ')}
        </p>
        <PlaceLine entry={view} units={units} />
        {view.status !== 'accepted' && (
          <p className="mt-4 border-l-4 border-tape pl-3">
            <strong>{capital(STATUS_WORDS[view.status])}.</strong>
          </p>
        )}
        {view.pending && (
          <p className="mt-4 border-l-4 border-tape pl-3">
            <strong>A change waits.</strong> Everyone else still sees the accepted record.
          </p>
        )}
        {view.returnedNote && (
          <p className="mt-4 max-w-measure border-l-4 border-tape pl-3">
            <strong>From the bench:</strong> {view.returnedNote}
          </p>
        )}
        <EntryActions actor={actor} facts={facts} entry={view} />
        <Still
          keptBy={recordKey(view, units)}
          render={() => (
            <>
              {species && <Cautions species={species} />}
              <EntryRecord entry={view} units={units} />
            </>
          )}
        />
      </article>
      {species && view.class && view.cut.tip && (
        <p className="mt-8 border-t border-rule pt-4">
          <a href={`/species/${species.slug}`}>What such cuts did on {commonName(species).toLowerCase()}</a>
        </p>
      )}
    </main>
  );
}
