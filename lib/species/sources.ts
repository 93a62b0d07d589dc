import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parse } from 'yaml';
import { z } from 'zod';

const Sources = z.record(
  z.string(),
  z.object({ citation: z.string(), licence: z.string(), read: z.string() }),
);

let kept: z.output<typeof Sources> | undefined;

/** What a source key stands for; "from memory" for the key `memory`. */
export function sourceWords(key: string): string {
  if (key === 'memory') return 'from memory';
  kept ??= Sources.parse(parse(readFileSync(join(process.cwd(), 'content', 'sources.yaml'), 'utf8')));
  return kept[key]?.citation ?? key;
}
