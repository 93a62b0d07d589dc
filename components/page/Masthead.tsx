import { mayManagePeople, mayOpenBench } from '@/lib/policy/policy';
import type { Actor } from '@/lib/people/actor';

const LINK = 'inline-flex min-h-finger items-center';

/** Where to go, and who is here. Plain links: no page needs a script for them. */
export function Masthead({ actor, demo }: { actor: Actor | null; demo: boolean }) {
  return (
    <header className="px-3">
      <nav aria-label="Main" className="flex flex-wrap items-center gap-x-5 border-b border-rule">
        <a href="/" className={`${LINK} font-bold no-underline`}>
          Aftercut
        </a>
        <a href="/" className={LINK}>
          Ask
        </a>
        <a href="/species" className={LINK}>
          Species
        </a>
        <a href="/entries" className={LINK}>
          Entries
        </a>
        <a href="/guides" className={LINK}>
          Guides
        </a>
        {mayOpenBench(actor) && (
          <a href="/bench" className={LINK}>
            Bench
          </a>
        )}
        {mayManagePeople(actor) && (
          <a href="/admin" className={LINK}>
            People
          </a>
        )}
        <span className="ml-auto flex flex-wrap gap-x-5">
          {actor ? (
            <>
              <a href="/orchards" className={LINK}>
                Orchards
              </a>
              <a href="/account" className={LINK}>
                {actor.name}
              </a>
            </>
          ) : (
            <a href="/sign-in" className={LINK}>
              Sign in
            </a>
          )}
        </span>
      </nav>
      {demo && (
        <p className="border-b border-rule py-1.5 text-note text-soft">
          Invented records, to try things out: no real orchard stands behind a figure here.
        </p>
      )}
    </header>
  );
}
