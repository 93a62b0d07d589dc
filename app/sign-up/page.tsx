import type { Metadata } from 'next';
import { cookies } from 'next/headers';
import { redirect } from 'next/navigation';
import { errorOf, ErrorSummary } from '@/components/form/ErrorSummary';
import { Field } from '@/components/form/Field';
import { ownPath } from '@/lib/people/own-path';
import { currentActor } from '@/lib/people/session';
import { readTyped } from '@/lib/people/typed';

export const metadata: Metadata = { title: 'Make an account', robots: { index: false } };

const LABELS = { name: 'Name', email: 'E-mail address', password: 'Password' };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

/** A plain form: it needs no script, and keeps what was typed, but the password, when it comes back. */
export default async function SignUp({ searchParams }: Props) {
  const given = (await searchParams)['callbackUrl'];
  const callbackUrl = ownPath((Array.isArray(given) ? given[0] : given) ?? '/orchards');
  if (await currentActor()) redirect(callbackUrl);
  const { email, name, errors = [] } = readTyped(await cookies());
  return (
    <main id="main" className="mx-auto max-w-page px-4 pt-12">
      <h1>Make an account</h1>
      <p className="mt-4 max-w-measure">
        With an account you keep orchards, write down cuts and what grew after them, and publish what you
        wish.
      </p>
      <ErrorSummary errors={errors} labels={LABELS} />
      <form method="post" action="/sign-up/submit" className="max-w-measure">
        <input type="hidden" name="callbackUrl" value={callbackUrl} />
        <Field
          name="name"
          label={LABELS.name}
          hint="Stands in public beside what you publish. It need not be your full name."
          autoComplete="name"
          defaultValue={name}
          error={errorOf(errors, 'name')}
          required
          maxLength={80}
        />
        <Field
          name="email"
          label={LABELS.email}
          hint="To sign in with. Nobody else sees it but the admins."
          type="email"
          autoComplete="username"
          defaultValue={email}
          error={errorOf(errors, 'email')}
          required
          maxLength={254}
        />
        <Field
          name="password"
          label={LABELS.password}
          hint="12 characters at least. Three or four words that do not belong together are easy to keep in mind."
          type="password"
          autoComplete="new-password"
          error={errorOf(errors, 'password')}
          required
          minLength={12}
          maxLength={200}
        />
        <button type="submit" className="action mt-6">
          Make the account
        </button>
      </form>
      <p className="mt-8">
        <a
          href={`/sign-in?callbackUrl=${encodeURIComponent(callbackUrl)}`}
          className="inline-flex min-h-finger items-center"
        >
          I have one: sign in
        </a>
      </p>
    </main>
  );
}
