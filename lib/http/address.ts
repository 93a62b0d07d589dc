import { subscribe } from 'node:diagnostics_channel';
import type { IncomingMessage } from 'node:http';
import { env } from '@/lib/env';

const SOCKET_HEADER = 'x-socket-address';

// A route handler has no socket to ask, and the address that Next.js itself puts into X-Forwarded-For is whatever the
// client sent there. So each request is marked with its socket's address as it arrives, over anything sent in that name.
const shared = globalThis as typeof globalThis & { aftercutMarksSockets?: boolean };

/** Starts marking requests with the address they came from, and reading where they go. Called once, when the server starts. */
export function markSocketAddresses(): void {
  if (shared.aftercutMarksSockets) return;
  shared.aftercutMarksSockets = true;
  subscribe('http.server.request.start', (message) => {
    const { request } = message as { request: IncomingMessage };
    request.headers[SOCKET_HEADER] = request.socket.remoteAddress ?? '';
    request.url = readableAddress(request.url ?? '/');
  });
}

/** Where an address leads that is not valid percent-encoding, which Next.js itself would answer with a bare 500. */
export const MALFORMED_ADDRESS = '/api/malformed-address';

function readableAddress(url: string): string {
  const [path = '/'] = url.split('?');
  try {
    decodeURIComponent(path);
    return url;
  } catch {
    return path.startsWith('/api/') ? MALFORMED_ADDRESS : '/malformed-address';
  }
}

/**
 * The address a request came from, for counting tries: the socket's, or with TRUST_PROXY=n the n-th from the right of
 * X-Forwarded-For, which the outermost trusted proxy wrote. `unknown` where neither is there. An IPv6 address stands for
 * its /64, which one subscriber has to themself (common practice, no source).
 */
export function clientAddress(headers: Headers, trustedProxies = env().TRUST_PROXY): string {
  const socket = shared.aftercutMarksSockets ? headers.get(SOCKET_HEADER) : null;
  if (trustedProxies === 0) return network(socket);
  const forwarded = (headers.get('x-forwarded-for') ?? '').split(',').map((part) => part.trim());
  return network(forwarded.at(-trustedProxies) || socket);
}

function network(address: string | null): string {
  if (!address) return 'unknown';
  const plain = address.replace(/^::ffff:(?=\d+\.)/i, '').replace(/%.*$/, '');
  if (!plain.includes(':')) return plain.slice(0, 45);
  const [head = '', tail] = plain.toLowerCase().split('::');
  const left = head ? head.split(':') : [];
  const right = tail ? tail.split(':') : [];
  const zeros = tail === undefined ? 0 : Math.max(0, 8 - left.length - right.length);
  const groups = [...left, ...Array<string>(zeros).fill('0'), ...right];
  return `${groups
    .slice(0, 4)
    .map((group) => group.replace(/^0+(?=.)/, '').slice(0, 4))
    .join(':')}::/64`;
}
