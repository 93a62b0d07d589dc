import { z } from 'zod';
import { SpeciesResponse, Weeks } from '@/lib/cases/schema';
import { speciesResponse } from '@/lib/cases/species-response';
import { NotFound } from '@/lib/errors/errors';
import { handler, json, route } from '@/lib/http/handler';
import { isSpeciesSlug } from '@/lib/species/catalogue';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'all',
      summary: 'Every case of a species: what was seen, and what is expected',
      params: z.object({ slug: z.string().max(80) }),
      query: z.strictObject({ weeks: Weeks.default(8) }),
      output: SpeciesResponse,
      find: async ({ params }) => {
        if (!isSpeciesSlug(params.slug)) throw new NotFound('There is no such species in the catalogue.');
      },
    },
    async ({ db, params, query }) => json(await speciesResponse(db, params.slug, query.weeks)),
  ),
});
