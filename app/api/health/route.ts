import { z } from 'zod';
import { health, HealthView } from '@/lib/health/health';
import { handler, json, route } from '@/lib/http/handler';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler({ as: 'all', summary: 'What works just now', output: HealthView as z.ZodType }, async () => {
    const now = await health();
    return json(now, { status: now.checks.db === 'ok' ? 200 : 503 });
  }),
});
