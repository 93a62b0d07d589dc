'use client';

import { getSchema } from '@tiptap/core';
import { useMemo, useState } from 'react';
import { v7 } from 'uuid';
import { CutBlock, PROSE, ReadingBlock } from '@/lib/documents/extensions';
import { SCHEMA_VERSION } from '@/lib/documents/schema';
import type { EntryView } from '@/lib/entries/schema';
import type { Units } from '@/lib/units/units';
import { EMPTY_CONTENT } from './content';
import { deviceStorage, localCopies } from './local-copy';
import { focusSoon } from './focus';
import type { OrchardChoice } from './PlaceFields';
import { editable } from './document';
import { empty, fromView, openNew, openStored, type Session } from './session';
import type { SpeciesChoice } from './SpeciesBox';
import { WritingDesk } from './WritingDesk';
import '../prose.css';
import './editor.css';

export interface EntryEditorProps {
  /** Who writes: copies on the device are kept apart by person. */
  readonly person: string;
  /** The stored entry; null for a new one. */
  readonly entry: EntryView | null;
  /** An orchard and a tree that a new entry begins with. */
  readonly start?: { readonly orchard?: string; readonly tree?: string };
  readonly species: readonly SpeciesChoice[];
  readonly orchards: readonly OrchardChoice[];
  readonly units: Units;
}

/** The editor of an entry. Runs in the browser alone, for it opens with what the device still holds. */
export default function EntryEditor({ person, entry, start, species, orchards, units }: EntryEditorProps) {
  const copies = useMemo(() => localCopies(person, deviceStorage()), [person]);
  const [session, setSession] = useState<Session>(() =>
    entry ? openStored(entry, copies, units) : openNew(v7(), startOf(start, orchards), copies, units),
  );
  const [opened, setOpened] = useState(0);
  const [isReadable] = useState(() => entry === null || loads(entry));
  const reopen = (next: Session) => {
    setSession(next);
    setOpened((times) => times + 1);
    focusSoon('title');
  };
  if (!isReadable) {
    return (
      <p role="alert">
        This record was written with another version of this page, which cannot show all of it, so nothing may
        be changed here. Reload the page to get the newer version. Nothing was changed.
      </p>
    );
  }
  return (
    <WritingDesk
      key={opened}
      session={session}
      copies={copies}
      species={species}
      orchards={orchards}
      units={units}
      onTakeTheirs={(view) => reopen(fromView(view, units))}
      onStartAnother={() => reopen(empty(v7(), startOf(start, orchards), units))}
    />
  );
}

/** A document that this editor would empty on opening is not opened, lest it be saved so. */
function loads({ doc, schemaVersion }: EntryView): boolean {
  if (schemaVersion !== SCHEMA_VERSION) return false;
  try {
    getSchema([...PROSE, CutBlock, ReadingBlock])
      .nodeFromJSON(editable(doc, []))
      .check();
    return true;
  } catch {
    return false;
  }
}

/** A grower with one orchard means that one; an orchard brings its place, a tree its species. */
function startOf(start: EntryEditorProps['start'], orchards: readonly OrchardChoice[]): typeof EMPTY_CONTENT {
  const orchard =
    orchards.find(({ id }) => id === start?.orchard) ?? (orchards.length === 1 ? orchards[0] : undefined);
  const tree = orchard?.trees.find(({ id }) => id === start?.tree);
  if (!orchard) return EMPTY_CONTENT;
  return {
    ...EMPTY_CONTENT,
    orchard: orchard.id,
    tree: tree?.id ?? null,
    species: tree?.species ?? null,
    cultivar: tree?.cultivar ?? null,
    place: { ...(orchard.place as typeof EMPTY_CONTENT.place), elevation: orchard.elevation },
  };
}
