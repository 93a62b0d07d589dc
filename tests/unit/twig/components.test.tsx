// @vitest-environment jsdom
import { renderToStaticMarkup } from 'react-dom/server';
import { expect, it } from 'vitest';
import { TwigLive } from '@/components/twig/TwigLive';
import { TwigMark } from '@/components/twig/TwigMark';
import { twigSvg } from '@/lib/twig/twig';

it('the mark on a page is the drawing itself, in the width it is given', () => {
  const html = renderToStaticMarkup(
    <TwigMark severity={0.4} tip="removed" middle={8.3} high={18} size="small" className="w-36" />,
  );
  const drawing = twigSvg({ severity: 0.4, tip: 'removed', middle: 8.3, high: 18 }, { size: 'small' });
  expect(html).toBe(`<span class="block w-36">${drawing}</span>`);
});

it('two cases of one table never share a drawing', () => {
  const mark = (severity: number, label?: string) =>
    renderToStaticMarkup(<TwigMark severity={severity} tip="removed" middle={8} label={label} />);
  const marks = [mark(0.4), mark(0.41), mark(0.4, 'Fig'), mark(0.4, '')];
  expect(new Set(marks).size).toBe(4);
  expect(mark(0.4)).toBe(marks[0]);
});

it('the live mark follows the severity, and waits for one without complaint', () => {
  const live = (severity: number | null) =>
    renderToStaticMarkup(<TwigLive severity={severity} tip="removed" middle={4} />);
  expect(live(0.4)).toContain('Two fifths of the branch taken');
  expect(live(0.5)).toContain('Half the branch taken');
  for (const none of [null, Number.NaN, 7]) expect(live(none)).toContain('No cut described yet');
});
