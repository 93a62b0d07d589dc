import { describe, expect, it } from 'vitest';
import { Saver } from '@/components/entry/editor/save';
import { send } from '@/components/entry/editor/send';
import type { Outcome, Transport } from '@/components/entry/editor/transport';
import type { FieldError } from '@/lib/errors/errors';
import { content, ENTRY, HandClock, reading, READING, viewOf } from './factories';

const done: Outcome = { kind: 'done', view: viewOf(content({ title: 'x' }), 4), revision: 4 };

/** A bench that answers as told, and an editor with something unsaved in it. */
function desk({ put = done, submit = done, problems = [] as FieldError[], isTouched = true } = {}) {
  const asked: string[] = [];
  const answer = (name: string, outcome: Outcome) => async () => (asked.push(name), outcome);
  const transport: Transport = {
    put: answer('put', put),
    get: answer('get', done),
    submit: answer('submit', submit),
  };
  const saver = new Saver({
    id: ENTRY,
    revision: isTouched ? 3 : null,
    base: content(),
    write: () => ({ content: content({ title: 'x', readings: [reading()] }), problems }),
    keep: (copy) => copy !== null,
    adopt: () => undefined,
    transport,
    clock: new HandClock(),
  });
  if (isTouched) saver.touch();
  return { asked, saver };
}

describe('sending to the bench', () => {
  it('saves first, then sends', async () => {
    const { asked, saver } = desk();
    expect(await send(saver)).toEqual({ kind: 'sent' });
    expect(asked).toEqual(['put', 'submit']);
  });

  it('names all that the bench lacks, each by its field', async () => {
    const errors = [{ path: 'readings.0.date', message: 'is needed' }];
    const { saver } = desk({ submit: { kind: 'invalid', errors, detail: '' } });
    const result = await send(saver);
    expect(result).toMatchObject({ kind: 'stopped', errors: [{ path: `readings.${READING}.date` }] });
    expect(saver.state().lacks).toHaveLength(1);
  });

  it.each<[string, Outcome, RegExp]>([
    ['there is no signal', { kind: 'later', afterMs: null }, /not sent/],
    ['the sign-in has expired', { kind: 'signed-out' }, /Sign in again/],
    [
      'the server refuses a field',
      { kind: 'invalid', errors: [{ path: 'title', message: 'x' }], detail: '' },
      /needs a look/,
    ],
    ['the server refuses it whole', { kind: 'refused', detail: 'It is withdrawn.' }, /withdrawn/],
  ])('sends nothing where %s', async (_why, put, title) => {
    const { asked, saver } = desk({ put });
    expect(await send(saver)).toMatchObject({
      kind: 'stopped',
      title: expect.stringMatching(title) as string,
    });
    expect(asked).toEqual(['put']);
  });

  it('sends nothing while a field cannot be read', async () => {
    const { asked, saver } = desk({ problems: [{ path: 'cut.branches', message: 'x' }] });
    expect(await send(saver)).toMatchObject({ kind: 'stopped', errors: [{ path: 'cut.branches' }] });
    expect(asked).not.toContain('submit');
  });

  it('sends nothing where nothing was written', async () => {
    const { asked, saver } = desk({ isTouched: false });
    expect(await send(saver)).toMatchObject({ kind: 'stopped', title: 'There is nothing in it yet' });
    expect(asked).toEqual([]);
  });
});
