import { createContext, useContext, useSyncExternalStore } from 'react';
import type { FieldError } from '@/lib/errors/errors';
import type { Units } from '@/lib/units/units';
import { EMPTY_READING, type CutForm, type EntryForm, type ReadingForm } from './form';
import type { FormStore } from './form-store';
import { fieldOf } from './paths';
import type { Saver } from './save';

export interface EditorParts {
  readonly store: FormStore;
  readonly saver: Saver;
  readonly units: Units;
}

export const EditorContext = createContext<EditorParts | null>(null);

export function useEditorParts(): EditorParts {
  const parts = useContext(EditorContext);
  if (!parts) throw new Error('a field of the entry editor stands outside of it');
  return parts;
}

export function useForm<T>(pick: (form: EntryForm) => T): T {
  const { store } = useEditorParts();
  return useSyncExternalStore(store.subscribe, () => pick(store.get()));
}

export const useCut = (): CutForm => useForm((form) => form.cut);

export const useReading = (id: string): ReadingForm => useForm((form) => form.readings[id] ?? EMPTY_READING);

export interface FieldMessage {
  readonly message: string;
  /** Found while typing, and shown once the field is left; the server's word is shown at once. */
  readonly isProvisional: boolean;
}

/** What is wrong with a field, if anything. */
export function useMessage(path: string): FieldMessage | null {
  const { saver } = useEditorParts();
  const state = useSyncExternalStore(saver.subscribe, saver.state);
  const at = (errors: readonly FieldError[]) => errors.find((error) => fieldOf(error.path) === path)?.message;
  const problem = at(state.problems);
  if (problem) return { message: problem, isProvisional: true };
  const error = at(state.errors) ?? at(state.lacks);
  return error ? { message: sentence(error), isProvisional: false } : null;
}

/** The server writes what follows a field's name ("is needed"); beside the field it stands by itself. */
function sentence(message: string): string {
  const capital = message.charAt(0).toUpperCase() + message.slice(1);
  return /[.!?]$/.test(capital) ? capital : `${capital}.`;
}
