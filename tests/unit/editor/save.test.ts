import { describe, expect, it } from 'vitest';
import { badgeOf } from '@/components/entry/editor/badge';
import { Saver } from '@/components/entry/editor/save';
import { transport } from '@/components/entry/editor/transport';
import type { EntryContent, Reading } from '@/lib/entries/schema';
import {
  content,
  cut,
  ENTRY,
  HandClock,
  OTHER_READING,
  reading,
  READING,
  settled,
  viewOf,
} from './factories';

interface Sent {
  readonly method: string;
  readonly ifMatch: string | null;
  readonly body: EntryContent | null;
  readonly keepalive: boolean;
  answer(response: Response): Promise<void>;
  fail(): Promise<void>;
}

const problem = (status: number, body: object = {}, headers: Record<string, string> = {}) =>
  new Response(JSON.stringify(body), { status, headers });
const stored = (what: EntryContent, revision: number, status = 200) =>
  new Response(JSON.stringify(viewOf(what, revision)), { status, headers: { etag: `"${revision}"` } });

/** An editor with a text in it, a server that answers when told, and a clock that is turned by hand. */
function bench({ revision = 3 as number | null, base = content({ title: 'Fig' }), device = true } = {}) {
  const requests: Sent[] = [];
  const fetcher = ((_path: string, init: RequestInit) =>
    new Promise<Response>((resolve, reject) => {
      requests.push({
        method: init.method ?? 'GET',
        ifMatch: new Headers(init.headers).get('if-match'),
        body: init.body ? (JSON.parse(String(init.body)) as EntryContent) : null,
        keepalive: init.keepalive ?? false,
        answer: (response) => (resolve(response), settled()),
        fail: () => (reject(new TypeError('no signal')), settled()),
      });
    })) as unknown as typeof fetch;
  const clock = new HandClock();
  const editor = { text: base, problems: [] as { path: string; message: string }[] };
  const kept: { copy: EntryContent | null; revision: number | null } = { copy: null, revision: null };
  const adopted: Reading[] = [];
  const saver = new Saver({
    id: ENTRY,
    revision,
    base,
    write: () => ({ content: editor.text, problems: editor.problems }),
    keep: (copy) => {
      kept.copy = copy?.content ?? null;
      kept.revision = copy?.revision ?? null;
      return device && copy !== null;
    },
    adopt: (readings) => {
      adopted.push(...readings);
      editor.text = { ...editor.text, readings: [...editor.text.readings, ...readings] };
    },
    transport: transport(fetcher),
    clock,
  });
  const type = (change: Partial<EntryContent>) => {
    editor.text = { ...editor.text, ...change };
    saver.touch();
  };
  const last = () => requests.at(-1) as Sent;
  return {
    saver,
    editor,
    kept,
    adopted,
    clock,
    requests,
    type,
    last,
    badge: () => badgeOf(saver.state()).text,
  };
}

describe('saving as it is typed', () => {
  it('keeps every letter on the device at once, and sends after a second of rest with the revision it knows', async () => {
    const { type, kept, clock, requests, last, badge, saver } = bench();
    type({ title: 'Fig b' });
    type({ title: 'Fig by' });
    expect(kept.copy?.title).toBe('Fig by');
    expect(badge()).toBe('Safe on this device.');
    await clock.pass(999);
    expect(requests).toHaveLength(0);
    await clock.pass(1);
    expect(badge()).toBe('Saving…');
    expect(last()).toMatchObject({ method: 'PUT', ifMatch: '"3"', body: { title: 'Fig by' } });
    await last().answer(stored(content({ title: 'Fig by' }), 4));
    expect(badge()).toBe('All saved.');
    expect(saver.state().revision).toBe(4);
    expect(kept.copy).toBeNull();
  });

  it('sends nothing where nothing changed', async () => {
    const { saver, clock, requests } = bench();
    saver.touch();
    await clock.pass(5000);
    expect(await saver.flush()).toBe(true);
    expect(requests).toHaveLength(0);
  });

  it('makes a new entry without a revision, and changes it with the one it was given', async () => {
    const { type, clock, last } = bench({ revision: null });
    type({ title: 'New' });
    await clock.pass(1000);
    expect(last().ifMatch).toBeNull();
    await last().answer(stored(content({ title: 'New' }), 1, 201));
    type({ title: 'Newer' });
    await clock.pass(1000);
    expect(last().ifMatch).toBe('"1"');
  });

  it('has one request under way, and the latest text wins', async () => {
    const { type, clock, requests, last, saver } = bench();
    type({ title: 'a' });
    await clock.pass(1000);
    type({ title: 'b' });
    type({ title: 'c' });
    await clock.pass(1000);
    expect(requests).toHaveLength(1);
    await last().answer(stored(content({ title: 'a' }), 4));
    expect(requests).toHaveLength(2);
    expect(last()).toMatchObject({ ifMatch: '"4"', body: { title: 'c' } });
    await last().answer(stored(content({ title: 'c' }), 5));
    expect(requests).toHaveLength(2);
    expect(saver.state().phase).toBe('saved');
  });

  it('on leaving, sends at once a request that may outlive the page, if it is small enough for that', async () => {
    const { type, saver, last } = bench();
    type({ title: 'a' });
    void saver.flush({ keepalive: true });
    expect(last().keepalive).toBe(true);
    await last().answer(stored(content({ title: 'a' }), 4));
    type({
      doc: {
        type: 'doc',
        content: [{ type: 'paragraph', content: [{ type: 'text', text: 'x'.repeat(70_000) }] }],
      },
    });
    void saver.flush({ keepalive: true });
    expect(last().keepalive).toBe(false);
  });
});

describe('a signal that comes and goes', () => {
  it('tries again at growing pauses, and says where the text is meanwhile', async () => {
    const { type, clock, last, badge, requests } = bench();
    type({ title: 'a' });
    await clock.pass(1000);
    const pauses: number[] = [];
    for (let attempt = 0; attempt < 7; attempt += 1) {
      if (attempt % 2 === 0) await last().fail();
      else await last().answer(problem(503));
      expect(badge()).toBe('Safe on this device. Going up when there is a signal.');
      pauses.push(clock.pending()[0] ?? 0);
      await clock.pass(clock.pending()[0] ?? 0);
    }
    expect(pauses).toEqual([2000, 4000, 8000, 16_000, 32_000, 60_000, 60_000]);
    expect(requests).toHaveLength(8);
    await last().answer(stored(content({ title: 'a' }), 4));
    expect(badge()).toBe('All saved.');
  });

  it('typing meanwhile does not hammer the server, and the retry carries the latest', async () => {
    const { type, clock, last, requests, kept } = bench();
    type({ title: 'a' });
    await clock.pass(1000);
    await last().fail();
    type({ title: 'ab' });
    type({ title: 'abc' });
    expect(kept.copy?.title).toBe('abc');
    await clock.pass(1000);
    expect(requests).toHaveLength(1);
    await clock.pass(1000);
    expect(last().body?.title).toBe('abc');
  });

  it('waits as long as the server asks', async () => {
    const { type, clock, last } = bench();
    type({ title: 'a' });
    await clock.pass(1000);
    await last().answer(problem(429, {}, { 'retry-after': '30' }));
    expect(clock.pending()).toEqual([30_000]);
  });

  it('never calls safe what the device did not keep', async () => {
    const { type, clock, last, badge } = bench({ device: false });
    type({ title: 'a' });
    expect(badge()).toBe('Not saved yet.');
    await clock.pass(1000);
    await last().fail();
    expect(badge()).toMatch(/^Not saved yet: there is no signal/);
  });

  it.each(['a', 'ab'])(
    'an answer lost on the way back is no conflict: “%s” is stored because it was sent',
    async (arrived) => {
      const { type, clock, last, saver } = bench();
      type({ title: 'a' });
      await clock.pass(1000);
      await last().fail();
      type({ title: 'ab' });
      await clock.pass(2000);
      await last().answer(problem(412));
      expect(last().method).toBe('GET');
      await last().answer(stored(content({ title: arrived }), 5));
      if (arrived === 'a') {
        expect(last()).toMatchObject({ method: 'PUT', ifMatch: '"5"', body: { title: 'ab' } });
        await last().answer(stored(content({ title: 'ab' }), 6));
      }
      expect(saver.state()).toMatchObject({ phase: 'saved', revision: arrived === 'a' ? 6 : 5 });
    },
  );

  it('a new entry whose answer was lost is found again, not made twice', async () => {
    const { type, clock, last, saver } = bench({ revision: null });
    type({ title: 'a' });
    await clock.pass(1000);
    await last().fail();
    await clock.pass(2000);
    await last().answer(problem(428));
    await last().answer(stored(content({ title: 'a' }), 1));
    expect(saver.state()).toMatchObject({ phase: 'saved', revision: 1 });
  });
});

describe('an expired sign-in', () => {
  it('keeps all, says what to do, sends nothing by itself, and goes on when asked', async () => {
    const { type, clock, last, badge, kept, requests, saver } = bench();
    type({ title: 'a' });
    await clock.pass(1000);
    await last().answer(problem(401));
    expect(badge()).toMatch(/Safe on this device\. You are signed out: sign in again in another tab/);
    type({ title: 'ab' });
    expect(kept.copy?.title).toBe('ab');
    await clock.pass(60_000);
    expect(requests).toHaveLength(1);
    const done = saver.flush();
    await last().answer(stored(content({ title: 'ab' }), 4));
    expect(await done).toBe(true);
  });
});

describe('what the server refuses', () => {
  it('is named by field, a reading by its id, and goes up once it was changed', async () => {
    const text = { readings: [reading()], cut: cut({ branches: 4 }) };
    const { type, clock, last, saver, badge } = bench();
    type(text);
    await clock.pass(1000);
    await last().answer(
      problem(422, { detail: 'no', errors: [{ path: 'readings.0.date', message: 'lies in the future' }] }),
    );
    expect(saver.state().errors).toEqual([
      { path: `readings.${READING}.date`, message: 'lies in the future' },
    ]);
    expect(badge()).toMatch(/^Needs a look before it can be saved\. Safe on this device/);
    await clock.pass(60_000);
    expect(await Promise.resolve(saver.state().phase)).toBe('invalid');
    type({ title: 'mended' });
    await clock.pass(1000);
    await last().answer(stored(content({ title: 'mended', ...text }), 4));
    expect(saver.state()).toMatchObject({ phase: 'saved', errors: [] });
  });

  it('a field that cannot be read is not called saved, and stays on the device', async () => {
    const { editor, saver, clock, last, badge, kept } = bench();
    editor.problems = [{ path: 'cut.branches', message: 'Write a whole number.' }];
    editor.text = { ...editor.text, title: 'a' };
    saver.touch();
    await clock.pass(1000);
    await last().answer(stored(content({ title: 'a' }), 4));
    expect(badge()).toBe('All saved but 1 field that needs a look.');
    expect(kept.copy).not.toBeNull();
    expect(await saver.flush()).toBe(false);
  });
});

describe('two who changed the same entry', () => {
  const theirs = content({ title: 'Theirs' });

  async function conflict() {
    const set = bench();
    set.type({ title: 'Mine' });
    await set.clock.pass(1000);
    await set.last().answer(problem(412, { revision: 7 }));
    await set.last().answer(stored(theirs, 7));
    return set;
  }

  it('nothing is overwritten, nothing more is sent, and both versions are at hand', async () => {
    const { saver, kept, requests, clock, type } = await conflict();
    expect(saver.state()).toMatchObject({ phase: 'conflict', theirs: { title: 'Theirs', revision: 7 } });
    expect(kept.copy?.title).toBe('Mine');
    const before = requests.length;
    type({ title: 'Mine still' });
    await clock.pass(120_000);
    expect(await saver.flush()).toBe(false);
    expect(requests).toHaveLength(before);
    expect(kept.copy?.title).toBe('Mine still');
  });

  it('“keep mine” saves mine over the revision that was shown', async () => {
    const { saver, last } = await conflict();
    const done = saver.keepMine();
    expect(last()).toMatchObject({ method: 'PUT', ifMatch: '"7"', body: { title: 'Mine' } });
    await last().answer(stored(content({ title: 'Mine' }), 8));
    expect(await done).toBe(true);
  });

  it('“keep mine” asks again when it moved on meanwhile', async () => {
    const { saver, last } = await conflict();
    void saver.keepMine();
    await last().answer(problem(412));
    await last().answer(stored(content({ title: 'Theirs too' }), 9));
    expect(saver.state()).toMatchObject({ phase: 'conflict', theirs: { revision: 9 } });
  });

  it('“take theirs” gives the stored one to show, and sends nothing', async () => {
    const { saver, requests, kept, editor, clock } = await conflict();
    const before = requests.length;
    const view = saver.takeTheirs();
    expect(view?.title).toBe('Theirs');
    editor.text = theirs;
    saver.touch();
    await clock.pass(5000);
    expect(requests).toHaveLength(before);
    expect(kept.copy).toBeNull();
    expect(saver.state()).toMatchObject({ phase: 'saved', revision: 7 });
  });

  it('a reading that a helper added meanwhile joins what is being written, without a question', async () => {
    const { type, clock, last, adopted, saver } = bench();
    const added = reading({ id: OTHER_READING });
    type({ title: 'Mine' });
    await clock.pass(1000);
    await last().answer(problem(412));
    // A helper's reading stands in no document: the server keeps it beside the prose.
    await last().answer(stored(content({ title: 'Fig', readings: [added], doc: content().doc }), 4));
    expect(adopted).toEqual([added]);
    expect(last()).toMatchObject({
      method: 'PUT',
      ifMatch: '"4"',
      body: { title: 'Mine', readings: [{ id: OTHER_READING }] },
    });
    await last().answer(stored(content({ title: 'Mine', readings: [added] }), 5));
    expect(saver.state().phase).toBe('saved');
  });

  it('“keep mine” does not drop a reading that somebody else added', async () => {
    const { type, clock, last, saver } = bench();
    type({ title: 'Mine' });
    await clock.pass(1000);
    await last().answer(problem(412));
    await last().answer(stored(content({ title: 'Theirs', readings: [reading({ id: OTHER_READING })] }), 4));
    expect(saver.state().phase).toBe('conflict');
    void saver.keepMine();
    expect(last().body).toMatchObject({ title: 'Mine', readings: [{ id: OTHER_READING }] });
  });

  it('an entry deleted elsewhere is said to be, and can be made again', async () => {
    const { type, clock, last, saver, badge } = bench();
    type({ title: 'Mine' });
    await clock.pass(1000);
    await last().answer(problem(412));
    await last().answer(problem(404));
    expect(badge()).toMatch(/deleted elsewhere\. Safe on this device/);
    const done = saver.keepMine();
    expect(last()).toMatchObject({ method: 'PUT', ifMatch: null });
    await last().answer(stored(content({ title: 'Mine' }), 1, 201));
    expect(await done).toBe(true);
  });
});
