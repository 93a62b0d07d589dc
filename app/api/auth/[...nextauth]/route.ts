import { z } from 'zod';
import { handler, route } from '@/lib/http/handler';
import { answerAuth } from '@/lib/people/auth-route';

const params = z.object({ nextauth: z.array(z.string()) });

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handler(
    { as: 'all', summary: 'next-auth: the token for forms (csrf), whose session this is (session)', params },
    ({ request, params: { nextauth } }) => answerAuth(request, nextauth),
  ),
  POST: handler(
    {
      as: 'all',
      summary: 'next-auth: sign in (callback/credentials), sign out (signout)',
      params,
      transaction: 'none',
    },
    ({ request, params: { nextauth } }) => answerAuth(request, nextauth),
  ),
});
