import { describe, expect, it } from 'vitest';
import { OrchardBody, TreeBody } from '@/lib/orchards/schema';

const body = {
  name: 'Terrace above the mill',
  latitude: 12.3456,
  longitude: -45.6789,
  elevation: 420,
  timeZone: 'Etc/UTC',
  place: { sun: 'full', wind: 'sheltered', water: 'moderate' },
};
const faults = (value: unknown) =>
  (OrchardBody.safeParse(value).error?.issues ?? []).map((issue) => issue.path.join('.'));

describe('an orchard as it is sent', () => {
  it('comes through as it is', () => {
    expect(OrchardBody.parse(body)).toEqual(body);
  });

  it('keeps six decimals of a degree and one of a metre, which is what is stored', () => {
    const parsed = OrchardBody.parse({
      ...body,
      latitude: -33.12345678,
      longitude: -0.0000001,
      elevation: 1.26,
    });
    expect(parsed.latitude).toBe(-33.123457);
    expect(Object.is(parsed.longitude, 0)).toBe(true);
    expect(parsed.elevation).toBe(1.3);
  });

  it.each([
    [{ latitude: 90, longitude: 180, elevation: 9000 }],
    [{ latitude: -90, longitude: -180, elevation: -500 }],
    [{ elevation: null }],
    [{ timeZone: 'America/Argentina/Buenos_Aires' }],
    [{ timeZone: 'Europe/Lisbon' }],
  ])('may hold %j', (change) => {
    expect(faults({ ...body, ...change })).toEqual([]);
  });

  it.each([
    [{ name: '' }, 'name'],
    [{ name: '   ' }, 'name'],
    [{ name: 'x'.repeat(121) }, 'name'],
    [{ name: 'two\nlines' }, 'name'],
    [{ name: 7 }, 'name'],
    [{ latitude: 90.000001 }, 'latitude'],
    [{ latitude: Number.NaN }, 'latitude'],
    [{ latitude: Number.POSITIVE_INFINITY }, 'latitude'],
    [{ latitude: '12.3' }, 'latitude'],
    [{ latitude: null }, 'latitude'],
    [{ latitude: undefined }, 'latitude'],
    [{ longitude: -180.1 }, 'longitude'],
    [{ elevation: 9000.1 }, 'elevation'],
    [{ elevation: -501 }, 'elevation'],
    [{ timeZone: 'Mars/Olympus' }, 'timeZone'],
    [{ timeZone: '+02:00' }, 'timeZone'],
    [{ timeZone: '' }, 'timeZone'],
    [{ place: { ...body.place, sun: 'much' } }, 'place.sun'],
    [{ place: { sun: 'full', wind: 'breezy' } }, 'place.water'],
    [{ place: null }, 'place'],
  ])('may not hold %j', (change, path) => {
    expect(faults({ ...body, ...change })).toEqual([path]);
  });

  it('may not hold a field that is none', () => {
    expect(OrchardBody.safeParse({ ...body, owner: 'me' }).success).toBe(false);
    expect(OrchardBody.safeParse({ ...body, place: { ...body.place, soil: 'clay' } }).success).toBe(false);
  });
});

describe('a tree as it is sent', () => {
  it('needs no more than a label', () => {
    expect(TreeBody.parse({ label: ' Row 2, third ' })).toEqual({
      label: 'Row 2, third',
      species: null,
      cultivar: null,
      yearPlanted: null,
    });
  });

  it.each([
    { label: '' },
    { label: 'a', yearPlanted: 999 },
    { label: 'a', yearPlanted: 2019.5 },
    { label: 'a', yearPlanted: new Date().getUTCFullYear() + 2 },
    { label: 'a', cultivar: 'x'.repeat(121) },
    { label: 'a', height: 3 },
  ])('may not be %j', (tree) => {
    expect(TreeBody.safeParse(tree).success).toBe(false);
  });
});
