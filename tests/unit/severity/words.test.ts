import fc from 'fast-check';
import { expect, it } from 'vitest';
import { severityInWords } from '@/lib/severity/severity';

it.each([
  [0, 'nothing'],
  [0.004, 'under 1 %'],
  [0.1, 'a tenth'],
  [0.125, 'about 13 %'],
  [0.2, 'a fifth'],
  [0.25, 'a quarter'],
  [7 / 24, 'three tenths'],
  [1 / 3, 'a third'],
  [0.3334, 'a third'],
  [0.37, 'about 37 %'],
  [0.4, 'two fifths'],
  [5 / 12, 'about 42 %'],
  [0.5, 'half'],
  [0.6, 'three fifths'],
  [0.66, 'two thirds'],
  [0.7, 'seven tenths'],
  [0.75, 'three quarters'],
  [0.8, 'four fifths'],
  [5 / 6, 'five sixths'],
  [0.9, 'nine tenths'],
  [0.97, 'nearly all'],
  [1, 'all'],
])('%d is said as "%s"', (severity, words) => {
  expect(severityInWords(severity)).toBe(words);
});

it('a cut just past a bound is not called by the fraction at the bound', () => {
  expect(severityInWords(0.26)).toBe('about 26 %');
  expect(severityInWords(0.34)).toBe('about 34 %');
  expect(severityInWords(0.51)).toBe('about 51 %');
});

it('something is said of every severity', () => {
  fc.assert(
    fc.property(fc.double({ min: 0, max: 1, noNaN: true }), (severity) => {
      expect(severityInWords(severity)).toMatch(/^[a-z0-9 %]+$/);
    }),
  );
});
