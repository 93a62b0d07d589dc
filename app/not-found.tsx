import type { Metadata } from 'next';

export const metadata: Metadata = { title: 'Nothing here' };

export default function NotFound() {
  return (
    <main id="main" className="mx-auto max-w-page px-4 pt-12">
      <h1>Nothing grows at this address</h1>
      <p className="mt-4 max-w-measure">
        The page was moved, taken back by whoever wrote it, or is not public. An entry that is still a draft
        is seen by its grower alone: if it is yours, sign in.
      </p>
      <p className="mt-6 flex flex-wrap gap-3">
        <a className="action" href="/species">
          Find a species
        </a>
        <a className="action-plain" href="/">
          Ask about a cut
        </a>
        <a className="action-plain" href="/sign-in">
          Sign in
        </a>
      </p>
    </main>
  );
}
