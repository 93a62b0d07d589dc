'use client';

import dynamic from 'next/dynamic';
import type { EntryEditorProps } from './EntryEditor';

/** Opens the editor in the browser alone: it begins with what the device still holds. */
export const EditorLoader = dynamic<EntryEditorProps>(() => import('./EntryEditor'), {
  ssr: false,
  loading: () => <p className="min-h-screen text-soft">Opening the editor…</p>,
});
