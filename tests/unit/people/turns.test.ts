import { expect, it } from 'vitest';
import { inTurn } from '@/lib/people/turns';

it('runs what is asked under one key in turn, and other keys meanwhile', async () => {
  const said: string[] = [];
  let letGo = () => undefined as void;
  const held = new Promise<void>((resolve) => (letGo = resolve));
  const first = inTurn('a', async () => {
    said.push('a1 begins');
    await held;
    said.push('a1 ends');
  });
  const second = inTurn('a', async () => void said.push('a2'));
  await inTurn('b', async () => void said.push('b'));
  letGo();
  await Promise.all([first, second]);
  expect(said).toEqual(['a1 begins', 'b', 'a1 ends', 'a2']);
});

it('goes on after one that failed', async () => {
  const failing = inTurn('a', () => Promise.reject(new Error('no')));
  const next = inTurn('a', async () => 'yes');
  await expect(failing).rejects.toThrow('no');
  expect(await next).toBe('yes');
});
