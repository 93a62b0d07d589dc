import type { Metadata } from 'next';
import { cookies } from 'next/headers';
import { redirect } from 'next/navigation';
import { ErrorSummary } from '@/components/form/ErrorSummary';
import { Field } from '@/components/form/Field';
import { ownPath } from '@/lib/people/own-path';
import { currentActor } from '@/lib/people/session';
import { readTyped } from '@/lib/people/typed';

export const metadata: Metadata = { title: 'Sign in', robots: { index: false } };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

/** A plain form: it needs no script, and keeps the address that was typed when it comes back. */
export default async function SignIn({ searchParams }: Props) {
  const query = await searchParams;
  const callbackUrl = ownPath(one(query['callbackUrl']) ?? '/orchards');
  if (await currentActor()) redirect(callbackUrl);
  const { email } = readTyped(await cookies());
  const problem = sayWhy(one(query['error']), one(query['wait']));
  return (
    <main id="main" className="mx-auto max-w-page px-4 pt-12">
      <h1>Sign in</h1>
      <ErrorSummary errors={problem ? [{ path: '', message: problem }] : []} labels={{}} />
      <form method="post" action="/sign-in/submit" className="max-w-measure">
        <input type="hidden" name="callbackUrl" value={callbackUrl} />
        <Field
          name="email"
          label="E-mail address"
          type="email"
          autoComplete="username"
          defaultValue={email}
          required
          maxLength={254}
        />
        <Field
          name="password"
          label="Password"
          type="password"
          autoComplete="current-password"
          required
          maxLength={200}
        />
        <button type="submit" className="action mt-6">
          Sign in
        </button>
      </form>
      <p className="mt-8 max-w-measure">
        No account yet?{' '}
        <a
          href={`/sign-up?callbackUrl=${encodeURIComponent(callbackUrl)}`}
          className="inline-flex min-h-finger items-center"
        >
          Make one
        </a>
        . Reading needs none.
      </p>
    </main>
  );
}

const one = (value: string | string[] | undefined): string | undefined =>
  Array.isArray(value) ? value[0] : value;

function sayWhy(error: string | undefined, waitSeconds: string | undefined): string | null {
  if (!error) return null;
  if (error === 'too-many') {
    const minutes = Math.max(1, Math.ceil(Number(waitSeconds) / 60) || 15);
    return `Too many tries. Nothing is checked for the next ${minutes === 1 ? 'minute' : `${minutes} minutes`}.`;
  }
  if (error === 'wrong' || error === 'CredentialsSignin') {
    return 'This e-mail address and this password do not go together. Look for capitals and for a slip in the address.';
  }
  return 'You were not signed in. Try once more.';
}
