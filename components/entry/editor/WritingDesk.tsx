'use client';

import { EditorContent, useEditorState, type Editor } from '@tiptap/react';
import { useEffect, useMemo, useSyncExternalStore } from 'react';
import type { EntryView } from '@/lib/entries/schema';
import type { Units } from '@/lib/units/units';
import { ConflictView } from './ConflictView';
import { EditorContext, useForm } from './editor-context';
import { TextField } from './fields';
import { focusSoon } from './focus';
import type { LocalCopies } from './local-copy';
import { PlaceFields, type OrchardChoice } from './PlaceFields';
import { Readings } from './Readings';
import { SaveBadge } from './SaveBadge';
import { SendButtons } from './SendButtons';
import type { Session } from './session';
import type { SpeciesChoice } from './SpeciesBox';
import { Toolbar } from './Toolbar';
import type { Desk } from './desk';
import { useDesk } from './use-desk';

interface Props {
  readonly session: Session;
  readonly copies: LocalCopies;
  readonly species: readonly SpeciesChoice[];
  readonly orchards: readonly OrchardChoice[];
  readonly units: Units;
  readonly onTakeTheirs: (view: EntryView) => void;
  readonly onStartAnother: () => void;
}

/** One opening of the editor: the fields, the prose with its blocks, and where it all is kept. */
export function WritingDesk({
  session,
  copies,
  species,
  orchards,
  units,
  onTakeTheirs,
  onStartAnother,
}: Props) {
  const { desk, editor } = useDesk(session, copies, units);
  const { store, saver } = desk;
  const parts = useMemo(() => ({ store, saver, units }), [store, saver, units]);
  const revision = useSyncExternalStore(saver.subscribe, () => saver.state().revision);
  const theirs = useSyncExternalStore(saver.subscribe, () => saver.state().theirs);
  useEffect(() => {
    // A new entry that now exists has its own address: a reload opens it again.
    const address = `/entries/${session.id}/edit`;
    if (revision !== null && window.location.pathname === '/entries/new') {
      window.history.replaceState(null, '', address);
    }
  }, [revision, session.id]);
  const nameOf = (id: string) =>
    species.find(({ slug }) => slug === id)?.name ??
    orchards
      .flatMap((orchard) => [{ id: orchard.id, name: orchard.name }, ...orchard.trees.map(named)])
      .find((one) => one.id === id)?.name ??
    'one that is not known here';
  return (
    <EditorContext.Provider value={parts}>
      <form
        noValidate
        className="max-w-measure"
        onSubmit={(event) => event.preventDefault()}
        onBlur={() => void saveOnLeaving(desk)}
      >
        <TitleField />
        <SaveBadge saver={saver} />
        {session.isRestored && (
          <p className="text-note">
            Opened with what this device had kept and not yet sent.
            {session.revision === null && (
              <button type="button" className="min-h-finger px-2 underline" onClick={onStartAnother}>
                Begin another instead
              </button>
            )}
          </p>
        )}
        {theirs && (
          <ConflictView
            mine={desk.write(session.base).content}
            theirs={theirs}
            names={{ units, nameOf }}
            onKeepMine={() => {
              void saver.keepMine();
              focusSoon('title');
            }}
            onTakeTheirs={() => {
              const view = saver.takeTheirs();
              if (view) onTakeTheirs(view);
            }}
          />
        )}
        <PlaceFields species={species} orchards={orchards} />
        <div className="prose-frame" id="field-doc">
          {editor && <Toolbar editor={editor} />}
          <p id="prose-keys" className="sr-only">
            Tab goes on into the fields of the cut and of each reading. Escape leads from them back to the
            prose.
          </p>
          <EditorContent editor={editor} />
        </div>
        {editor && <Ending desk={desk} editor={editor} status={session.status} />}
      </form>
    </EditorContext.Provider>
  );
}

/** What follows the prose and has to know which readings stand in it. */
function Ending({ desk, editor, status }: { desk: Desk; editor: Editor; status: Session['status'] }) {
  const inDocument = useEditorState({ editor, selector: () => desk.readingIds().join(' ') });
  const ids = inDocument === '' ? [] : inDocument.split(' ');
  return (
    <>
      <Readings desk={desk} editor={editor} inDocument={ids} />
      <SendButtons desk={desk} status={status} />
    </>
  );
}

function TitleField() {
  const title = useForm((form) => form.title);
  return (
    <EditorContext.Consumer>
      {(parts) => (
        <TextField
          path="title"
          label="Title"
          maxLength={200}
          inputClassName="title-field"
          placeholder="Which tree, and where"
          value={title}
          onChange={(next) => parts?.store.set({ title: next })}
        />
      )}
    </EditorContext.Consumer>
  );
}

function named({ id, label }: { id: string; label: string }) {
  return { id, name: label };
}

function saveOnLeaving({ saver }: Desk): Promise<boolean> | null {
  return saver.state().phase === 'changed' ? saver.flush() : null;
}
