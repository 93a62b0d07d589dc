import type { EntryView } from '@/lib/entries/schema';
import { commonName, speciesBySlug } from '@/lib/species/catalogue';
import { dateInWords, rateInWords, STATUS_WORDS } from '@/lib/words/words';
import { countedMean } from './counted';

/** Entries as a table: which tree, which cut, what was counted last; with where each stands, for its owner. */
export function EntriesTable({
  entries,
  withStatus = false,
  withSpecies = true,
}: {
  entries: readonly EntryView[];
  withStatus?: boolean;
  /** Off where all are of one species. */
  withSpecies?: boolean;
}) {
  return (
    <table className="mt-6">
      <thead>
        <tr>
          <th scope="col">entry</th>
          {withSpecies && (
            <th scope="col" className="hidden sm:table-cell">
              species
            </th>
          )}
          <th scope="col">cut</th>
          <th scope="col" className="number hidden sm:table-cell">
            shoots a branch, last counted
          </th>
          <th scope="col">{withStatus ? 'status' : 'grower'}</th>
        </tr>
      </thead>
      <tbody>
        {entries.map((entry) => (
          <Row key={entry.id} entry={entry} withStatus={withStatus} withSpecies={withSpecies} />
        ))}
      </tbody>
    </table>
  );
}

type RowProps = { entry: EntryView; withStatus: boolean; withSpecies: boolean };

function Row({ entry, withStatus, withSpecies }: RowProps) {
  const species = entry.species ? speciesBySlug(entry.species) : undefined;
  const last = entry.readings.findLast((reading) => countedMean(reading) !== null);
  const mean = last ? countedMean(last) : null;
  return (
    <tr>
      <th scope="row">
        <a href={`/entries/${entry.id}`} className="inline-flex min-h-finger items-center">
          {entry.title ?? 'Untitled'}
        </a>
      </th>
      {withSpecies && <td className="hidden sm:table-cell">{species ? commonName(species) : '–'}</td>}
      <td>
        {entry.class
          ? `${entry.class}${entry.cut.tip && entry.class !== 'uncut' ? `, tip ${entry.cut.tip}` : ''}`
          : '–'}
        {entry.cut.date && (
          <span className="block text-note text-soft">
            {dateInWords(entry.cut.date, entry.cut.dateApproximate)}
          </span>
        )}
      </td>
      <td className="number hidden sm:table-cell">{mean === null ? '–' : rateInWords(mean)}</td>
      <td>{withStatus ? statusWords(entry) : entry.owner}</td>
    </tr>
  );
}

function statusWords(entry: EntryView): string {
  return entry.pending ? 'accepted; a change is under way' : STATUS_WORDS[entry.status];
}
