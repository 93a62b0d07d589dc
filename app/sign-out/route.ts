import { handler } from '@/lib/http/handler';
import { signOutByForm } from '@/lib/people/sign-in-form';

/** Answers the sign-out button, with or without a script in the browser. */
export const POST = handler(
  { as: 'all', summary: 'Sign out by the page’s button', transaction: 'none' },
  ({ request }) => signOutByForm(request),
);
