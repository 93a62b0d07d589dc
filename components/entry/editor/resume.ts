import type { EntryContent, EntryView } from '@/lib/entries/schema';
import { contentOf, sameContent } from './content';
import type { LocalCopy } from './local-copy';

/** How an entry opens: as stored, as left on this device, or with both before somebody who decides. */
export type Opening =
  | { readonly from: 'stored' }
  | { readonly from: 'device'; readonly copy: LocalCopy; readonly theirs: EntryView | null };

/**
 * Decides between what is stored and what this device kept and never got through.
 * @param view what is stored; null where the server has no such entry yet.
 */
export function openingOf(view: EntryView | null, copy: LocalCopy | null): Opening {
  if (!copy) return { from: 'stored' };
  if (!view) return { from: 'device', copy, theirs: null };
  const stored = contentOf(view);
  const is = (content: EntryContent) => sameContent(content, stored);
  // The fields may hold more than the content does: what could not be read as typed.
  if (copy.revision === view.revision) return { from: 'device', copy, theirs: null };
  if (is(copy.content)) return { from: 'stored' };
  return { from: 'device', copy, theirs: copy.sent.some(is) ? null : view };
}
