import { expect, it } from 'vitest';
import { twigInWords, type TwigCase } from '@/lib/twig/words';

it.each<[TwigCase, string]>([
  [
    { severity: 0.4, tip: 'removed', middle: 8, high: 18 },
    'Two fifths of the branch taken, tip removed. 8 new shoots, up to 18.',
  ],
  [
    { severity: 0.5, tip: 'kept', middle: 1, high: 3 },
    'Half the side growth taken, tip kept. 1 new shoot, up to 3.',
  ],
  [{ severity: 0, tip: 'kept', middle: 0, high: 0 }, 'Uncut branch. No new shoot.'],
  [{ severity: 0, tip: 'kept', middle: 0, high: 2 }, 'Uncut branch. No new shoot, up to 2.'],
  [{ severity: 1, tip: 'kept', middle: 4 }, 'All the side growth taken, tip kept. 4 new shoots.'],
  [{ severity: 0.97, tip: 'removed', middle: 4 }, 'Nearly all the branch taken, tip removed. 4 new shoots.'],
  [
    { severity: 0.125, tip: 'removed', middle: 8.07 },
    'About 13 % of the branch taken, tip removed. 8.1 new shoots.',
  ],
  [
    { severity: 1 / 3, tip: 'removed', middle: 23.4 },
    'A third of the branch taken, tip removed. 23 new shoots.',
  ],
  [
    { severity: 0.25, tip: 'kept', middle: 0.3 },
    'A quarter of the side growth taken, tip kept. 0.3 new shoots.',
  ],
  [
    { severity: 0.25, tip: 'kept', middle: 0.02 },
    'A quarter of the side growth taken, tip kept. Hardly a new shoot.',
  ],
  [
    { severity: 0.25, tip: 'removed', middle: null },
    'A quarter of the branch taken, tip removed. New shoots not known.',
  ],
])('%o reads as said', (twig, words) => {
  expect(twigInWords(twig)).toBe(words);
});
