import type { Metadata } from 'next';
import { READING_COLUMNS } from '@/lib/data/codebook';
import { env } from '@/lib/env';

export const metadata: Metadata = {
  title: 'Open data',
  description: 'All accepted readings as a table, with a codebook that says what each column holds.',
};

export default function DataPage() {
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1>Open data</h1>
      <div className="mt-4 max-w-measure space-y-3">
        <p>
          Every accepted reading, one row each, as growers counted it: shoots on each pruned branch, with the
          species, the cut and the place. Readings that the bench set aside are not in it.
        </p>
        {env().DEMO && (
          <p>This copy holds invented records, to try things out. Do not use them for anything else.</p>
        )}
        <p>
          An orchard’s place is the centre of a cell of 0.1 degree, its elevation is rounded to 100 m, and
          neither orchards nor trees are named. Growers and orchards have keys that only say which rows belong
          together: one orchard in one season is one witness, however many branches it counts.
        </p>
        <p>
          A count is of live shoots of 2 cm or more that rose from retained wood of a marked branch, before
          any were taken off at that visit: <a href="/guides/counting">how to count</a>. Leave rows out that
          are marked thinned when you sum up, and keep pollarding, coppicing and thinning cuts apart.
        </p>
      </div>
      <p className="mt-6 flex flex-wrap gap-3">
        <a className="action" href="/api/data/readings.csv" download>
          readings.csv
        </a>
        <a className="action-plain" href="/api/data/codebook.json">
          codebook.json
        </a>
        <a className="action-plain" href="/api/openapi.json">
          The API, described
        </a>
      </p>
      <h2 className="mt-12">Codebook</h2>
      <table className="mt-3">
        <thead>
          <tr>
            <th scope="col">column</th>
            <th scope="col">holds</th>
            <th scope="col" className="hidden sm:table-cell">
              unit or values
            </th>
            <th scope="col" className="hidden md:table-cell">
              blank means
            </th>
          </tr>
        </thead>
        <tbody>
          {READING_COLUMNS.map(({ name, holds, unit, values, blank }) => (
            <tr key={name}>
              <th scope="row">{name}</th>
              <td>{holds}</td>
              <td className="hidden sm:table-cell">{values?.join(', ') ?? unit ?? ''}</td>
              <td className="hidden md:table-cell">{blank ?? ''}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </main>
  );
}
