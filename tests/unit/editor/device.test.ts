import { describe, expect, it } from 'vitest';
import { differences } from '@/components/entry/editor/differences';
import { formFrom } from '@/components/entry/editor/form';
import { localCopies, type LocalCopy } from '@/components/entry/editor/local-copy';
import { fieldOf, withIds } from '@/components/entry/editor/paths';
import { openingOf } from '@/components/entry/editor/resume';
import { content, cut, ENTRY, OTHER_READING, reading, READING, viewOf } from './factories';

class Shelf implements Storage {
  private readonly held = new Map<string, string>();
  constructor(private readonly room = 1e6) {}
  get length() {
    return this.held.size;
  }
  key = (index: number) => [...this.held.keys()][index] ?? null;
  getItem = (key: string) => this.held.get(key) ?? null;
  removeItem = (key: string) => void this.held.delete(key);
  clear = () => this.held.clear();
  setItem = (key: string, value: string) => {
    if (value.length > this.room) throw new DOMException('full', 'QuotaExceededError');
    this.held.set(key, value);
  };
}

function copyOf(change: Partial<LocalCopy> = {}): LocalCopy {
  const kept = change.content ?? content({ title: 'Mine' });
  return {
    version: 1,
    at: 1,
    revision: 3,
    form: formFrom(kept, 'metric'),
    doc: kept.doc,
    content: kept,
    sent: [],
    ...change,
  };
}

describe('the copy on the device', () => {
  it('is one person’s and one entry’s', () => {
    const shelf = new Shelf();
    expect(localCopies('ines', shelf).write(ENTRY, copyOf())).toBe(true);
    expect(localCopies('ines', shelf).read(ENTRY)).toEqual(copyOf());
    expect(localCopies('tomas', shelf).read(ENTRY)).toBeNull();
    localCopies('ines', shelf).remove(ENTRY);
    expect(localCopies('ines', shelf).read(ENTRY)).toBeNull();
  });

  it('says so where the device is full, forbids it or holds rubbish, and throws nothing', () => {
    expect(localCopies('ines', new Shelf(10)).write(ENTRY, copyOf())).toBe(false);
    expect(localCopies('ines', null).write(ENTRY, copyOf())).toBe(false);
    expect(localCopies('ines', null).newestUnmade()).toBeNull();
    const shelf = new Shelf();
    shelf.setItem(`aftercut:entry:ines:${ENTRY}`, '{"version":');
    expect(localCopies('ines', shelf).read(ENTRY)).toBeNull();
  });

  it('finds the newest entry that no server has heard of', () => {
    const copies = localCopies('ines', new Shelf());
    copies.write('a', copyOf({ revision: null, at: 1 }));
    copies.write('b', copyOf({ revision: null, at: 9 }));
    copies.write('c', copyOf({ revision: 4, at: 20 }));
    expect(copies.newestUnmade()).toBe('b');
  });
});

describe('opening an entry', () => {
  const stored = content({ title: 'Stored' });

  it('without a copy on the device it is what is stored', () => {
    expect(openingOf(viewOf(stored, 3), null)).toEqual({ from: 'stored' });
  });

  it('a copy written over the same revision goes on', () => {
    const copy = copyOf();
    expect(openingOf(viewOf(stored, 3), copy)).toEqual({ from: 'device', copy, theirs: null });
  });

  it('a copy that arrived after all is done with', () => {
    expect(openingOf(viewOf(content({ title: 'Mine' }), 4), copyOf())).toEqual({ from: 'stored' });
  });

  it('a copy whose earlier half arrived goes on from there', () => {
    const copy = copyOf({ sent: [stored] });
    expect(openingOf(viewOf(stored, 4), copy)).toEqual({ from: 'device', copy, theirs: null });
  });

  it('a copy that the stored one moved away from shows both', () => {
    expect(openingOf(viewOf(stored, 4), copyOf())).toMatchObject({
      from: 'device',
      theirs: { title: 'Stored' },
    });
  });

  it('an entry that never reached a server opens from the device', () => {
    expect(openingOf(null, copyOf({ revision: null }))).toMatchObject({ from: 'device', theirs: null });
  });
});

describe('two versions side by side', () => {
  const names = { units: 'metric' as const, nameOf: (id: string) => (id === 'ficus-carica' ? 'fig' : id) };

  it('names every field that differs, in words and in the reader’s units', () => {
    const mine = content({
      species: 'ficus-carica',
      cut: cut({ severity: 0.4, removedLength: 1.2 }),
      readings: [reading({ longestShoot: 0.31 }), reading({ id: OTHER_READING, counts: [1] })],
      doc: { type: 'doc', content: [{ type: 'paragraph', content: [{ type: 'text', text: 'Mine' }] }] },
    });
    const theirs = content({
      cut: cut({ severity: 0.5, removedLength: 1.2 }),
      readings: [reading({ longestShoot: 0.4 })],
    });
    expect(differences(mine, theirs, names)).toEqual([
      { path: 'species', name: 'Species', mine: 'fig', theirs: 'not said' },
      { path: 'cut.severity', name: 'How much came off', mine: 'two fifths (0.4)', theirs: 'half (0.5)' },
      {
        path: `readings.${READING}.longestShoot`,
        name: 'Reading 1, longest shoot',
        mine: '31 cm',
        theirs: '40 cm',
      },
      {
        path: `readings.${OTHER_READING}`,
        name: 'Reading 2',
        mine: '28 April 2026, 1 (1 on 1 branch)',
        theirs: 'not there',
      },
      { path: 'doc', name: 'The prose', mine: 'Mine', theirs: 'empty' },
    ]);
  });

  it('finds none between a version and itself', () => {
    const same = content({ readings: [reading()] });
    expect(differences(same, same, names)).toEqual([]);
  });
});

describe('an error finds its field', () => {
  it('whichever way its path is written, by the reading’s id', () => {
    const sent = content({ readings: [reading({ id: OTHER_READING }), reading()] });
    const paths = [
      'readings.1.counts.2',
      'readings[1].counts[2]',
      '/readings/1/counts/2',
      'cut.tip',
      'readings',
    ];
    const found = withIds(
      paths.map((path) => ({ path, message: 'x' })),
      sent,
    ).map(({ path }) => fieldOf(path));
    const counts = `readings.${READING}.counts`;
    expect(found).toEqual([counts, counts, counts, 'cut.tip', 'readings']);
  });
});
