import type { Species } from '@/lib/species/schema';
import { sourcesOf } from '@/lib/species/sources';

/** What the short names beside the facts stand for, and how much of each was read. */
export function Sources({ species }: { species: Species }) {
  const sources = sourcesOf(species);
  return (
    <section id="sources" className="mt-12">
      <h2>Sources</h2>
      <ul className="mt-2 max-w-measure space-y-2 text-note">
        {sources.map(({ short, citation, licence, read }) => (
          <li key={short}>
            <b>{short}.</b> {citation}.{' '}
            <span className="text-soft">
              Licence: {licence}. Read: {read}.
            </span>
          </li>
        ))}
        <li>
          <b>From memory.</b> General horticultural and botanical knowledge, looked up nowhere.{' '}
          {sources.length === 0 && 'All that stands here about the species is of this kind.'}
        </li>
      </ul>
    </section>
  );
}
