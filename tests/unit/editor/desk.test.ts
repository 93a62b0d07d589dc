// @vitest-environment jsdom
import { Editor } from '@tiptap/core';
import { UndoRedo } from '@tiptap/extensions';
import { afterEach, describe, expect, it } from 'vitest';
import { editable, trimmed, withoutReadings } from '@/components/entry/editor/document';
import { formFrom, type CutForm } from '@/components/entry/editor/form';
import { FormStore } from '@/components/entry/editor/form-store';
import { guard } from '@/components/entry/editor/guard';
import { stillLacking } from '@/components/entry/editor/paths';
import { CutBlock, PROSE, ReadingBlock } from '@/lib/documents/extensions';
import { validateDocument } from '@/lib/documents/validate';
import { content, cut, OTHER_READING, reading, READING } from './factories';

const paragraph = (text?: string) => ({
  type: 'paragraph',
  ...(text ? { content: [{ type: 'text', text }] } : {}),
});
const CUT = { type: 'cut' };
const block = (id: string) => ({ type: 'reading', attrs: { id } });
const types = (doc: { content?: readonly { type?: string }[] }) =>
  (doc.content ?? []).map(({ type }) => type);

describe('the document as it is written in', () => {
  it('has its cut, every reading, and a line before and after them', () => {
    const doc = editable({ type: 'doc', content: [block(READING)] }, [READING, OTHER_READING]);
    expect(doc.content).toEqual([paragraph(), block(READING), CUT, block(OTHER_READING), paragraph()]);
  });

  it('is stored without the lines that only hold the caret, and opens again as it was', () => {
    const doc = editable({ type: 'doc', content: [] }, [READING]);
    const stored = trimmed(doc);
    expect(stored.content).toEqual([CUT, block(READING)]);
    expect(editable(stored, [READING])).toEqual(doc);
    expect(validateDocument(stored)).toEqual([]);
  });

  it('without some of its readings is what it was before they came', () => {
    const doc = trimmed(editable({ type: 'doc', content: [paragraph('x')] }, [READING, OTHER_READING]));
    expect(withoutReadings(doc, [OTHER_READING]).content).toEqual([paragraph('x'), CUT, block(READING)]);
  });
});

describe('whatever is done to the prose', () => {
  let editor: Editor | null = null;
  afterEach(() => editor?.destroy());

  function open(...nodes: object[]): Editor {
    editor = new Editor({
      extensions: [...PROSE, CutBlock, ReadingBlock, UndoRedo, guard((id) => id === READING)],
      content: { type: 'doc', content: nodes },
      injectCSS: false,
    });
    return editor;
  }

  it('deleting all of it leaves the cut and a line to write in, and undo brings everything back', () => {
    const desk = open(paragraph('before'), CUT, block(READING), paragraph('after'));
    desk.chain().selectAll().deleteSelection().run();
    expect(types(desk.getJSON())).toContain('cut');
    expect(types(desk.getJSON())).not.toContain('reading');
    expect(types(desk.getJSON()).at(-1)).toBe('paragraph');
    desk.commands.undo();
    expect(desk.getJSON().content).toEqual([paragraph('before'), CUT, block(READING), paragraph('after')]);
  });

  it('a cut that was deleted stands again where it stood', () => {
    const desk = open(paragraph('before'), CUT, paragraph('after'));
    desk.chain().setNodeSelection(8).deleteSelection().run();
    expect(desk.getJSON().content).toEqual([paragraph('before'), CUT, paragraph('after')]);
  });

  it('a second cut, a reading twice and another entry’s reading do not come in by pasting', () => {
    const desk = open(paragraph('before'), CUT, block(READING), paragraph());
    desk.commands.insertContentAt(0, [CUT, block(READING), block(OTHER_READING), paragraph('pasted')]);
    expect(types(desk.getJSON()).filter((type) => type === 'cut')).toHaveLength(1);
    expect(types(desk.getJSON()).filter((type) => type === 'reading')).toHaveLength(1);
    expect(desk.getText()).toContain('pasted');
    expect(validateDocument(desk.getJSON())).toEqual([]);
  });

  it('a line of prose follows the last block', () => {
    const desk = open(paragraph('before'), CUT, paragraph('x'));
    desk.commands.insertContentAt(desk.state.doc.content.size, block(READING));
    expect(types(desk.getJSON())).toEqual(['paragraph', 'cut', 'paragraph', 'reading', 'paragraph']);
  });

  it('Tab is not taken by a list: it leaves the prose as it leaves a field', () => {
    const item = { type: 'listItem', content: [paragraph('one')] };
    const desk = open({ type: 'bulletList', content: [item, item] }, CUT, paragraph());
    desk.commands.setTextSelection(12);
    const tab = new KeyboardEvent('keydown', { key: 'Tab', bubbles: true, cancelable: true });
    desk.view.dom.dispatchEvent(tab);
    expect(tab.defaultPrevented).toBe(false);
  });
});

describe('what stands in the fields', () => {
  function store(change: Partial<EntryCut> = {}) {
    const typed: number[] = [];
    const held = new FormStore(formFrom(content({ cut: cut(change) }), 'metric'), 'metric', () =>
      typed.push(1),
    );
    return { held, typed, cutAfter: (next: Partial<CutForm>) => (held.setCut(next), held.get().cut) };
  }
  type EntryCut = ReturnType<typeof cut>;

  it('two lengths say how deep the cut went, to six decimals', () => {
    const { cutAfter } = store({ tip: 'removed' });
    expect(cutAfter({ removedLength: '1' }).severity).toBeNull();
    expect(cutAfter({ retainedLength: '2 m' }).severity).toBe(0.333333);
  });

  it('they say nothing with the tip kept, of an uncut branch, or half typed', () => {
    const lengths = { removedLength: '1', retainedLength: '2' };
    expect(store({ tip: 'kept', severity: 0.2 }).cutAfter(lengths).severity).toBe(0.2);
    expect(store({ kind: 'none' }).cutAfter(lengths).severity).toBeNull();
    expect(store().cutAfter({ removedLength: '1', retainedLength: 'two' }).severity).toBeNull();
  });

  it('a length that is measured takes the place of a class that was guessed', () => {
    const { cutAfter } = store({ severity: 0.75, severityEstimated: true });
    expect(cutAfter({ removedLength: '1', retainedLength: '3' })).toMatchObject({
      severity: 0.25,
      severityEstimated: false,
    });
  });

  it('tells its listeners and its keeper of every change, and forgets no reading', () => {
    const { held, typed } = store();
    let heard = 0;
    const stop = held.subscribe(() => (heard += 1));
    held.setReading(READING, { counts: '7 9' });
    held.setReading(READING, { date: '2026-04-28' });
    stop();
    held.set({ title: 'x' });
    expect([heard, typed.length]).toEqual([2, 3]);
    expect(held.get().readings[READING]).toMatchObject({ counts: '7 9', date: '2026-04-28' });
  });
});

describe('what the bench still needs', () => {
  it('goes, line by line, as it is filled in', () => {
    const asked = [
      'species',
      'place.sun',
      'cut.tip',
      'readings',
      `readings.${READING}.counts`,
      `readings.${READING}.date`,
    ];
    const lacks = asked.map((path) => ({ path, message: 'is needed' }));
    const left = (change: Parameters<typeof content>[0]) =>
      stillLacking(lacks, content(change)).map(({ path }) => path);
    expect(left({})).toEqual(['species', 'place.sun', 'cut.tip', 'readings']);
    expect(left({ species: 'ficus-carica', cut: cut({ tip: 'kept' }) })).toEqual(['place.sun', 'readings']);
    const open = reading({ counts: null, date: null });
    expect(left({ readings: [open] })).toEqual(['species', 'place.sun', 'cut.tip', ...asked.slice(4)]);
    expect(left({ readings: [{ ...open, total: 3, branches: 1 }] })).not.toContain(asked[4]);
  });
});
