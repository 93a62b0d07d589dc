import { z } from 'zod';
import { env } from '@/lib/env';
import { SIGN_UP_FIELDS } from './schema';

const NAME = 'typed';
const FOR_SECONDS = 300;

const Typed = z.object({
  email: z.string().max(400).optional(),
  name: z.string().max(400).optional(),
  errors: z.array(z.object({ path: z.enum(SIGN_UP_FIELDS), message: z.string() })).optional(),
});
/** What a form held and what was wrong with it; never a password. */
export type Typed = z.output<typeof Typed>;

/**
 * A cookie that carries what was typed back to the page it was typed into, for five minutes. Not in the address, where it
 * would stay in histories and logs.
 */
export function keepTyped(page: string, typed: Typed): string {
  const value = Buffer.from(JSON.stringify(shortened(typed))).toString('base64url');
  const secure = env().APP_URL.startsWith('https:') ? '; Secure' : '';
  return `${NAME}=${value}; Path=${page}; Max-Age=${FOR_SECONDS}; HttpOnly; SameSite=Lax${secure}`;
}

export function forgetTyped(page: string): string {
  return `${NAME}=; Path=${page}; Max-Age=0; HttpOnly; SameSite=Lax`;
}

/** What the last form on this page held, if it was sent back. */
export function readTyped(cookies: { get(name: string): { value: string } | undefined }): Typed {
  try {
    const text = Buffer.from(cookies.get(NAME)?.value ?? '', 'base64url').toString('utf8');
    return Typed.parse(JSON.parse(text));
  } catch {
    return {};
  }
}

function shortened(typed: Typed): Typed {
  return {
    ...typed,
    ...(typed.email && { email: typed.email.slice(0, 400) }),
    ...(typed.name && { name: typed.name.slice(0, 400) }),
  };
}
