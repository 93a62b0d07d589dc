import { v7 as newId } from 'uuid';
import * as decisionRoute from '@/app/api/bench/entries/[id]/decision/route';
import * as queueRoute from '@/app/api/bench/queue/route';
import * as draftRoute from '@/app/api/entries/[id]/draft/route';
import * as readingRoute from '@/app/api/entries/[id]/readings/[readingId]/route';
import * as revisionsRoute from '@/app/api/entries/[id]/revisions/route';
import * as entryRoute from '@/app/api/entries/[id]/route';
import * as submitRoute from '@/app/api/entries/[id]/submit/route';
import * as listRoute from '@/app/api/entries/route';
import type { EntryView } from '@/lib/entries/schema';
import { call, read } from './request';

export type Someone = { id: string } | null;
type Json = Record<string, unknown>;

const matching = (revision?: number): Record<string, string> =>
  revision === undefined ? {} : { 'if-match': `"${revision}"` };

/** The routes of entries as somebody's program would use them. */
export const entries = {
  get: (actor: Someone, id: string) =>
    call(entryRoute, 'GET', `/api/entries/${id}`, { params: { id }, actor }),
  put: (actor: Someone, id: string, body: unknown, revision?: number) =>
    call(entryRoute, 'PUT', `/api/entries/${id}`, {
      params: { id },
      actor,
      body,
      headers: matching(revision),
    }),
  remove: (actor: Someone, id: string, revision?: number) =>
    call(entryRoute, 'DELETE', `/api/entries/${id}`, { params: { id }, actor, headers: matching(revision) }),
  list: (actor: Someone, query = '') => call(listRoute, 'GET', `/api/entries${query}`, { actor }),
  putReading: (actor: Someone, id: string, readingId: string, body: unknown, revision?: number) =>
    call(readingRoute, 'PUT', `/api/entries/${id}/readings/${readingId}`, {
      params: { id, readingId },
      actor,
      body,
      headers: matching(revision),
    }),
  removeReading: (actor: Someone, id: string, readingId: string, revision?: number) =>
    call(readingRoute, 'DELETE', `/api/entries/${id}/readings/${readingId}`, {
      params: { id, readingId },
      actor,
      headers: matching(revision),
    }),
  submit: (actor: Someone, id: string) =>
    call(submitRoute, 'POST', `/api/entries/${id}/submit`, { params: { id }, actor }),
  redraft: (actor: Someone, id: string) =>
    call(draftRoute, 'POST', `/api/entries/${id}/draft`, { params: { id }, actor }),
  revisions: (actor: Someone, id: string) =>
    call(revisionsRoute, 'GET', `/api/entries/${id}/revisions`, { params: { id }, actor }),
  queue: (actor: Someone) => call(queueRoute, 'GET', '/api/bench/queue', { actor }),
  decide: (actor: Someone, id: string, body: unknown, revision?: number) =>
    call(decisionRoute, 'POST', `/api/bench/entries/${id}/decision`, {
      params: { id },
      actor,
      body,
      headers: matching(revision),
    }),
};

/** A reading that may be sent, its id made here. */
export function readingBody(change: Json = {}): Json & { id: string } {
  return {
    id: newId(),
    date: '2026-04-28',
    counts: [7, null, 4, 11],
    longestShoot: 0.31,
    dieback: 0,
    removed: 0,
    kept: null,
    note: null,
    ...change,
  };
}

/** A whole entry of that orchard, ready for the bench. */
export function entryBody(orchard: string | null, change: Json = {}, cut: Json = {}): Json {
  return {
    title: 'Fig by the cistern',
    species: 'ficus-carica',
    cultivar: null,
    orchard,
    tree: null,
    place: { sun: 'full', wind: 'sheltered', water: 'moderate', elevation: 420 },
    cut: {
      date: '2026-03-03',
      kind: 'heading',
      severity: 0.4,
      severityEstimated: false,
      tip: 'removed',
      branches: 4,
      intensity: null,
      removedLength: 1.2,
      retainedLength: 1.8,
      diameter: 0.045,
      stage: 'dormant',
      aim: 'size',
      ...cut,
    },
    readings: [readingBody()],
    doc: { type: 'doc', content: [] },
    schemaVersion: 1,
    ...change,
  };
}

/** The answer's JSON, once its status is the one that was expected. */
export async function expectView(answer: Response, status = 200): Promise<EntryView> {
  if (answer.status !== status)
    throw new Error(`${answer.status} in place of ${status}: ${await answer.text()}`);
  return read<EntryView>(answer);
}

/** An entry saved, sent and accepted. */
export async function acceptedEntry(owner: Someone, moderator: Someone, body: unknown): Promise<EntryView> {
  const id = newId();
  await expectView(await entries.put(owner, id, body), 201);
  await expectView(await entries.submit(owner, id));
  return expectView(await entries.decide(moderator, id, { decision: 'accept' }));
}
