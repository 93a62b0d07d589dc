import { z } from 'zod';
import { Invalid, Malformed, TooLarge, WrongType, type FieldError } from '@/lib/errors/errors';

export const JSON_LIMIT_BYTES = 1_000_000;

/** The bytes of a body, or null once more than `limit` have come: the rest is not read. */
export async function readBytes(request: Request, limit = JSON_LIMIT_BYTES): Promise<Uint8Array | null> {
  if (Number(request.headers.get('content-length') ?? 0) > limit) return null;
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body?.getReader();
  while (reader) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > limit) {
      await reader.cancel();
      return null;
    }
    chunks.push(value);
  }
  return Buffer.concat(chunks);
}

/**
 * The body as JSON that fits `schema`.
 * @throws WrongType, TooLarge, Malformed or Invalid, asked in this order.
 */
export function parseBody<T>(schema: z.ZodType<T>, contentType: string | null, bytes: Uint8Array | null): T {
  if (!/^application\/json\b/i.test(contentType ?? '')) throw new WrongType('Send it as application/json.');
  if (!bytes)
    throw new TooLarge(`A body may have at most ${JSON_LIMIT_BYTES} bytes. Shorten it; nothing was stored.`);
  return parsed(schema, readJson(bytes));
}

function readJson(bytes: Uint8Array): unknown {
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch {
    throw new Malformed('The body is not valid JSON in UTF-8.');
  }
}

/** @throws Invalid with a path and a message for each thing that does not fit. */
export function parsed<T>(schema: z.ZodType<T>, value: unknown): T {
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  throw new Invalid(fieldErrors(result.error));
}

export function fieldErrors(error: z.ZodError): FieldError[] {
  return error.issues.flatMap((issue) => {
    const path = issue.path.map(String).join('.');
    if (issue.code !== 'unrecognized_keys') return [{ path, message: issue.message }];
    return issue.keys.map((key) => ({
      path: path ? `${path}.${key}` : key,
      message: 'is not a field here; leave it out',
    }));
  });
}
