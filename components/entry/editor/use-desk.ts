import { useEditor, type Editor } from '@tiptap/react';
import { Gapcursor, UndoRedo } from '@tiptap/extensions';
import { useEffect, useState } from 'react';
import { PROSE } from '@/lib/documents/extensions';
import type { Units } from '@/lib/units/units';
import { EditableCut, EditableReading } from './blocks';
import { Desk } from './desk';
import { guard } from './guard';
import type { LocalCopies } from './local-copy';
import type { Saver } from './save';
import type { Session } from './session';

const LABEL = {
  role: 'textbox',
  'aria-multiline': 'true',
  'aria-label': 'The record: prose, with the cut and its readings in it',
  'aria-describedby': 'prose-keys',
  class: 'prose-record',
};

export function useDesk(
  session: Session,
  copies: LocalCopies,
  units: Units,
): { desk: Desk; editor: Editor | null } {
  const [desk] = useState(() => new Desk(session, copies, units));
  const editor = useEditor({
    immediatelyRender: false,
    injectCSS: false,
    shouldRerenderOnTransaction: false,
    extensions: [
      ...PROSE,
      EditableCut,
      EditableReading,
      Gapcursor,
      UndoRedo,
      guard((id) => desk.store.get().readings[id] !== undefined),
    ],
    content: session.doc,
    editorProps: { attributes: LABEL },
    onCreate: ({ editor: made }) => desk.attach(made),
    onUpdate: () => desk.saver.touch(),
    onDestroy: () => desk.detach(),
  });
  useEffect(() => () => desk.saver.stop(), [desk]);
  useSafeLeaving(desk.saver);
  return { desk, editor };
}

/** Sends what is unsent as the page is left or hidden, and as a signal or a sign-in comes back. */
function useSafeLeaving(saver: Saver): void {
  useEffect(() => {
    const hidden = () => {
      if (document.visibilityState === 'hidden') void saver.flush({ keepalive: true });
      else again();
    };
    const again = () => {
      const { phase } = saver.state();
      if (phase === 'waiting' || phase === 'signed-out') void saver.flush();
    };
    const warn = (event: BeforeUnloadEvent) => {
      const { phase, onDevice } = saver.state();
      if (phase !== 'saved' && !onDevice) event.preventDefault();
    };
    document.addEventListener('visibilitychange', hidden);
    window.addEventListener('online', again);
    window.addEventListener('focus', again);
    window.addEventListener('beforeunload', warn);
    return () => {
      document.removeEventListener('visibilitychange', hidden);
      window.removeEventListener('online', again);
      window.removeEventListener('focus', again);
      window.removeEventListener('beforeunload', warn);
    };
  }, [saver]);
}
