import fc from 'fast-check';
import { v7 as newId } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/database';
import type { EntryView } from '@/lib/entries/schema';
import { entries, entryBody, readingBody } from './setup/entries';
import { makeOrchard, makePerson, type TestPerson } from './setup/people';
import { read } from './setup/request';

let owner: TestPerson;
let helper: TestPerson;
let moderator: TestPerson;
let orchard: string;
beforeAll(async () => {
  owner = await makePerson();
  helper = await makePerson();
  moderator = await makePerson('moderator');
  orchard = await makeOrchard(owner, { helpers: [helper] });
});

const MOVES = ['write', 'submit', 'accept', 'return', 'count', 'withdraw', 'redraft'] as const;
type Move = (typeof MOVES)[number];
const RUNS = 40;

describe('whatever moves are made, in whatever order', () => {
  it('visitors see the last accepted revision or nothing, and no acknowledged reading is lost', async () => {
    const moves = fc.array(fc.constantFrom(...MOVES), { minLength: 4, maxLength: 16 });
    await fc.assert(
      fc.asyncProperty(moves, async (sequence) => {
        const world = await begin();
        for (const move of sequence) await make(world, move);
      }),
      { numRuns: RUNS, endOnFailure: true },
    );
  }, 120_000);
});

type World = {
  id: string;
  writes: number;
  readings: Set<string>;
  public: { title: string; readings: string[] } | null;
};

async function begin(): Promise<World> {
  const id = newId();
  const body = entryBody(orchard, { title: 'writing 0' });
  const view = await read<EntryView>(await entries.put(owner, id, body));
  return { id, writes: 0, readings: new Set(view.readings.map((one) => one.id)), public: null };
}

/** Makes one move, whether or not it is allowed just now, then looks at what must hold. */
async function make(world: World, move: Move): Promise<void> {
  const { id } = world;
  const mine = await read<EntryView>(await entries.get(owner, id));
  switch (move) {
    case 'write': {
      const { readings: left, ...rest } = entryBody(orchard, { title: `writing ${world.writes + 1}` });
      void left;
      const answer = await entries.put(owner, id, rest, mine.revision);
      if (answer.ok) world.writes += 1;
      else expect([409]).toContain(answer.status);
      break;
    }
    case 'count': {
      const { id: readingId, ...body } = readingBody({ date: '2026-05-05' });
      if ((await entries.putReading(helper, id, readingId, body)).status === 201)
        world.readings.add(readingId);
      break;
    }
    case 'submit':
      expect([200, 409]).toContain((await entries.submit(owner, id)).status);
      break;
    case 'accept': {
      const { items } = await read<{ items: { entry: EntryView }[] }>(await entries.queue(moderator));
      const waiting = items.find(({ entry }) => entry.id === id)?.entry;
      const answer = await entries.decide(moderator, id, { decision: 'accept' });
      expect(answer.ok).toBe(waiting !== undefined);
      if (waiting)
        world.public = { title: waiting.title ?? '', readings: waiting.readings.map((one) => one.id) };
      break;
    }
    case 'return':
      await entries.decide(moderator, id, { decision: 'return', note: 'Look again, please.' });
      break;
    case 'withdraw':
      // A draft that nobody has read would be deleted, and the walk with it.
      if (mine.status !== 'draft') await entries.remove(owner, id, mine.revision);
      break;
    case 'redraft':
      await entries.redraft(owner, id);
      break;
  }
  await look(world);
}

async function look({ id, readings, public: expected }: World): Promise<void> {
  const mine = await read<EntryView>(await entries.get(owner, id));
  expect(new Set(mine.readings.map((one) => one.id))).toEqual(readings);
  const open = await entries.get(null, id);
  if (mine.status === 'accepted') {
    const view = await read<EntryView>(open);
    expect({ title: view.title, readings: view.readings.map((one) => one.id).sort() }).toEqual({
      title: expected?.title,
      readings: expected?.readings.sort(),
    });
  } else {
    expect(open.status).toBe(404);
  }
  const row = await database()('entries')
    .where({ id })
    .first<{ working_id: number; waiting_id: number | null; accepted_id: number | null }>();
  const kept = await database()('revisions')
    .where({ entry_id: id })
    .whereNull('accepted_at')
    .pluck<number[]>('id');
  for (const revision of kept) expect([row.working_id, row.waiting_id]).toContain(revision);
}
