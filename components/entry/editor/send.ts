import type { FieldError } from '@/lib/errors/errors';
import type { Saver } from './save';

export type Sending =
  | { readonly kind: 'sent' }
  | { readonly kind: 'stopped'; readonly title: string; readonly errors: readonly FieldError[] };

/** Saves what stands in the editor and sends it to the bench. Nothing is sent before all of it is saved. */
export async function send(saver: Saver): Promise<Sending> {
  saver.showLacks([]);
  const isSaved = await saver.flush();
  const { phase, problems, errors, detail, revision } = saver.state();
  if (!isSaved) {
    const found = [...problems, ...errors];
    if (found.length > 0) return stopped('This needs a look before it can go to the bench', found);
    if (phase === 'conflict') return stopped('Choose first which of the two versions stays');
    if (phase === 'signed-out')
      return stopped('You are signed out. Sign in again in another tab, then send it');
    if (phase === 'refused') return stopped(detail ?? 'The server does not take this');
    return stopped('It could not be saved just now, so it was not sent. Try again when there is a signal');
  }
  if (revision === null) return stopped('There is nothing in it yet');
  const outcome = await saver.submit();
  switch (outcome.kind) {
    case 'done':
      return { kind: 'sent' };
    case 'invalid':
      saver.showLacks(outcome.errors);
      return stopped('The bench needs more before it can read this', saver.state().lacks);
    case 'signed-out':
      return stopped('You are signed out. Sign in again in another tab, then send it');
    case 'refused':
      return stopped(outcome.detail);
    case 'gone':
      return stopped('This was deleted elsewhere');
    default:
      return stopped('It is saved, but the bench could not be reached. Try again in a moment');
  }
}

function stopped(title: string, errors: readonly FieldError[] = []): Sending {
  return { kind: 'stopped', title, errors };
}
