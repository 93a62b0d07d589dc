import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { renderMarkdown } from './markdown';

const Head = z.strictObject({ title: z.string().min(1), description: z.string().min(1) });

export type Guide = z.output<typeof Head> & { slug: string; html: string };

const FOLDER = ['content', 'guides'] as const;
const kept = new Map<string, Guide>();

/** A guide by its address, or undefined. */
export function guide(slug: string): Guide | undefined {
  return slugs().includes(slug) ? read(slug, ...FOLDER, `${slug}.md`) : undefined;
}

export const allGuides = (): Guide[] => slugs().flatMap((slug) => guide(slug) ?? []);

export const glossary = (): Guide => read('glossary', 'content', 'glossary.md');

function slugs(): string[] {
  return readdirSync(join(process.cwd(), ...FOLDER))
    .filter((name) => name.endsWith('.md'))
    .map((name) => name.slice(0, -3))
    .sort();
}

/** @throws Error naming the file when its head is not two lines of title and description between rules */
function read(slug: string, ...path: string[]): Guide {
  const known = kept.get(slug);
  if (known) return known;
  const file = join(...path);
  const [, head, body] =
    /^---\n([\s\S]*?)\n---\n([\s\S]*)$/.exec(readFileSync(join(process.cwd(), file), 'utf8')) ?? [];
  const parsed = Head.safeParse(head === undefined ? undefined : headOf(head));
  if (!parsed.success || body === undefined)
    throw new Error(`${file}:1: needs a head with title and description`);
  const made = { slug, ...parsed.data, html: renderMarkdown(body) };
  kept.set(slug, made);
  return made;
}

/** `name: text to the end of the line`, so that a colon in a description needs no quotes. */
function headOf(head: string): Record<string, string> {
  return Object.fromEntries(
    head.split('\n').map((line) => {
      const colon = line.indexOf(':');
      return [line.slice(0, colon).trim(), line.slice(colon + 1).trim()];
    }),
  );
}
