import type { SaveState } from './save';

export interface Badge {
  /** Drawn before the words as a shape, so that the colour is never alone. */
  readonly mark: 'done' | 'under-way' | 'device' | 'attention';
  readonly text: string;
}

/** Where what was typed really is, in words. */
export function badgeOf(state: SaveState): Badge {
  const { phase, onDevice } = state;
  const safe = onDevice ? 'Safe on this device' : 'Not saved anywhere yet: keep this page open';
  const fields = state.problems.length;
  switch (phase) {
    case 'saved':
      if (fields > 0)
        return attention(
          `All saved but ${fields === 1 ? '1 field that needs' : `${fields} fields that need`} a look.`,
        );
      return { mark: 'done', text: state.revision === null ? 'Nothing to save yet.' : 'All saved.' };
    case 'changed':
      return { mark: 'under-way', text: onDevice ? 'Safe on this device.' : 'Not saved yet.' };
    case 'saving':
      return { mark: 'under-way', text: 'Saving…' };
    case 'waiting':
      return onDevice
        ? { mark: 'device', text: 'Safe on this device. Going up when there is a signal.' }
        : attention(
            'Not saved yet: there is no signal, and this device cannot keep it. Keep this page open.',
          );
    case 'signed-out':
      return attention(`${safe}. You are signed out: sign in again in another tab, then come back here.`);
    case 'invalid':
      return attention(`Needs a look before it can be saved. ${safe}.`);
    case 'refused':
      return attention(`The server does not take this: ${state.detail ?? 'no reason was given'} ${safe}.`);
    case 'conflict':
      return attention(`Needs a look: this was also changed elsewhere. ${safe}, nothing was overwritten.`);
    case 'gone':
      return attention(`This was deleted elsewhere. ${safe}.`);
  }
}

function attention(text: string): Badge {
  return { mark: 'attention', text };
}
