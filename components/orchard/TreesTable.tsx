import type { Tree } from '@/lib/orchards/schema';
import { commonName, speciesBySlug } from '@/lib/species/catalogue';

/** The trees of an orchard. */
export function TreesTable({ trees, mayChange }: { trees: readonly Tree[]; mayChange: boolean }) {
  if (trees.length === 0) {
    return (
      <p className="mt-2 max-w-measure">
        {mayChange ? 'No tree stands here yet. Add the one you cut.' : 'No tree was added here yet.'}
      </p>
    );
  }
  return (
    <table className="mt-2">
      <thead>
        <tr>
          <th scope="col">tree</th>
          <th scope="col">species</th>
          <th scope="col">cultivar</th>
          <th scope="col" className="number">
            planted
          </th>
        </tr>
      </thead>
      <tbody>
        {trees.map((tree) => (
          <tr key={tree.id}>
            <th scope="row">{tree.label}</th>
            <td>{tree.species ? <SpeciesLink slug={tree.species} /> : 'not said'}</td>
            <td>{tree.cultivar ?? ''}</td>
            <td className="number">{tree.yearPlanted ?? ''}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function SpeciesLink({ slug }: { slug: string }) {
  const species = speciesBySlug(slug);
  return (
    <a href={`/species/${slug}`} className="inline-flex min-h-finger items-center">
      {species ? commonName(species) : slug}
    </a>
  );
}
