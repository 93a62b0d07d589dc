import { env } from '@/lib/env';

const LOOPBACK_NAMES = new Set(['localhost', '127.0.0.1', '[::1]']);

/** `localhost` and `127.0.0.1` name the same place; anything else stands for itself. */
function canonical(origin: string): string | null {
  try {
    const url = new URL(origin);
    const host = LOOPBACK_NAMES.has(url.hostname) ? '127.0.0.1' : url.hostname;
    return `${url.protocol}//${host}:${url.port || (url.protocol === 'https:' ? '443' : '80')}`;
  } catch {
    return null;
  }
}

/** Whether a request with this `Origin` header comes from the app's own pages. No header: a script, which passes. */
export function isOwnOrigin(origin: string | null, appUrl = env().APP_URL): boolean {
  return origin === null || canonical(origin) === canonical(appUrl);
}
