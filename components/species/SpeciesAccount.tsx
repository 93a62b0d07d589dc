import { CasesTable } from '@/components/cases/CasesTable';
import { Denominators } from '@/components/cases/Denominators';
import { OtherCuts } from '@/components/cases/OtherCuts';
import { EntriesTable } from '@/components/entry/EntriesTable';
import { MOST_WEEKS, type SpeciesResponse } from '@/lib/cases/schema';
import type { EntryView } from '@/lib/entries/schema';
import { nameInSentence } from '@/lib/species/catalogue';
import type { Species } from '@/lib/species/schema';
import { Cautions } from './Cautions';
import { Sources } from './Sources';
import { SpeciesHead } from './SpeciesHead';

type Props = { species: Species; response: SpeciesResponse; entries: readonly EntryView[] };

/** All that is known of one species: what it is, what to mind, what was seen, and the entries themselves. */
export function SpeciesAccount({ species, response: { weeks, cases, otherCuts }, entries }: Props) {
  const name = nameInSentence(species);
  const recorded = cases.some((one) => one.seen.entries > 0);
  return (
    <>
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
            {entries.length > 0 ? 'Try another number of weeks, or ' : 'Be the first: '}
            <a href="/entries/new">write down a cut</a>.
          </p>
        )}
        <OtherCuts otherCuts={otherCuts} />
      </section>
      <section id="entries" className="mt-12">
        <h2>Entries</h2>
        {entries.length > 0 ? (
          <EntriesTable entries={entries} withSpecies={false} />
        ) : (
          <p className="mt-2">No accepted entry of {name} yet.</p>
        )}
      </section>
      <Sources species={species} />
    </>
  );
}
