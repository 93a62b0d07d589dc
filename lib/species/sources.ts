import { z } from 'zod';
import { readContent } from './read-yaml';
import type { Species } from './schema';

const Source = z.strictObject({
  /** As pages name it beside a fact. */
  short: z.string('must be text').min(1, 'must not be empty'),
  /** All that it says of sprouting, where that is less than how freely. */
  sproutingAlone: z.string('must be text').min(1, 'must not be empty').optional(),
  citation: z.string('must be text').min(1, 'must not be empty'),
  licence: z.string('must be text'),
  /** How much of it was read. */
  read: z.string('must be text'),
});
export type Source = z.output<typeof Source>;

let kept: ReadonlyMap<string, Source> | undefined;

/** What each source key stands for. */
export function allSources(): ReadonlyMap<string, Source> {
  return (kept ??= new Map(
    Object.entries(readContent('content/sources.yaml', z.record(z.string(), Source))),
  ));
}

/** A source as it stands beside a fact; what is no key ("common practice, no source") stands as it is. */
export const sourceWords = (key: string): string => allSources().get(key)?.short ?? key;

/** Sources that a species' facts were taken from, each once, in the order of the page; memory is none. */
export function sourcesOf({ resprouts, woodDensity, season, cautions }: Species): Source[] {
  const keys = new Set([
    ...resprouts.sources,
    ...resprouts.oldWoodSources,
    ...(woodDensity ? [woodDensity.source] : []),
    ...(season?.sources ?? []),
    ...cautions.map(({ source }) => source),
  ]);
  keys.delete('memory');
  return [...keys].flatMap((key) => allSources().get(key) ?? []);
}
