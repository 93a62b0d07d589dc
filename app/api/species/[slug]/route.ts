import { NotFound } from '@/lib/errors/errors';
import { z } from 'zod';
import { handler, json, route } from '@/lib/http/handler';
import { speciesBySlug } from '@/lib/species/catalogue';
import { SpeciesView, speciesView } from '@/lib/species/view';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'all',
      summary: 'One species of the catalogue',
      params: z.object({ slug: z.string().max(80) }),
      output: SpeciesView,
      find: async ({ params }) => {
        const species = speciesBySlug(params.slug);
        if (!species) throw new NotFound('There is no such species in the catalogue.');
        return species;
      },
    },
    async ({ subject }) => json(speciesView(subject)),
  ),
});
