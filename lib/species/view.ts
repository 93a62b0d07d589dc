import { z } from 'zod';
import { commonName } from './catalogue';
import { cautionsFor } from './cautions';
import { SpeciesFile, type Species } from './schema';

/** A species as the API gives it. */
export const SpeciesView = SpeciesFile.extend({
  slug: z.string(),
  name: z.string(),
  wood: z.enum(['soft', 'medium', 'hard']).nullable(),
  plant: z.enum(['conifer', 'palm', 'broadleaf']).nullable(),
  cautions: z.array(z.object({ code: z.string(), title: z.string(), text: z.string(), source: z.string() })),
});
export type SpeciesView = z.output<typeof SpeciesView>;

export function speciesView(species: Species): SpeciesView {
  return { ...species, name: commonName(species), cautions: cautionsFor(species) };
}
