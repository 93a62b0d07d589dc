import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { Prose } from '@/components/prose/Prose';
import { guide } from '@/lib/guides/guides';

type Props = { params: Promise<{ slug: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const found = guide((await params).slug);
  return found ? { title: found.title, description: found.description } : {};
}

export default async function GuidePage({ params }: Props) {
  const found = guide((await params).slug);
  if (!found) notFound();
  return (
    <main id="main" className="mx-auto max-w-page px-3 pt-8">
      <h1 className="mb-4">{found.title}</h1>
      <Prose html={found.html} />
    </main>
  );
}
