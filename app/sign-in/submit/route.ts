import { readForm } from '@/lib/http/form';
import { handler } from '@/lib/http/handler';
import { signInByForm } from '@/lib/people/sign-in-form';

/** Answers the form of `/sign-in`, with or without a script in the browser. */
export const POST = handler(
  { as: 'all', summary: 'Sign in by the page’s form', transaction: 'none' },
  async ({ request }) => signInByForm(request, await readForm(request)),
);
