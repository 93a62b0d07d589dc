import { z } from 'zod';

export type Page<Item> = { items: Item[]; nextCursor: string | null };

/** A place in a list: the sort values of its last item. What it holds is nobody's business but the list's. */
export const Cursor = z
  .string()
  .max(500, 'is not a cursor of this list')
  .transform((text, context): [string, string] => {
    try {
      const value: unknown = JSON.parse(Buffer.from(text, 'base64url').toString('utf8'));
      return z.tuple([z.string(), z.string()]).parse(value);
    } catch {
      context.addIssue({
        code: 'custom',
        message: 'is not a cursor of this list; leave it out to start again',
      });
      return z.NEVER;
    }
  });

export function writeCursor(place: [string, string]): string {
  return Buffer.from(JSON.stringify(place)).toString('base64url');
}

/** How many items a page holds: 1 to 200. */
export const Limit = z.coerce
  .number('must be a whole number from 1 to 200')
  .int('must be a whole number from 1 to 200')
  .min(1, 'must be 1 or more')
  .max(200, 'must be 200 or less');
