import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

const root = fileURLToPath(new URL('../../..', import.meta.url));
const reference = 'tests/reference/resprout/plants.csv';
let folder = '';

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'seen-'));
  writeFileSync(join(folder, 'bad.csv'), 'count,alive\n3,1\n-2,1\n');
  writeFileSync(join(folder, 'empty.csv'), '');
  writeFileSync(join(folder, 'header.csv'), 'count,alive\n');
  writeFileSync(join(folder, 'dead.csv'), 'count,alive\n3,1\n2,0\n');
  writeFileSync(join(folder, 'latin.csv'), Buffer.from('count,site\n3,Cabe\xe7o\n', 'latin1'));
});
afterAll(() => rmSync(folder, { recursive: true }));

function run(...args: string[]) {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    ['--import', 'tsx', 'lib/cli/seen.ts', ...args],
    {
      cwd: root,
      encoding: 'utf8',
      env: { ...process.env, INIT_CWD: folder },
    },
  );
  return { status, stdout, stderr };
}

describe('the seen command', { timeout: 60_000 }, () => {
  it('prints the figures of a table as JSON and nothing else, through npm', () => {
    const { status, stdout, stderr } = spawnSync(
      'npm',
      [
        'run',
        '--silent',
        'seen',
        '--',
        reference,
        '--count',
        'count',
        '--alive',
        'resprouted',
        '--group',
        'site',
      ],
      { cwd: root, encoding: 'utf8' },
    );
    expect([status, stderr]).toEqual([0, '']);
    const { all, groups } = JSON.parse(stdout) as {
      all: { cut: number };
      groups: Record<string, { cut: number }>;
    };
    expect(all).toMatchObject({ cut: 238, resprouted: 206, perResprouting: { n: 199 }, perCut: { n: 231 } });
    expect(groups["Cabeco d'or"]).toMatchObject({ cut: 25, resprouted: 23, perResprouting: { n: 21 } });
  });

  it('finds a file from where it was called, and reads what an old spreadsheet wrote', () => {
    const { status, stdout } = run('latin.csv', '--count=count', '--group=site');
    expect(status).toBe(0);
    expect(Object.keys((JSON.parse(stdout) as { groups: object }).groups)).toEqual(['Cabeço']);
  });

  it('has no figure for a table without plants', () => {
    const { status, stdout } = run('header.csv', '--count', 'count', '--alive', 'alive');
    expect(status).toBe(0);
    expect(JSON.parse(stdout)).toMatchObject({ all: { cut: 0, share: null, wilson95: null }, groups: {} });
  });

  it('says on the side that a dead plant has a count, and takes it as 0', () => {
    const { status, stdout, stderr } = run('dead.csv', '--count', 'count', '--alive', 'alive');
    expect(status).toBe(0);
    expect(JSON.parse(stdout)).toMatchObject({ all: { perCut: { n: 2, mean: 1.5 } } });
    expect(stderr).toBe('seen: dead.csv: not alive, yet with a count over 0, taken as 0: row 3\n');
  });

  it('explains itself', () => {
    const { status, stdout } = run('--help');
    expect(status).toBe(0);
    expect(stdout).toMatch(/Left out: a plant with a count over 0 resprouted/);
  });

  it.each([
    [
      ['bad.csv', '--count', 'count'],
      'seen: bad.csv: row 3, column "count": "-2" is no whole number of 0 or more',
    ],
    [
      ['bad.csv', '--count', 'shoots'],
      'seen: bad.csv: row 1: no column "shoots"; there are "count", "alive"',
    ],
    [['empty.csv', '--count', 'count'], 'seen: empty.csv: the file is empty'],
    [['nowhere.csv', '--count', 'count'], 'seen: nowhere.csv: no such file'],
    [['.', '--count', 'count'], 'seen: .: is a folder'],
    [['bad.csv'], 'seen: which column has the counts? Say --count COLUMN'],
    [['--count', 'count'], 'seen: which file? Say for example: plants.csv --count count'],
    [['bad.csv', 'empty.csv', '--count', 'count'], 'seen: one file at a time, not also "empty.csv"'],
    [['bad.csv', '--count', 'count', '--colour', 'red'], "seen: Unknown option '--colour'"],
    [['bad.csv', '--count'], "seen: Option '--count <value>' argument missing"],
  ])('refuses %j in one line, with status 2', (args, line) => {
    expect(run(...args)).toEqual({ status: 2, stdout: '', stderr: `${line}\n` });
  });
});
