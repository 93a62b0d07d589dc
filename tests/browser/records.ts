import { expect, type APIRequestContext, type Page } from '@playwright/test';
import { v7 as newId } from 'uuid';
import type { EntryView } from '@/lib/entries/schema';

type Json = Record<string, unknown>;

/** A calendar day so many days before today, as the API takes it: a record is never dated after the test. */
export function daysAgo(days: number): string {
  return new Date(Date.now() - days * 86_400_000).toISOString().slice(0, 10);
}

/** Makes an orchard of whoever asks. Gives its id. */
export async function makeOrchard(request: APIRequestContext, name: string): Promise<string> {
  const id = newId();
  const data = {
    name,
    latitude: -12.3456,
    longitude: 45.6789,
    elevation: 447,
    timeZone: 'Etc/UTC',
    place: { sun: 'full', wind: 'sheltered', water: 'moderate' },
  };
  const answer = await request.put(`/api/orchards/${id}`, { data });
  expect(answer.status(), await answer.text()).toBe(201);
  return id;
}

/** A whole entry, ready for the bench: four branches cut ten weeks ago, counted two weeks ago. */
export function entryBody(orchard: string, change: Json = {}, cut: Json = {}): Json {
  return {
    title: 'A limb over the path',
    species: 'ficus-carica',
    cultivar: null,
    orchard,
    tree: null,
    place: { sun: 'full', wind: 'sheltered', water: 'moderate', elevation: 447 },
    cut: {
      date: daysAgo(70),
      kind: 'heading',
      severity: 0.4,
      severityEstimated: false,
      tip: 'removed',
      branches: 4,
      intensity: null,
      removedLength: 1.2,
      retainedLength: 1.8,
      diameter: null,
      stage: 'dormant',
      aim: null,
      ...cut,
    },
    readings: [readingBody()],
    doc: { type: 'doc', content: [] },
    schemaVersion: 1,
    ...change,
  };
}

export function readingBody(change: Json = {}): Json {
  return {
    id: newId(),
    date: daysAgo(14),
    counts: [7, 9, null, 11],
    longestShoot: null,
    dieback: null,
    removed: null,
    kept: null,
    note: null,
    ...change,
  };
}

/** Stores an entry, and sends it to the bench unless it is to stay a draft. */
export async function makeEntry(
  request: APIRequestContext,
  body: Json,
  as: 'draft' | 'waiting' = 'waiting',
): Promise<EntryView> {
  const id = newId();
  const made = await request.put(`/api/entries/${id}`, { data: body });
  expect(made.status(), await made.text()).toBe(201);
  if (as === 'draft') return (await made.json()) as EntryView;
  const sent = await request.post(`/api/entries/${id}/submit`);
  expect(sent.status(), await sent.text()).toBe(200);
  return (await sent.json()) as EntryView;
}

/** The entry as it is stored for whoever asks. */
export async function stored(request: APIRequestContext, id: string): Promise<EntryView> {
  const answer = await request.get(`/api/entries/${id}`);
  expect(answer.status(), await answer.text()).toBe(200);
  return (await answer.json()) as EntryView;
}

/** The id in an entry's address. */
export function entryIdOf(page: Page): string {
  const id = /\/entries\/([0-9a-f-]{36})/.exec(page.url())?.[1];
  expect(id, page.url()).toBeDefined();
  return id ?? '';
}
