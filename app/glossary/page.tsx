import type { Metadata } from 'next';
import { Prose } from '@/components/prose/Prose';
import { glossary } from '@/lib/guides/guides';

export function generateMetadata(): Metadata {
  const { title, description } = glossary();
  return { title, description };
}

export default function GlossaryPage() {
  const { title, html } = glossary();
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1 className="mb-4">{title}</h1>
      <Prose html={html} />
    </main>
  );
}
