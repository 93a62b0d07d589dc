import { commonName } from '@/lib/species/catalogue';
import type { Species } from '@/lib/species/schema';
import { densityInWords } from '@/lib/species/wood';
import { plural } from '@/lib/words/words';

/** The catalogue as a table. */
export function SpeciesTable({ species }: { species: readonly Species[] }) {
  return (
    <table className="mt-6">
      <caption className="pb-2 text-left text-note text-soft">
        {plural(species.length, 'species', 'species')}. Sprouting is mostly from memory; each species’ own
        page names the source of every fact.
      </caption>
      <thead>
        <tr>
          <th scope="col">species</th>
          <th scope="col" className="hidden md:table-cell">
            family
          </th>
          <th scope="col">wood</th>
          <th scope="col" className="hidden sm:table-cell">
            after a hard cut
          </th>
          <th scope="col">from old wood</th>
        </tr>
      </thead>
      <tbody>
        {species.map((one) => (
          <tr key={one.slug}>
            <th scope="row">
              <a href={`/species/${one.slug}`} className="inline-flex min-h-finger items-center">
                {commonName(one)}
              </a>
              <i className="block text-note font-normal text-soft">{one.scientific}</i>
            </th>
            <td className="hidden md:table-cell">{one.family}</td>
            <td>
              {one.wood ?? 'not known'}
              {one.woodDensity && (
                <span className="block text-note text-soft">{densityInWords(one.woodDensity.value)}</span>
              )}
            </td>
            <td className="hidden sm:table-cell">
              {one.resprouts.degree === 'no' ? 'does not resprout' : `resprouts ${one.resprouts.degree}`}
            </td>
            <td>{one.resprouts.fromOldWood === 'weak' ? 'weakly' : one.resprouts.fromOldWood}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
