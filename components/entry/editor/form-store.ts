import { severityFromLengths } from '@/lib/severity/severity';
import { lengthField, parseLength, type Units } from '@/lib/units/units';
import { EMPTY_READING, type CutForm, type EntryForm, type ReadingForm } from './form';

/** What stands in the fields, held apart from the document: blocks come and go in the prose, their values stay. */
export class FormStore {
  private form: EntryForm;
  private readonly listeners = new Set<() => void>();

  constructor(
    form: EntryForm,
    private readonly units: Units,
    /** Somebody typed something. */
    private readonly onTyped: () => void,
  ) {
    this.form = form;
  }

  readonly get = (): EntryForm => this.form;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  set(change: Partial<EntryForm>): void {
    this.form = { ...this.form, ...change };
    for (const listener of this.listeners) listener();
    this.onTyped();
  }

  setCut(change: Partial<CutForm>): void {
    this.set({ cut: withLengths({ ...this.form.cut, ...change }, change, this.units) });
  }

  /** A reading that was never met begins empty. */
  setReading(id: string, change: Partial<ReadingForm>): void {
    const reading = { ...(this.form.readings[id] ?? EMPTY_READING), ...change };
    this.set({ readings: { ...this.form.readings, [id]: reading } });
  }
}

/** Both lengths known, and the branch ends in the cut: then they say how deep it went. */
function withLengths(cut: CutForm, change: Partial<CutForm>, units: Units): CutForm {
  if (change.removedLength === undefined && change.retainedLength === undefined) return cut;
  const severity = severityByLengths(cut, units);
  return severity === null ? cut : { ...cut, severity, severityEstimated: false };
}

/** Severity as the lengths in the fields give it; null where they do not say, or with a tip kept, when they cannot. */
export function severityByLengths(cut: CutForm, units: Units): number | null {
  if (cut.tip === 'kept' || cut.kind === 'none') return null;
  const { unitM } = lengthField(units, 'long');
  const removed = parseLength(cut.removedLength, unitM);
  const retained = parseLength(cut.retainedLength, unitM);
  if (!removed.ok || !retained.ok || removed.metres === null || retained.metres === null) return null;
  return removed.metres + retained.metres > 0 ? severityFromLengths(removed.metres, retained.metres) : null;
}
