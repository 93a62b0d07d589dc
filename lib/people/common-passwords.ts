import { readFileSync } from 'node:fs';
import path from 'node:path';

let known: Set<string> | undefined;

function list(): Set<string> {
  const file = path.join(process.cwd(), 'content', 'common-passwords.txt');
  return (known ??= new Set(
    readFileSync(file, 'utf8')
      .split('\n')
      .map((line) => line.trim())
      .filter((line) => line !== '' && !line.startsWith('#')),
  ));
}

/** Whether a password is among the first that a guesser tries: on the list, or a short piece said over and over. */
export function isCommonPassword(password: string): boolean {
  const plain = password.normalize('NFKC').toLowerCase();
  return list().has(plain) || /^(.{1,4})\1+.{0,3}$/su.test(plain) || isRow(plain);
}

/** `123456789012`, `abcdefghijkl`, and the same backwards. */
function isRow(text: string): boolean {
  const rows = [
    '01234567890123456789012345678901234567890',
    'abcdefghijklmnopqrstuvwxyz',
    'qwertyuiopasdfghjklzxcvbnm',
  ];
  return rows.some((row) => row.includes(text) || [...row].reverse().join('').includes(text));
}
