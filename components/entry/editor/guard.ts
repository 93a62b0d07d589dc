import { Extension } from '@tiptap/core';
import { Plugin, type Transaction } from '@tiptap/pm/state';
import type { Node as ProseNode } from '@tiptap/pm/model';
import { Mapping } from '@tiptap/pm/transform';

/**
 * Keeps a document one that an entry can have, whatever is typed, pasted or deleted: its cut stands in it once, a reading
 * once and only if this entry has it, and a line of prose follows the last block. What it mends is undone with its cause.
 */
export function guard(knowsReading: (id: string) => boolean): Extension {
  return Extension.create({
    name: 'guard',
    addProseMirrorPlugins: () => [
      new Plugin({
        appendTransaction(transactions, before, after) {
          if (!transactions.some((transaction) => transaction.docChanged)) return null;
          const { tr } = after;
          dropStrangers(tr, knowsReading);
          restoreCut(tr, before.doc, transactions);
          const { lastChild } = tr.doc;
          if (lastChild && !lastChild.isTextblock) {
            tr.insert(tr.doc.content.size, after.schema.node('paragraph'));
          }
          return tr.docChanged ? tr : null;
        },
      }),
    ],
  });
}

function dropStrangers(tr: Transaction, knowsReading: (id: string) => boolean): void {
  const seen = new Set<string>();
  const strangers: { from: number; to: number }[] = [];
  tr.doc.forEach((node, offset) => {
    if (node.type.spec.group !== 'record') return;
    const key = node.type.name === 'cut' ? 'cut' : String(node.attrs.id);
    if (seen.has(key) || (key !== 'cut' && !knowsReading(key))) {
      strangers.push({ from: offset, to: offset + node.nodeSize });
    }
    seen.add(key);
  });
  for (const { from, to } of strangers.reverse()) tr.delete(from, to);
}

function restoreCut(tr: Transaction, before: ProseNode, transactions: readonly Transaction[]): void {
  const type = tr.doc.type.schema.nodes.cut;
  if (!type || cutAt(tr.doc) !== null) return;
  const was = cutAt(before);
  const mapping = new Mapping([...transactions.flatMap(({ mapping: own }) => own.maps), ...tr.mapping.maps]);
  const near = Math.min(was === null ? 0 : mapping.map(was), tr.doc.content.size);
  const resolved = tr.doc.resolve(near);
  tr.insert(resolved.depth === 0 ? near : resolved.after(1), type.create());
}

function cutAt(doc: ProseNode): number | null {
  let found: number | null = null;
  doc.forEach((node, offset) => {
    if (node.type.name === 'cut') found ??= offset;
  });
  return found;
}
