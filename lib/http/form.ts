import { Malformed, TooLarge, WrongType } from '@/lib/errors/errors';
import { readBytes } from './body';

const FORM_LIMIT_BYTES = 20_000;

/**
 * The fields of a short form, sent as a form or as a flat JSON object. Of a repeated name the last one counts.
 * @throws WrongType, TooLarge, Malformed
 */
export async function readForm(request: Request): Promise<Record<string, string>> {
  const type = request.headers.get('content-type') ?? '';
  const isForm = /^application\/x-www-form-urlencoded\b/i.test(type);
  if (!isForm && !/^application\/json\b/i.test(type)) {
    throw new WrongType('Send it as a form (application/x-www-form-urlencoded).');
  }
  const bytes = await readBytes(request, FORM_LIMIT_BYTES);
  if (!bytes) throw new TooLarge(`This form may have at most ${FORM_LIMIT_BYTES} bytes.`);
  const text = new TextDecoder().decode(bytes);
  return isForm ? Object.fromEntries(new URLSearchParams(text)) : flat(text);
}

function flat(text: string): Record<string, string> {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    throw new Malformed('The body is not valid JSON.');
  }
  if (typeof value !== 'object' || value === null) throw new Malformed('The body must be a JSON object.');
  return Object.fromEntries(Object.entries(value).map(([name, field]) => [name, String(field)]));
}
