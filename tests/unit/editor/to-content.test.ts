import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sameContent } from '@/components/entry/editor/content';
import { formFrom, type CutForm, type EntryForm, type ReadingForm } from '@/components/entry/editor/form';
import { contentFrom } from '@/components/entry/editor/to-content';
import type { EntryContent } from '@/lib/entries/schema';
import type { Units } from '@/lib/units/units';
import { content, cut, OTHER_READING, reading, READING } from './factories';

const NOW = new Date('2026-06-01T12:00:00Z');
const BASE = content({
  title: 'Fig by the cistern',
  species: 'ficus-carica',
  cut: cut({
    date: '2026-03-03',
    kind: 'heading',
    severity: 0.4,
    tip: 'removed',
    branches: 4,
    retainedLength: 1.812345,
  }),
  readings: [reading()],
});

interface Change {
  readonly form?: Partial<EntryForm>;
  readonly cut?: Partial<CutForm>;
  readonly reading?: Partial<ReadingForm>;
}

function written(change: Change, base: EntryContent = BASE, units: Units = 'metric') {
  const form = formFrom(base, units);
  const before = form.readings[READING];
  return contentFrom(
    {
      ...form,
      ...change.form,
      cut: { ...form.cut, ...change.cut },
      readings: before ? { ...form.readings, [READING]: { ...before, ...change.reading } } : form.readings,
    },
    base.readings.map(({ id }) => id),
    base.doc,
    base,
    units,
    NOW,
  );
}

describe('what is stored, out of what stands in the fields', () => {
  it('fields that nobody touched keep what is stored to the last digit, in either units', () => {
    const length = fc.integer({ min: 0, max: 99_000_000 }).map((micrometres) => micrometres / 1e6);
    fc.assert(
      fc.property(length, length, fc.constantFrom<Units>('metric', 'imperial'), (long, short, units) => {
        const base = {
          ...BASE,
          place: { ...BASE.place, elevation: Math.round(long * 10) / 10 },
          cut: { ...BASE.cut, removedLength: long, intensity: Math.round(short * 1e4) / 1e6 },
          readings: [reading({ longestShoot: short, dieback: long })],
        };
        expect(written({}, base, units)).toEqual({ content: base, problems: [] });
      }),
    );
  });

  it('reads lengths in the reader’s units and keeps metres', () => {
    expect(written({ cut: { retainedLength: '2,1' } }).content.cut.retainedLength).toBe(2.1);
    expect(written({ cut: { retainedLength: '2 ft 6' } }, BASE, 'imperial').content.cut.retainedLength).toBe(
      0.762,
    );
    expect(written({ reading: { longestShoot: '31' } }).content.readings[0]?.longestShoot).toBe(0.31);
    expect(
      written({ reading: { longestShoot: '12' } }, BASE, 'imperial').content.readings[0]?.longestShoot,
    ).toBe(0.3048);
  });

  it('an uncut control is severity 0 with its tip kept, whatever the other fields say', () => {
    const { content: kept, problems } = written({ cut: { kind: 'none', severity: 0.4, tip: 'removed' } });
    expect(kept.cut).toMatchObject({ kind: 'none', severity: 0, tip: 'kept', severityEstimated: false });
    expect(problems).toEqual([]);
  });

  it('counts become one number a branch, or a total with its branches', () => {
    expect(written({ reading: { counts: '3 x 0 8' } }).content.readings[0]).toMatchObject({
      counts: [3, null, 0, 8],
      total: null,
      branches: null,
    });
    expect(written({ reading: { counts: '31 on 4' } }).content.readings[0]).toMatchObject({
      counts: null,
      total: 31,
      branches: 4,
    });
  });

  it.each<[string, Change, string]>([
    ['a count that is none', { reading: { counts: '7 many' } }, `readings.${READING}.counts`],
    ['more counts than branches', { reading: { counts: '1 2 3 4 5' } }, `readings.${READING}.counts`],
    ['a count of a reading, by fewer branches', { cut: { branches: '2' } }, `readings.${READING}.counts`],
    ['half a branch', { cut: { branches: '2.5' } }, 'cut.branches'],
    ['no branch', { cut: { branches: '0' } }, 'cut.branches'],
    ['too many branches', { cut: { branches: '501' } }, 'cut.branches'],
    ['a share over all', { cut: { intensity: '101' } }, 'cut.intensity'],
    ['a branch as thick as a house', { cut: { diameter: '600 cm' } }, 'cut.diameter'],
    ['a length below nothing', { cut: { removedLength: '-1' } }, 'cut.removedLength'],
    ['a day to come', { reading: { date: '2026-06-03' } }, `readings.${READING}.date`],
    ['a year half typed', { cut: { date: '0002-03-04' } }, 'cut.date'],
    ['a reading before its cut', { reading: { date: '2026-03-02' } }, `readings.${READING}.date`],
    ['a cut after its reading', { cut: { date: '2026-05-01' } }, `readings.${READING}.date`],
    ['a cut of nothing', { cut: { severity: 0 } }, 'cut.severity'],
    ['a species that is none', { form: { species: '', speciesTyped: 'figgy' } }, 'species'],
    ['a hill beyond the sky', { form: { elevation: '9001' } }, 'place.elevation'],
  ])('%s is named beside its field, and what is stored stays', (_what, change, path) => {
    const { content: kept, problems } = written(change);
    expect(problems.map((problem) => problem.path)).toEqual([path]);
    expect(sameContent(kept, BASE)).toBe(true);
  });

  it('all else is saved while one field cannot be', () => {
    const { content: kept } = written({ form: { title: 'Row 2' }, reading: { counts: '7 many' } });
    expect(kept.title).toBe('Row 2');
    expect(kept.readings[0]?.counts).toEqual([7, 9, null, 11]);
  });

  it('tomorrow’s date is somebody’s today', () => {
    expect(written({ reading: { date: '2026-06-02' } }).problems).toEqual([]);
  });

  it('a draft may be all but empty', () => {
    const { content: kept, problems } = written({}, content());
    expect(problems).toEqual([]);
    expect(kept).toEqual(content());
  });

  it('a new reading holds nothing until something is typed, and readings stand by date', () => {
    const form = formFrom(BASE, 'metric');
    const late = contentFrom(form, [OTHER_READING, READING], BASE.doc, BASE, 'metric', NOW);
    expect(late.content.readings.map(({ id, date }) => [id, date])).toEqual([
      [OTHER_READING, null],
      [READING, '2026-04-28'],
    ]);
  });
});
