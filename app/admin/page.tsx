import type { Metadata } from 'next';
import { notFound, redirect } from 'next/navigation';
import { PeopleTable } from '@/components/admin/PeopleTable';
import { Field } from '@/components/form/Field';
import { database } from '@/lib/database';
import { Cursor } from '@/lib/lists/cursor';
import { listPeople } from '@/lib/people/admin';
import { currentActor } from '@/lib/people/session';
import { mayManagePeople } from '@/lib/policy/policy';

export const metadata: Metadata = { title: 'People and roles', robots: { index: false } };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function Admin({ searchParams }: Props) {
  const actor = await currentActor();
  if (!actor) redirect('/sign-in?callbackUrl=/admin');
  if (!mayManagePeople(actor)) notFound();
  const query = await searchParams;
  const q = typeof query['q'] === 'string' ? query['q'].slice(0, 254) : '';
  const page = await listPeople(database(), { q, limit: 50, cursor: Cursor.safeParse(query['cursor']).data });
  return (
    <main id="main" className="mx-auto max-w-page px-4 pt-12">
      <h1>People and roles</h1>
      <form
        method="get"
        action="/admin"
        role="search"
        className="flex max-w-measure flex-wrap items-end gap-3"
      >
        <div className="grow">
          <Field
            name="q"
            type="search"
            label="Find somebody"
            hint="Part of a name or address"
            defaultValue={q}
          />
        </div>
        <button type="submit" className="action-plain">
          Find
        </button>
      </form>
      {page.items.length === 0 ? (
        <p className="mt-6">Nobody’s name or address holds “{q}”.</p>
      ) : (
        <PeopleTable people={page.items} />
      )}
      {page.nextCursor && (
        <p className="mt-6">
          <a
            href={`/admin?${new URLSearchParams({ q, cursor: page.nextCursor }).toString()}`}
            className="action-plain"
          >
            More people
          </a>
        </p>
      )}
    </main>
  );
}
