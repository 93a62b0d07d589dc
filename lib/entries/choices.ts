import type { Db } from '@/lib/database';
import { orchardsOf, treesOf, type StoredOrchard } from '@/lib/orchards/table';
import type { Tree } from '@/lib/orchards/schema';
import type { Actor } from '@/lib/people/actor';
import { mayChangeOrchard } from '@/lib/policy/policy';
import { allSpecies, commonName } from '@/lib/species/catalogue';

const MOST_ORCHARDS = 200;

export type Choices = {
  species: { slug: string; name: string; scientific: string; also: string[] }[];
  orchards: {
    id: string;
    name: string;
    place: StoredOrchard['content']['place'];
    elevation: number | null;
    trees: Pick<Tree, 'id' | 'label' | 'species' | 'cultivar'>[];
  }[];
};

/** What a grower may choose from while writing an entry: every species, and the orchards that are theirs. */
export async function choicesFor(db: Db, actor: Actor): Promise<Choices> {
  const found = await orchardsOf(db, actor, { limit: MOST_ORCHARDS });
  const own = found.filter(({ facts }) => mayChangeOrchard(actor, facts));
  const orchards = await Promise.all(
    own.map(async ({ id, content }) => ({
      id,
      name: content.name,
      place: content.place,
      elevation: content.elevation,
      trees: (await treesOf(db, id)).map(({ id: tree, label, species, cultivar }) => ({
        id: tree,
        label,
        species,
        cultivar,
      })),
    })),
  );
  return { species: speciesChoices(), orchards };
}

function speciesChoices(): Choices['species'] {
  return allSpecies()
    .map((species) => {
      const name = commonName(species);
      const also = [...new Set([...Object.values(species.names).flat(), ...species.synonyms])];
      const others = also.filter((other) => other.toLowerCase() !== name.toLowerCase());
      return { slug: species.slug, name, scientific: species.scientific, also: others };
    })
    .sort((a, b) => a.name.localeCompare(b.name, 'en'));
}
