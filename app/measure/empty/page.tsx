import { notFound } from 'next/navigation';
import { env } from '@/lib/env';

/** The page that others are measured against: the frame and nothing in it. There only with MEASURE=1. */
export default function EmptyPage() {
  if (!env().MEASURE) notFound();
  return <main id="main" />;
}
