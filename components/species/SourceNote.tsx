import { sourceWords } from '@/lib/species/sources';

/** Where a fact comes from, small beside it. */
export function SourceNote({ sources }: { sources: readonly string[] }) {
  return <span className="text-note text-soft"> ({sources.map(sourceWords).join('; ')})</span>;
}
