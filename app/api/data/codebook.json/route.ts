import { z } from 'zod';
import { READING_COLUMNS } from '@/lib/data/codebook';
import { handler, json, route } from '@/lib/http/handler';

const Column = z.object({
  name: z.string(),
  holds: z.string(),
  unit: z.string().optional(),
  values: z.array(z.string()).optional(),
  blank: z.string().optional(),
});

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    {
      as: 'all',
      summary: 'What each column of the open data holds',
      output: z.object({ readings: z.array(Column) }),
    },
    async () => json({ readings: READING_COLUMNS }),
  ),
});
