import { handler, json, route } from '@/lib/http/handler';
import { SignedUp, SignUp } from '@/lib/people/schema';
import { signUpFrom } from '@/lib/people/sign-up';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handler(
    { as: 'all', summary: 'Make an account', body: SignUp, output: SignedUp, transaction: 'none' },
    async ({ db, body, request }) => json(await signUpFrom(db, body, request.headers), { status: 201 }),
  ),
});
