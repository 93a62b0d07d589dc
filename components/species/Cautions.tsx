import { cautionsFor } from '@/lib/species/cautions';
import type { Species } from '@/lib/species/schema';
import { SourceNote } from './SourceNote';

/** What must be read before any figure is used. */
export function Cautions({ species }: { species: Species }) {
  return (
    <section aria-label="Cautions" className="my-8 border-y border-ink py-4">
      <ul className="max-w-measure space-y-2">
        {cautionsFor(species).map(({ code, title, text, source }) => (
          <li key={title}>
            <strong>{title}</strong> {text}
            {code !== 'general' && <SourceNote sources={source.split(', ')} />}
          </li>
        ))}
      </ul>
    </section>
  );
}
