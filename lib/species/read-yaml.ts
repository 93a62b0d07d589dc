import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { isNode, LineCounter, parseDocument, type Document } from 'yaml';
import type { z } from 'zod';

export type ReadYaml<T> = {
  data: T;
  /** An error about a field that is well formed and still wrong, with its line. */
  fail: (field: readonly PropertyKey[], why: string) => Error;
};

/**
 * Reads YAML that people edit, and says where it is wrong.
 * @param path as it should stand in an error, such as content/species/ficus-carica.yaml
 * @throws Error `path:line: field what is wrong`
 */
export function readYaml<T>(path: string, text: string, schema: z.ZodType<T>): ReadYaml<T> {
  const lines = new LineCounter();
  const document = parseDocument(text, { lineCounter: lines });
  const broken = document.errors[0];
  if (broken) {
    const line = lines.linePos(broken.pos[0]).line;
    throw new Error(`${path}:${line}: is not valid YAML: ${broken.message.split('\n')[0]}`);
  }
  const fail = (field: readonly PropertyKey[], why: string) =>
    new Error(
      `${path}:${lineOf(document, field, lines)}: ${[field.join('.'), why].filter(Boolean).join(' ')}`,
    );
  const parsed = schema.safeParse(document.toJS());
  if (parsed.success) return { data: parsed.data, fail };
  const issue = parsed.error.issues[0] as z.core.$ZodIssue;
  throw fail(issue.path, said(issue, document.hasIn(issue.path)));
}

/** The same for a file of content/, read from the folder that the commands run in. */
export function readContent<T>(path: string, schema: z.ZodType<T>): T {
  return readYaml(path, readFileSync(join(process.cwd(), path), 'utf8'), schema).data;
}

/** The line of a field, or of the nearest one around it that is there. */
function lineOf(document: Document, path: readonly PropertyKey[], lines: LineCounter): number {
  for (let depth = path.length; depth > 0; depth -= 1) {
    const node: unknown = document.getIn(path.slice(0, depth), true);
    if (isNode(node) && node.range) return lines.linePos(node.range[0]).line;
  }
  return 1;
}

function said(issue: z.core.$ZodIssue, isThere: boolean): string {
  if (issue.code === 'unrecognized_keys') return `holds ${issue.keys.join(', ')}, which is no field here`;
  return isThere ? issue.message : 'is missing';
}
