import { vi } from 'vitest';

// The settings that the start command would give.
process.env['AUTH_SECRET'] ??= 'a secret of these tests, and of nothing else';

// Outside a running server Next.js has no request to take cookies from, so the request that a test sends gives them.
vi.mock('next/headers', async () => {
  const { cookieJar } = await import('./cookie-jar');
  return {
    cookies: async () => cookieJar.getStore() ?? { get: () => undefined },
    headers: async () => new Headers(),
  };
});
