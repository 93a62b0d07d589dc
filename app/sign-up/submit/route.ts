import { readForm } from '@/lib/http/form';
import { handler } from '@/lib/http/handler';
import { signUpByForm } from '@/lib/people/sign-up-form';

/** Answers the form of `/sign-up`, with or without a script in the browser. */
export const POST = handler(
  { as: 'all', summary: 'Sign up by the page’s form', transaction: 'none' },
  async ({ db, request }) => signUpByForm(db, request, await readForm(request)),
);
