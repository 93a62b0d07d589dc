import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { elevationForField, parseElevation } from '@/lib/units/elevation';
import { formatForField, formatLength, lengthField, parseLength, type Units } from '@/lib/units/units';

const metres = (typed: string, bare = 1) => {
  const parsed = parseLength(typed, bare);
  return parsed.ok ? parsed.metres : parsed.message;
};

describe('a length as somebody types it', () => {
  // The international inch is 0.0254 m exactly, the foot twelve of it: NIST Special Publication 811, appendix B.8 (from memory).
  it.each([
    ['0.31', 0.31],
    ['0,31', 0.31],
    ['.5', 0.5],
    ['75 cm', 0.75],
    ['75cm', 0.75],
    ['8 mm', 0.008],
    ['1,2 m', 1.2],
    ['2 ft 6', 0.762],
    ['2 ft 6 in', 0.762],
    ['2\'6"', 0.762],
    ['2\' 6 1/2"', 0.7747],
    ['6 in', 0.1524],
    ['1 m 20', 1.2],
    ['1 m 20 cm', 1.2],
    ['0', 0],
  ])('“%s” is %d m', (typed, expected) => {
    expect(metres(typed)).toBe(expected);
  });

  it('a bare number is in the unit of its field', () => {
    expect(metres('31', lengthField('metric', 'short').unitM)).toBe(0.31);
    expect(metres('2', lengthField('imperial', 'long').unitM)).toBe(0.6096);
  });

  it('nothing typed is nothing, not zero', () => {
    expect(metres('')).toBeNull();
  });

  it.each([
    ['-1', /below 0/],
    ['long', /not a length/],
    ['1 2', /two lengths/],
    ['6 in 2 ft', /two lengths/],
    ['1.2.3', /not a length|two lengths/],
    ['101', /over 100 m/],
    ['1e3', /not a length/],
  ])('“%s” is refused with a reason', (typed, message) => {
    expect(metres(typed)).toMatch(message);
  });

  it('a length in a field reads back as itself to a tenth of a millimetre', () => {
    const length = fc.integer({ min: 0, max: 99_000_000 }).map((micrometres) => micrometres / 1e6);
    const units = fc.constantFrom<Units>('metric', 'imperial');
    fc.assert(
      fc.property(length, units, fc.constantFrom('long', 'short'), (value, system, size) => {
        const field = lengthField(system, size as 'long' | 'short');
        expect(
          Math.abs(Number(metres(formatForField(value, field), field.unitM)) - value),
        ).toBeLessThanOrEqual(1e-4);
      }),
    );
  });

  it('a length in words reads back to the rounding that it says', () => {
    const length = fc.double({ min: 0, max: 99, noNaN: true });
    fc.assert(
      fc.property(length, fc.constantFrom<Units>('metric', 'imperial'), (value, system) => {
        expect(Math.abs(Number(metres(formatLength(value, system))) - value)).toBeLessThanOrEqual(0.0065);
      }),
    );
  });

  it('is said in the reader’s units', () => {
    expect(formatLength(1.8, 'metric')).toBe('1.8 m');
    expect(formatLength(0.31, 'metric')).toBe('31 cm');
    expect(formatLength(0.045, 'metric')).toBe('4.5 cm');
    expect(formatLength(0.762, 'imperial')).toBe('2 ft 6 in');
    expect(formatLength(0.6096, 'imperial')).toBe('2 ft');
  });

  it('no text whatever breaks it', () => {
    fc.assert(fc.property(fc.string(), (typed) => void parseLength(typed, 1)));
  });
});

describe('a height above the sea', () => {
  it('is read in the reader’s units, below the sea too', () => {
    expect(parseElevation('420', 'metric')).toEqual({ ok: true, metres: 420 });
    expect(parseElevation('−12', 'metric')).toEqual({ ok: true, metres: -12 });
    expect(parseElevation('1000', 'imperial')).toEqual({ ok: true, metres: 304.8 });
    expect(parseElevation('420 m', 'imperial')).toEqual({ ok: true, metres: 420 });
    expect(elevationForField(304.8, 'imperial')).toBe('1000');
  });

  it('refuses heights where no tree stands', () => {
    expect(parseElevation('9001', 'metric').ok).toBe(false);
    expect(parseElevation('-501', 'metric').ok).toBe(false);
  });
});
