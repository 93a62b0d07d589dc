import { describe, expect, it } from 'vitest';
import { orchardFromForm } from '@/components/orchard/orchard-from-form';
import { OrchardBody } from '@/lib/orchards/schema';

const typed = {
  name: ' Terrace above the mill ',
  latitude: '12,3456',
  longitude: '−45.6789°',
  elevation: '420',
  timeZone: 'Europe/Lisbon',
  'place.sun': 'full',
  'place.wind': 'breezy',
  'place.water': 'dry',
};
const read = (
  change: Partial<Record<keyof typeof typed, string>> = {},
  units: 'metric' | 'imperial' = 'metric',
) => {
  const form = new FormData();
  for (const [name, value] of Object.entries({ ...typed, ...change })) form.set(name, value);
  return orchardFromForm(form, units);
};

describe('what is typed about an orchard', () => {
  it('is what the API takes, with a comma for a point, a long minus and a degree sign', () => {
    const { body, faults } = read();
    expect(faults).toEqual([]);
    expect(OrchardBody.parse(body)).toEqual({
      name: 'Terrace above the mill',
      latitude: 12.3456,
      longitude: -45.6789,
      elevation: 420,
      timeZone: 'Europe/Lisbon',
      place: { sun: 'full', wind: 'breezy', water: 'dry' },
    });
  });

  it('is in feet for who reads feet, unless it says otherwise', () => {
    expect(read({ elevation: '1000' }, 'imperial').body).toMatchObject({ elevation: 304.8 });
    expect(read({ elevation: '1000 m' }, 'imperial').body).toMatchObject({ elevation: 1000 });
    expect(read({ elevation: '' }).body).toMatchObject({ elevation: null });
  });

  it.each([
    [{ name: ' ' }, 'name'],
    [{ latitude: '' }, 'latitude'],
    [{ latitude: '91' }, 'latitude'],
    [{ latitude: '12.3 N' }, 'latitude'],
    [{ longitude: '-180.5' }, 'longitude'],
    [{ longitude: 'NaN' }, 'longitude'],
    [{ elevation: 'high' }, 'elevation'],
    [{ 'place.sun': '' }, 'place.sun'],
  ])('is sent back at its field for %j', (change, path) => {
    expect(read(change).faults.map((fault) => fault.path)).toEqual([path]);
  });
});
