import { env } from '@/lib/env';
import { NotFound } from '@/lib/errors/errors';
import { handler, json, route } from '@/lib/http/handler';

/** What other routes are measured against: a constant through the same wrapper. There only with MEASURE=1. */
export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler({ as: 'all', summary: 'A constant, to measure against; only with MEASURE=1' }, async () => {
    if (!env().MEASURE) throw new NotFound();
    return json({ constant: true });
  }),
});
