import type { EntryContent } from '@/lib/entries/schema';
import type { EntryForm } from './form';

/** What is kept on the device until the server has it: the fields as typed, and the document. */
export interface LocalCopy {
  readonly version: 1;
  /** When it was written, in milliseconds since 1970. */
  readonly at: number;
  /** The stored revision it was written over; null where none was made yet. */
  readonly revision: number | null;
  readonly form: EntryForm;
  readonly doc: Record<string, unknown>;
  readonly content: EntryContent;
  /** What was sent and not answered yet. */
  readonly sent: readonly EntryContent[];
}

export interface LocalCopies {
  read(entryId: string): LocalCopy | null;
  /** Whether it is really on the device now. */
  write(entryId: string, copy: LocalCopy): boolean;
  remove(entryId: string): void;
  /** The newest entry of this person that no server has heard of. */
  newestUnmade(): string | null;
}

const ROOT = 'aftercut:entry:';

/** Copies of one person's entries in the browser's storage; a full or forbidden storage is told, never thrown. */
export function localCopies(personId: string, storage: Storage | null): LocalCopies {
  const prefix = `${ROOT}${personId}:`;
  const read = (entryId: string): LocalCopy | null => {
    try {
      const copy: unknown = JSON.parse(storage?.getItem(prefix + entryId) ?? 'null');
      return isCopy(copy) ? copy : null;
    } catch {
      return null;
    }
  };
  return {
    read,
    write(entryId, copy) {
      try {
        const text = JSON.stringify(copy);
        storage?.setItem(prefix + entryId, text);
        return storage?.getItem(prefix + entryId) === text;
      } catch {
        return false;
      }
    },
    remove(entryId) {
      try {
        storage?.removeItem(prefix + entryId);
      } catch {
        // A storage that cannot be reached holds nothing of ours either.
      }
    },
    newestUnmade() {
      const unmade = keys(storage)
        .filter((key) => key.startsWith(prefix))
        .map((key) => ({ id: key.slice(prefix.length), copy: read(key.slice(prefix.length)) }))
        .filter(({ copy }) => copy?.revision === null)
        .sort((a, b) => (b.copy?.at ?? 0) - (a.copy?.at ?? 0));
      return unmade[0]?.id ?? null;
    },
  };
}

/** The browser's storage, or null where the browser forbids it. */
export function deviceStorage(): Storage | null {
  try {
    return window.localStorage;
  } catch {
    return null;
  }
}

function keys(storage: Storage | null): string[] {
  try {
    return Array.from({ length: storage?.length ?? 0 }, (_, index) => storage?.key(index) ?? '');
  } catch {
    return [];
  }
}

function isCopy(value: unknown): value is LocalCopy {
  return typeof value === 'object' && value !== null && (value as LocalCopy).version === 1;
}
