import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { AccountForm } from '@/components/account/AccountForm';
import { SignOutButton } from '@/components/account/SignOutButton';
import { database } from '@/lib/database';
import { accountOf } from '@/lib/people/account';
import { currentActor } from '@/lib/people/session';

export const metadata: Metadata = { title: 'Your account' };

export default async function AccountPage() {
  const actor = await currentActor();
  if (!actor) redirect('/sign-in?callbackUrl=/account');
  const account = await accountOf(database(), actor);
  return (
    <main id="main" className="mx-auto max-w-page px-4 pt-12">
      <h1>Your account</h1>
      <p className="mt-4 max-w-measure">
        You are signed in as {account.email}, {account.role}.
      </p>
      <p className="mt-4">
        <a href="/orchards" className="inline-flex min-h-finger items-center">
          Your orchards
        </a>
      </p>
      <SignOutButton />
      <section className="mt-10">
        <h2>How you are shown</h2>
        <AccountForm account={account} />
      </section>
    </main>
  );
}
