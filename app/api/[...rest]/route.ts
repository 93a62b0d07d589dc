import { METHODS } from '@/lib/http/handler';
import { problem } from '@/lib/http/problem';

/** Any address under /api that is not there: a problem document too. */
const absent = async () =>
  problem({
    title: 'Nothing here',
    status: 404,
    detail: 'There is no such address. /api/openapi.json lists them all.',
  });

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = Object.fromEntries(
  METHODS.map((method) => [method, absent]),
) as Record<(typeof METHODS)[number], typeof absent>;
