import { expect, it } from 'vitest';
import { plainError } from '@/lib/log/plain-error';

it('keeps what people wrote out of the log when the database refuses it', () => {
  const sql = "insert into `people` (`email`) values ('ana@people.example')";
  const sqlMessage = "Duplicate entry 'ana@people.example' for key 'people_email'";
  const error = Object.assign(new Error(`${sql} - ${sqlMessage}`), {
    sql,
    sqlMessage,
    code: 'ER_DUP_ENTRY',
    errno: 1062,
  });
  const line = plainError(error);
  expect(JSON.stringify(line)).not.toContain('ana@people.example');
  expect(line).toMatchObject({
    code: 'ER_DUP_ENTRY',
    errno: 1062,
    message: "Duplicate entry '…' for key '…'",
  });
  expect(line['stack']).toContain('plain-error.test.ts');
});

it('leaves any other error as it is', () => {
  const error = new TypeError('a plain mistake');
  expect(plainError(error)).toMatchObject({
    type: 'TypeError',
    message: 'a plain mistake',
    stack: error.stack,
  });
  expect(plainError('a text')).toEqual({ message: 'a text' });
});
