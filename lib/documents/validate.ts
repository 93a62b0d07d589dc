import type { FieldError } from '@/lib/errors/errors';
import { isSafeLink } from './links';
import { MARKS, MOST_BYTES, MOST_DEPTH, MOST_NODES, NODES, TOP } from './schema';

/** Enough to mend a document by; a hostile one is not answered line by line. */
const MOST_ERRORS = 20;

type Json = Record<string, unknown>;
type Groups = typeof TOP;

/**
 * What is wrong with a document, as paths and words; empty where it may be stored and rendered. Any JSON value may come in.
 * @param path where the document stands in its body.
 */
export function validateDocument(value: unknown, path = 'doc'): FieldError[] {
  if (!isObject(value) || value.type !== 'doc') {
    return [{ path, message: 'must be a document: an object of type doc' }];
  }
  const check = new Check();
  check.keys(value, ['type', 'content'], path);
  check.children(value.content, TOP, path, 1);
  if (check.errors.length === 0 && new TextEncoder().encode(JSON.stringify(value)).length > MOST_BYTES) {
    check.say(path, `is over ${MOST_BYTES / 1000} kB; shorten the prose`);
  }
  return check.errors;
}

class Check {
  readonly errors: FieldError[] = [];
  private nodes = 0;
  private cuts = 0;
  private readonly readings = new Set<string>();

  say(path: string, message: string): void {
    if (this.errors.length < MOST_ERRORS) this.errors.push({ path, message });
  }

  keys(object: Json, allowed: readonly string[], path: string): void {
    for (const key of Object.keys(object)) {
      if (!allowed.includes(key)) this.say(`${path}.${key.slice(0, 40)}`, 'is not a part of a document');
    }
  }

  children(content: unknown, groups: Groups, path: string, depth: number): void {
    if (content === undefined) return;
    if (!Array.isArray(content)) return this.say(`${path}.content`, 'must be a list');
    for (const [index, child] of content.entries()) {
      if (this.errors.length >= MOST_ERRORS) return;
      this.node(child, groups, `${path}.content.${index}`, depth);
    }
  }

  private node(node: unknown, groups: Groups, path: string, depth: number): void {
    if (++this.nodes > MOST_NODES) {
      if (this.nodes === MOST_NODES + 1)
        this.say(path, `is one part too many: at most ${MOST_NODES} in a document`);
      return;
    }
    if (!isObject(node) || typeof node.type !== 'string')
      return this.say(path, 'must be an object with a type');
    const rule = NODES.get(node.type);
    if (!rule) return this.say(path, `has a type that is not known here: ${node.type.slice(0, 40)}`);
    if (!groups.includes(rule.group)) return this.say(path, `a ${node.type} cannot stand here`);
    if (depth > MOST_DEPTH) return this.say(path, `is nested deeper than ${MOST_DEPTH} levels`);

    this.nodeKeys(node, rule.group === 'inline', path);
    this.attrs(node.attrs, rule, path);
    if (node.type === 'text') this.text(node.text, path);
    if (rule.group === 'inline') this.marks(node.marks, path);
    if (node.type === 'cut' && ++this.cuts > 1) this.say(path, 'is a second cut block: an entry has one cut');
    if (node.type === 'reading') this.once(node.attrs, path);
    if (!rule.holds) return;
    const content = node.content;
    if (rule.needsContent && !(Array.isArray(content) && content.length > 0)) {
      return this.say(path, `a ${node.type} must hold something`);
    }
    const first: unknown = Array.isArray(content) ? content[0] : undefined;
    if (rule.first && isObject(first) && first.type !== rule.first) {
      this.say(`${path}.content.0`, `a ${node.type} begins with a ${rule.first}`);
    }
    this.children(content, rule.holds, path, depth + 1);
  }

  private nodeKeys(node: Json, inline: boolean, path: string): void {
    const keys = ['type', 'attrs'];
    if (inline) keys.push('marks');
    if (node.type === 'text') keys.push('text');
    else if (NODES.get(node.type as string)?.holds) keys.push('content');
    this.keys(node, keys, path);
  }

  private attrs(attrs: unknown, rule: NonNullable<ReturnType<typeof NODES.get>>, path: string): void {
    const known = rule.attrs ?? {};
    if (attrs !== undefined && !isObject(attrs)) return this.say(`${path}.attrs`, 'must be an object');
    for (const [name, value] of Object.entries(attrs ?? {})) {
      const accepts = Object.hasOwn(known, name) ? known[name] : undefined;
      if (!accepts) this.say(`${path}.attrs.${name.slice(0, 40)}`, 'is not known here');
      else if (!accepts(value)) this.say(`${path}.attrs.${name}`, 'cannot be that');
    }
    for (const name of rule.needs ?? []) {
      if (!attrs || !Object.hasOwn(attrs, name)) this.say(`${path}.attrs.${name}`, 'is missing');
    }
  }

  private text(text: unknown, path: string): void {
    if (typeof text !== 'string' || text === '') this.say(`${path}.text`, 'must be text, and not empty');
  }

  private marks(marks: unknown, path: string): void {
    if (marks === undefined) return;
    if (!Array.isArray(marks)) return this.say(`${path}.marks`, 'must be a list');
    const seen = new Set<unknown>();
    for (const [index, mark] of marks.entries()) {
      const at = `${path}.marks.${index}`;
      if (index >= MARKS.size) return this.say(at, 'is one mark too many');
      const attrs = isObject(mark) && typeof mark.type === 'string' ? MARKS.get(mark.type) : undefined;
      if (!isObject(mark) || !attrs) {
        this.say(at, 'must be bold, italic or a link');
        continue;
      }
      if (seen.has(mark.type)) this.say(at, 'stands here twice');
      seen.add(mark.type);
      this.mark(mark, attrs, at);
    }
  }

  private mark(mark: Json, known: readonly string[], path: string): void {
    this.keys(mark, ['type', 'attrs'], path);
    if (mark.attrs !== undefined && !isObject(mark.attrs))
      return this.say(`${path}.attrs`, 'must be an object');
    const attrs = mark.attrs ?? {};
    this.keys(attrs, known, `${path}.attrs`);
    if (mark.type === 'link' && !isSafeLink(attrs.href)) {
      this.say(`${path}.attrs.href`, 'must be an address that begins with https:, http: or mailto:');
    }
  }

  private once(attrs: unknown, path: string): void {
    if (!isObject(attrs) || typeof attrs.id !== 'string') return;
    const id = attrs.id.toLowerCase();
    if (this.readings.has(id)) this.say(path, 'is a reading that stands in the document twice');
    this.readings.add(id);
  }
}

function isObject(value: unknown): value is Json {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
