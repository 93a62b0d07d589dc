import { describe, expect, it } from 'vitest';
import { generateDemo } from '@/lib/demo/generate';
import { readHandwritten } from '@/lib/demo/handwritten';
import { RING_SPECIES } from '@/lib/demo/species';
import type { DemoEntry } from '@/lib/demo/types';
import { contradictions, lacks } from '@/lib/entries/consistency';
import { EntryBody } from '@/lib/entries/schema';
import { validateDocument } from '@/lib/documents/validate';

const TODAY = '2026-12-01';
const handwritten = readHandwritten();
const demo = generateDemo({ seed: 7, today: TODAY, handwritten });
const read = demo.entries.filter(({ content }) => content.readings.length > 0);
const personAt = (email: string) => demo.people.find((person) => person.email === email);
const of = (email: string) => demo.entries.filter(({ ownerId }) => ownerId === personAt(email)?.id);

function documentIds({ content }: DemoEntry): string[] {
  const nodes = content.doc.content as { type: string; attrs?: { id: string } }[];
  return nodes.flatMap(({ type, attrs }) => (type === 'reading' && attrs ? [attrs.id] : []));
}

describe('the demo is as large as it is said to be', () => {
  it('60 growers, 45 orchards, 40 species, 900 entries with 1 to 4 readings', () => {
    expect(demo.people.filter(({ role }) => role === 'grower')).toHaveLength(60);
    expect(demo.orchards).toHaveLength(45);
    expect(new Set(read.map(({ content }) => content.species)).size).toBe(40);
    expect(read).toHaveLength(900);
    expect(new Set(read.map(({ content }) => content.readings.length))).toEqual(new Set([1, 2, 3, 4]));
  });

  it('12 entries are written by hand, by eight or more growers', () => {
    const byHand = demo.entries.filter(({ origin }) => origin === 'handwritten');
    expect(byHand).toHaveLength(12);
    expect(new Set(byHand.map(({ ownerId }) => ownerId)).size).toBeGreaterThanOrEqual(8);
  });

  it('three wait on the bench, none of them the moderator\u2019s; most are accepted', () => {
    const waiting = demo.entries.filter(({ status }) => status === 'waiting');
    expect(waiting).toHaveLength(3);
    expect(of('moderator@aftercut.example')).toEqual([]);
    expect(demo.entries.filter(({ status }) => status === 'accepted').length).toBeGreaterThan(840);
    for (const status of ['withdrawn', 'returned', 'draft']) {
      expect(demo.entries.filter((entry) => entry.status === status).length, status).toBeGreaterThan(1);
    }
    for (const entry of demo.entries) expect(entry.returnedNote !== null).toBe(entry.status === 'returned');
  });

  it('the demo grower has drafts, one due today, one sent back, one with a change pending', () => {
    const own = of('grower@aftercut.example');
    const drafts = own.filter(({ status }) => status === 'draft');
    expect(drafts.length).toBeGreaterThanOrEqual(4);
    expect(drafts.some(({ content }) => content.cut.date === '2026-10-06')).toBe(true);
    expect(drafts.some(({ content }) => content.readings.length === 0)).toBe(true);
    expect(own.some(({ status }) => status === 'returned')).toBe(true);
    expect(own.filter(({ pending }) => pending !== null)).toHaveLength(1);
    expect(of('neighbour@aftercut.example').length).toBeGreaterThanOrEqual(5);
  });

  it('the helper helps in the demo grower\u2019s orchard and owns none', () => {
    const orchard = demo.orchards.find(({ ownerId }) => ownerId === personAt('grower@aftercut.example')?.id);
    const helper = personAt('helper@aftercut.example')?.id;
    expect(demo.members).toContainEqual(
      expect.objectContaining({ orchardId: orchard?.id, personId: helper }),
    );
    expect(demo.orchards.some(({ ownerId }) => ownerId === helper)).toBe(false);
    expect(of('grower@aftercut.example').some(({ readBy }) => readBy.includes(helper ?? ''))).toBe(true);
  });

  it('only the five can sign in', () => {
    expect(demo.people.filter(({ signsIn }) => signsIn).map(({ email }) => email.split('@')[0])).toEqual([
      'grower',
      'neighbour',
      'helper',
      'moderator',
      'admin',
    ]);
  });
});

describe('the same seed and day give the same demo', () => {
  it('to the last id', () => {
    expect(generateDemo({ seed: 7, today: TODAY, handwritten })).toEqual(demo);
  });

  it('and another seed another one', () => {
    const other = generateDemo({ seed: 8, today: TODAY, handwritten });
    expect(other.entries.map(({ id }) => id)).not.toEqual(demo.entries.map(({ id }) => id));
  });

  it('no id is given twice', () => {
    const ids = [
      ...[demo.people, demo.orchards, demo.trees, demo.entries].flatMap((some) => some.map(({ id }) => id)),
      ...demo.entries.flatMap(({ content }) => content.readings.map(({ id }) => id)),
    ];
    expect(new Set(ids).size).toBe(ids.length);
    expect(new Set(demo.people.map(({ name }) => name)).size).toBe(demo.people.length);
  });
});

describe.each([TODAY, '2027-02-28', '2028-02-29', '2026-06-15'])(
  'what the app asks of an entry holds on %s',
  (today) => {
    const { entries, orchards, trees } = generateDemo({ seed: 21, today, handwritten });
    const written = entries.flatMap((entry) => [entry.content, ...(entry.pending ? [entry.pending] : [])]);

    it('each is a valid body, unchanged by being read', () => {
      for (const content of written) expect(EntryBody.parse(content)).toEqual(content);
    });

    it('nothing contradicts itself, and what was sent for reading lacks nothing', () => {
      const now = new Date(`${today}T00:00:00Z`);
      for (const entry of entries) {
        expect(contradictions(entry.content, now), entry.content.title ?? '').toEqual([]);
        if (entry.status !== 'draft') expect(lacks(entry.content)).toEqual([]);
      }
    });

    it('documents are valid and place the cut and each reading once', () => {
      for (const entry of entries) {
        expect(validateDocument(entry.content.doc)).toEqual([]);
        expect(documentIds(entry).sort()).toEqual(entry.content.readings.map(({ id }) => id).sort());
        expect(JSON.stringify(entry.content.doc).split('"type":"cut"')).toHaveLength(2);
      }
    });

    it('nothing lies after the day, and cuts lie in its last two years', () => {
      const first = new Date(Date.parse(today) - 731 * 86_400_000).toISOString().slice(0, 10);
      for (const { content, createdAt, savedAt, acceptedAt } of entries) {
        expect((content.cut.date ?? '') >= first).toBe(true);
        for (const { date } of content.readings) expect((date ?? '9') <= today).toBe(true);
        for (const moment of [createdAt, savedAt, acceptedAt]) {
          expect(moment?.getTime() ?? 0).toBeLessThanOrEqual(Date.parse(today));
        }
      }
    });

    it('orchard and tree are the owner\u2019s own, and no title gives a tree\u2019s or an orchard\u2019s name away', () => {
      const byId = new Map(orchards.map((orchard) => [orchard.id, orchard]));
      const treeById = new Map(trees.map((tree) => [tree.id, tree]));
      for (const { content, ownerId } of entries) {
        const orchard = byId.get(content.orchard ?? '');
        const tree = treeById.get(content.tree ?? '');
        expect(orchard?.ownerId).toBe(ownerId);
        if (tree) expect(tree).toMatchObject({ orchardId: content.orchard, species: content.species });
        const told = `${content.title} ${JSON.stringify(content.doc)}`;
        expect(told).not.toContain(orchard?.name);
        if (tree) expect(told).not.toContain(tree.label);
      }
    });

    it('readings come in order of time, and shoots kept and removed add up to those counted', () => {
      for (const { content } of entries) {
        const dates = content.readings.map(({ date }) => date);
        expect(dates).toEqual([...dates].sort());
        for (const { counts, total, removed, kept } of content.readings) {
          const shoots = total ?? (counts ?? []).reduce<number>((sum, count) => sum + (count ?? 0), 0);
          if (removed !== null && kept !== null) expect(removed + kept).toBe(shoots);
        }
      }
    });
  },
);

describe('the record has the faults and the gaps a real one has', () => {
  const counted = read.flatMap(({ content }) => content.readings.flatMap(({ counts }) => counts ?? []));

  it('zeros, lost branches, totals, thinned branches, estimates, dates by the month, every kind of cut', () => {
    expect(counted.filter((count) => count === 0).length).toBeGreaterThan(100);
    expect(counted.filter((count) => count === null).length).toBeGreaterThan(20);
    const readings = read.flatMap(({ content }) => content.readings);
    expect(readings.filter(({ total }) => total !== null).length).toBeGreaterThan(40);
    expect(readings.filter(({ removed }) => (removed ?? 0) > 0).length).toBeGreaterThan(40);
    const cuts = read.map(({ content }) => content.cut);
    expect(cuts.filter(({ severityEstimated }) => severityEstimated).length).toBeGreaterThan(60);
    expect(cuts.filter(({ dateApproximate }) => dateApproximate === 'month').length).toBeGreaterThan(8);
    expect(cuts.filter(({ retainedLength }) => retainedLength !== null).length).toBeGreaterThan(600);
    expect(new Set(cuts.map(({ kind }) => kind)).size).toBe(6);
  });

  it('some are written down twice, a day apart, some counted per tree', () => {
    const doubles = demo.entries.filter(({ origin }) => origin === 'double');
    expect(doubles.length).toBeGreaterThanOrEqual(8);
    for (const { content } of doubles) {
      const near = demo.entries.filter(
        (entry) =>
          entry.origin !== 'double' &&
          entry.content.species === content.species &&
          Math.abs(Date.parse(entry.content.cut.date ?? '') - Date.parse(content.cut.date ?? '')) ===
            86_400_000 &&
          entry.content.readings.length === content.readings.length,
      );
      expect(near.length).toBeGreaterThanOrEqual(1);
    }
    const perTree = demo.entries.filter(({ origin }) => origin === 'per-tree');
    expect(perTree.length).toBeGreaterThanOrEqual(4);
    expect(perTree.length).toBeLessThanOrEqual(9);
  });

  it('shoots grow from visit to visit until they are thinned', () => {
    for (const { content, origin } of read) {
      if (origin === 'handwritten') continue;
      const lengths = content.readings.flatMap(({ longestShoot }) =>
        longestShoot === null ? [] : [longestShoot],
      );
      expect(lengths).toEqual([...lengths].sort((a, b) => a - b));
    }
  });

  it('no osier is cut for its fruit, and no tip is kept on a tree brought down', () => {
    for (const { content } of read) {
      if (content.species?.startsWith('salix')) expect(content.cut.aim).not.toBe('fruit');
      if (content.cut.tip === 'kept') expect(['size', 'other']).not.toContain(content.cut.aim);
    }
  });

  it('prose varies: of the entries that say something, nine in ten say it in their own words', () => {
    const texts = read.map(({ content }) =>
      [...JSON.stringify(content.doc).matchAll(/"text":"([^"]*)"/g)].map((match) => match[1]).join(' '),
    );
    const said = texts.filter((text) => text.length > 40);
    expect(said.length).toBeGreaterThan(500);
    expect(new Set(said).size).toBeGreaterThan(0.9 * said.length);
  });
});

describe('a larger ring for measuring', () => {
  it('has more growers and orchards for more entries', () => {
    const large = generateDemo({ seed: 1, today: TODAY, entries: 3600 });
    expect(large.entries.filter(({ content }) => content.readings.length > 0)).toHaveLength(3600);
    expect(large.orchards.length).toBeGreaterThan(100);
    expect(large.people.length).toBeGreaterThan(140);
    expect(new Set(large.entries.map(({ content }) => content.species)).size).toBe(RING_SPECIES.length);
  });

  it('a small one holds too', () => {
    const small = generateDemo({
      seed: 1,
      today: TODAY,
      entries: 60,
      growers: 14,
      orchards: 12,
      species: 10,
    });
    expect(small.entries.filter(({ content }) => content.readings.length > 0)).toHaveLength(60);
    expect(small.orchards).toHaveLength(12);
  });
});
