import type { Metadata } from 'next';
import { allGuides } from '@/lib/guides/guides';

export const metadata: Metadata = {
  title: 'Guides',
  description: 'How to count so that all count alike, and how to work safely while you do.',
};

export default function GuidesPage() {
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1>Guides</h1>
      <ul className="mt-4 max-w-measure">
        {allGuides().map(({ slug, title, description }) => (
          <li key={slug} className="border-b border-rule py-3">
            <a href={`/guides/${slug}`} className="inline-flex min-h-finger items-center font-bold">
              {title}
            </a>
            <p className="text-soft">{description}</p>
          </li>
        ))}
        <li className="border-b border-rule py-3">
          <a href="/glossary" className="inline-flex min-h-finger items-center font-bold">
            Glossary
          </a>
          <p className="text-soft">
            The words of this place, and words of the trade with more than one meaning.
          </p>
        </li>
      </ul>
    </main>
  );
}
