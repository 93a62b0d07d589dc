import type { Metadata, Viewport } from 'next';
import localFont from 'next/font/local';
import type { ReactNode } from 'react';
import { Masthead } from '@/components/page/Masthead';
import { PageFoot } from '@/components/page/PageFoot';
import { env } from '@/lib/env';
import { currentActor } from '@/lib/people/session';
import './globals.css';

// Atkinson Hyperlegible Next, SIL Open Font License 1.1; the files ship with the app.
const text = localFont({
  src: [
    {
      path: '../node_modules/@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-wght-normal.woff2',
      style: 'normal',
      weight: '200 800',
    },
  ],
  variable: '--font-text',
  display: 'swap',
  adjustFontFallback: 'Arial',
});

export const metadata: Metadata = {
  title: { default: 'Aftercut: what a tree does after the cut', template: '%s · Aftercut' },
  description:
    'A shared record of pruning cuts and the regrowth that followed, kept by growers, read by moderators, open to all.',
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#ffffff' },
    { media: '(prefers-color-scheme: dark)', color: '#0f1713' },
  ],
};

// A nonce a request: no page is made ahead of its request.
export const dynamic = 'force-dynamic';

export default async function RootLayout({ children }: { children: ReactNode }) {
  const actor = await currentActor();
  return (
    <html lang="en" className={text.variable}>
      <body className="font-sans antialiased">
        <a className="skip" href="#main">
          To the content
        </a>
        <Masthead actor={actor} demo={env().DEMO} />
        {children}
        <PageFoot />
      </body>
    </html>
  );
}
