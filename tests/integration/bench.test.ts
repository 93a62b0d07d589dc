import { v7 as newId } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/database';
import { acceptedEntry, entries, entryBody, expectView, readingBody } from './setup/entries';
import { makeOrchard, makePerson, type TestPerson } from './setup/people';
import { read } from './setup/request';

let owner: TestPerson;
let helper: TestPerson;
let moderator: TestPerson;
let other: TestPerson;
let orchard: string;
beforeAll(async () => {
  owner = await makePerson('grower', 'Olive Owner');
  helper = await makePerson('grower', 'Hal Helper');
  moderator = await makePerson('moderator', 'Mo Moderator');
  other = await makePerson('moderator', 'Ora Other');
  orchard = await makeOrchard(owner, { helpers: [helper] });
});

type Problem = { errors?: { path: string; message: string }[]; revision?: number };
const paths = async (answer: Response) => (await read<Problem>(answer)).errors?.map(({ path }) => path);
const accept = { decision: 'accept' };

async function waiting(body: unknown = entryBody(orchard), who: TestPerson = owner): Promise<string> {
  const id = newId();
  await expectView(await entries.put(who, id, body), 201);
  await expectView(await entries.submit(who, id));
  return id;
}
const queued = async (id: string) => {
  const { items } = await read<{
    items: {
      reason: string;
      yours: boolean;
      entry: { id: string; title: string; revision: number; readings: unknown[] };
    }[];
  }>(await entries.queue(moderator));
  return items.find(({ entry }) => entry.id === id);
};

describe('sending to the bench', () => {
  it('names everything that lacks, and leaves the draft as it is', async () => {
    const id = newId();
    await entries.put(owner, id, {});
    const refused = await entries.submit(owner, id);
    expect(refused.status).toBe(422);
    expect(await paths(refused)).toEqual([
      'species',
      'orchard',
      'place.sun',
      'place.wind',
      'place.water',
      'cut.date',
      'cut.kind',
      'cut.severity',
      'cut.tip',
      'cut.branches',
      'cut.stage',
      'readings',
    ]);
    expect(await expectView(await entries.get(owner, id))).toMatchObject({ status: 'draft', revision: 1 });
  });

  it('wants counts and a date in every reading', async () => {
    const id = newId();
    const bare = readingBody({ counts: null, date: null });
    const half = readingBody({ counts: null, total: 8 });
    await expectView(await entries.put(owner, id, entryBody(orchard, { readings: [bare, half] })), 201);
    expect(await paths(await entries.submit(owner, id))).toEqual([
      'readings.0.date',
      'readings.0.counts',
      'readings.1.branches',
    ]);
  });

  it('twice is once', async () => {
    const id = await waiting();
    expect((await expectView(await entries.submit(owner, id))).status).toBe('waiting');
    expect((await queued(id))?.reason).toBe('entry');
  });

  it('is for its owner alone', async () => {
    const id = newId();
    await entries.put(owner, id, entryBody(orchard));
    expect((await entries.submit(helper, id)).status).toBe(403);
    expect((await entries.submit(moderator, id)).status).toBe(404);
    expect((await entries.submit(null, id)).status).toBe(401);
  });

  it('leaves it open to change, but never incomplete', async () => {
    const id = await waiting();
    const changed = await expectView(
      await entries.put(owner, id, entryBody(orchard, { title: 'Better' }), 1),
    );
    expect(changed).toMatchObject({ status: 'waiting', revision: 2, title: 'Better' });
    expect((await entries.put(owner, id, entryBody(orchard, { species: null }), 2)).status).toBe(422);
    const reading = changed.readings[0]?.id ?? '';
    expect((await entries.removeReading(owner, id, reading)).status).toBe(422);
    expect((await queued(id))?.entry).toMatchObject({ title: 'Better', revision: 2 });
  });
});

describe('a decision', () => {
  it('accepts, and everyone sees it', async () => {
    const id = await waiting();
    expect((await expectView(await entries.decide(moderator, id, accept))).status).toBe('accepted');
    expect((await expectView(await entries.get(null, id))).status).toBe('accepted');
    expect(await queued(id)).toBeUndefined();
    const log = await database()('audit_log').where({
      subject_id: id,
      action: 'entry.accepted',
      actor_id: moderator.id,
    });
    expect(log).toHaveLength(1);
  });

  it('sends back with a note that the grower sees; sent again, it waits again', async () => {
    const id = await waiting();
    expect(await paths(await entries.decide(moderator, id, { decision: 'return' }))).toEqual(['note']);
    await expectView(
      await entries.decide(moderator, id, { decision: 'return', note: 'Per tree, or per branch?' }),
    );
    expect(await expectView(await entries.get(owner, id))).toMatchObject({
      status: 'returned',
      returnedNote: 'Per tree, or per branch?',
    });
    expect((await entries.get(null, id)).status).toBe(404);
    await expectView(await entries.submit(owner, id));
    expect((await queued(id))?.entry.id).toBe(id);
  });

  it('holds for the revision that was read, and is taken once', async () => {
    const id = await waiting();
    await expectView(await entries.put(owner, id, entryBody(orchard, { title: 'Changed meanwhile' }), 1));
    const stale = await entries.decide(moderator, id, accept, 1);
    expect(stale.status).toBe(412);
    expect(await read(stale)).toMatchObject({ revision: 2 });
    const both = await Promise.all([
      entries.decide(moderator, id, accept, 2),
      entries.decide(other, id, accept, 2),
    ]);
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('is never about one’s own', async () => {
    const place = await makeOrchard(moderator);
    const id = await waiting(entryBody(place), moderator);
    expect((await entries.decide(moderator, id, accept)).status).toBe(403);
    expect((await queued(id))?.yours).toBe(true);
    expect((await entries.decide(other, id, accept)).status).toBe(200);
  });

  it('is for moderators', async () => {
    const id = await waiting();
    for (const who of [owner, helper]) expect((await entries.decide(who, id, accept)).status).toBe(403);
    expect((await entries.decide(null, id, accept)).status).toBe(401);
  });

  it('can set a reading aside, of this entry alone', async () => {
    const one = readingBody();
    const two = readingBody({ date: '2026-05-05' });
    const id = await waiting(entryBody(orchard, { readings: [one, two] }));
    expect((await entries.decide(moderator, id, { ...accept, setAside: [newId()] })).status).toBe(422);
    const view = await expectView(await entries.decide(moderator, id, { ...accept, setAside: [two.id] }));
    expect(view.readings.map(({ setAside }) => setAside)).toEqual([false, true]);
  });

  it.each([
    {},
    { decision: 'perhaps' },
    { decision: 'accept', extra: 1 },
    { decision: 'accept', setAside: ['x'] },
  ])('that reads %j is refused', async (body) => {
    expect((await entries.decide(moderator, await waiting(), body)).status).toBe(422);
  });
});

describe('an accepted entry', () => {
  it('stays as it was accepted until a change is sent and accepted', async () => {
    const { id } = await acceptedEntry(owner, moderator, entryBody(orchard));
    const mine = await expectView(
      await entries.put(owner, id, entryBody(orchard, { title: 'New words' }), 1),
    );
    expect(mine).toMatchObject({ status: 'accepted', pending: true, title: 'New words', revision: 2 });
    const seen = async () => (await expectView(await entries.get(null, id))).title;
    expect(await seen()).toBe('Fig by the cistern');
    expect(await queued(id)).toBeUndefined();
    await expectView(await entries.submit(owner, id));
    expect(await queued(id)).toMatchObject({ reason: 'change', entry: { title: 'New words', revision: 2 } });
    expect(await seen()).toBe('Fig by the cistern');
    await expectView(await entries.decide(moderator, id, accept, 2));
    expect(await seen()).toBe('New words');
    expect((await expectView(await entries.get(owner, id))).pending).toBe(false);
    expect((await entries.submit(owner, id)).status).toBe(409);
  });

  it('sends a reading to the bench by itself, while what its owner writes stays unsent', async () => {
    const { id } = await acceptedEntry(owner, moderator, entryBody(orchard));
    const { readings: left, ...unsent } = entryBody(orchard, { title: 'Unsent' });
    void left;
    await expectView(await entries.put(owner, id, unsent, 1));
    const { id: readingId, ...late } = readingBody({ date: '2026-06-01', counts: [9, null, 5, 12] });
    expect((await entries.putReading(helper, id, readingId, late)).status).toBe(201);
    const item = await queued(id);
    expect(item?.entry.title).toBe('Fig by the cistern');
    expect(item?.entry.readings).toHaveLength(2);
    const mine = await expectView(await entries.get(owner, id));
    expect(mine).toMatchObject({ title: 'Unsent', pending: true });
    expect(mine.readings).toHaveLength(2);
    await expectView(await entries.decide(moderator, id, accept, item?.entry.revision));
    const open = await expectView(await entries.get(null, id));
    expect([open.title, open.readings.length]).toEqual(['Fig by the cistern', 2]);
    expect(await expectView(await entries.get(owner, id))).toMatchObject({ title: 'Unsent', pending: true });
  });

  it('takes no half reading', async () => {
    const { id } = await acceptedEntry(owner, moderator, entryBody(orchard));
    const { id: readingId, ...half } = readingBody({ counts: null });
    expect(await paths(await entries.putReading(helper, id, readingId, half))).toEqual(['counts']);
    expect(await queued(id)).toBeUndefined();
  });

  it('keeps its accepted record when a change is sent back', async () => {
    const { id } = await acceptedEntry(owner, moderator, entryBody(orchard));
    await entries.put(owner, id, entryBody(orchard, { title: 'Worse' }), 1);
    await entries.submit(owner, id);
    await expectView(await entries.decide(moderator, id, { decision: 'return', note: 'Why?' }));
    expect((await expectView(await entries.get(null, id))).title).toBe('Fig by the cistern');
    expect(await expectView(await entries.get(owner, id))).toMatchObject({
      status: 'accepted',
      pending: true,
      returnedNote: 'Why?',
    });
    expect((await entries.get(null, id)).headers.get('etag')).toBe('"1"');
  });

  it('shows its revisions to its owner and the bench', async () => {
    const { id } = await acceptedEntry(owner, moderator, entryBody(orchard));
    await entries.put(owner, id, entryBody(orchard, { title: 'Next' }), 1);
    const { items } = await read<{ items: { revision: number; state: string; by: string }[] }>(
      await entries.revisions(moderator, id),
    );
    expect(items.map(({ revision, state, by }) => [revision, state, by])).toEqual([
      [2, 'draft', 'Olive Owner'],
      [1, 'accepted', 'Olive Owner'],
    ]);
    expect((await entries.revisions(owner, id)).status).toBe(200);
    expect((await entries.revisions(helper, id)).status).toBe(403);
    expect((await entries.revisions(null, id)).status).toBe(401);
  });
});

describe('taking an entry back', () => {
  it('deletes a draft, under the revision that was read', async () => {
    const id = newId();
    await entries.put(owner, id, entryBody(orchard));
    expect((await entries.remove(owner, id)).status).toBe(428);
    expect((await entries.remove(owner, id, 7)).status).toBe(412);
    expect((await entries.remove(owner, id, 1)).status).toBe(204);
    expect((await entries.get(owner, id)).status).toBe(404);
    expect(await database()('revisions').where({ entry_id: id })).toHaveLength(0);
  });

  it('withdraws anything further along, and can make it a draft again', async () => {
    const { id } = await acceptedEntry(owner, moderator, entryBody(orchard));
    expect((await entries.remove(helper, id, 1)).status).toBe(403);
    expect((await entries.remove(owner, id, 1)).status).toBe(204);
    expect(await expectView(await entries.get(owner, id))).toMatchObject({ status: 'withdrawn' });
    expect((await entries.put(owner, id, entryBody(orchard, { title: 'x' }), 1)).status).toBe(409);
    expect((await entries.submit(owner, id)).status).toBe(409);
    expect((await expectView(await entries.redraft(owner, id))).status).toBe('draft');
    await expectView(await entries.put(owner, id, entryBody(orchard, { title: 'Once more' }), 1));
    await expectView(await entries.submit(owner, id));
    expect(await expectView(await entries.decide(moderator, id, accept))).toMatchObject({
      status: 'accepted',
      title: 'Once more',
    });
  });

  it('from the queue takes it off the bench', async () => {
    const id = await waiting();
    expect((await entries.remove(owner, id, 1)).status).toBe(204);
    expect(await queued(id)).toBeUndefined();
    expect((await entries.decide(moderator, id, accept)).status).toBe(409);
    expect((await entries.redraft(owner, await waiting())).status).toBe(409);
  });
});
