import type { ReactElement } from 'react';
import { Kept } from '@/lib/lists/kept';

const kept = new Kept<string>(2000);

type Props = {
  /** Names all that the part depends on; the same key, the same markup. */
  keptBy: string;
  /** Plain components alone: no hooks, nothing asynchronous. */
  render: () => ReactElement | Promise<ReactElement>;
  className?: string;
};

/**
 * A part of a page that is the same for everyone until its data change: made once and kept as markup, in place of a tree
 * that is built, and sent a second time, for every request.
 */
export async function Still({ keptBy, render, className }: Props) {
  let markup = kept.get(keptBy);
  if (markup === undefined) {
    const { renderToStaticMarkup } = await import('react-dom/server');
    markup = kept.set(keptBy, renderToStaticMarkup(await render()));
  }
  return <div className={className} dangerouslySetInnerHTML={{ __html: markup }} />;
}
