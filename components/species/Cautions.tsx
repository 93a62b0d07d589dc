import { generalCautions, ownCautions } from '@/lib/species/cautions';
import type { Species } from '@/lib/species/schema';
import { sourceWords } from '@/lib/species/sources';
import { SourceNote } from './SourceNote';

/**
 * What must be read before any figure is used. A source stands behind the title, for it backs that a species has the
 * caution, and not what to do about it.
 */
export function Cautions({ species }: { species: Species }) {
  const own = ownCautions(species);
  const general = generalCautions();
  return (
    <section aria-label="Cautions" className="my-8 border-y border-ink py-4">
      <div className="max-w-measure space-y-2">
        {own.length > 0 && (
          <>
            <ul className="space-y-2">
              {own.map(({ code, title, text, source }) => (
                <li key={code}>
                  <strong>{title}</strong>
                  <SourceNote said={source.split(', ').map(sourceWords)} /> {text}
                </li>
              ))}
            </ul>
            <p className="text-note text-soft">
              What these do, and what to do about them, is from memory and common practice, no source.
            </p>
          </>
        )}
        <p>
          {general.map(({ code, title, text }) => (
            <span key={code}>{`${title} ${text} `}</span>
          ))}
          <a href="/guides/working-safely">More on working safely</a>.
          <SourceNote said={[...new Set(general.map(({ source }) => source))]} />
        </p>
      </div>
    </section>
  );
}
