import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { clientAddress, markSocketAddresses } from '@/lib/http/address';

describe('the address that tries are counted for', () => {
  it('is unknown until requests are marked, whatever a client sends', () => {
    const headers = new Headers({ 'x-socket-address': '203.0.113.9', 'x-forwarded-for': '203.0.113.9' });
    expect(clientAddress(headers, 0)).toBe('unknown');
  });

  describe('once requests are marked', () => {
    let url = '';
    const server = createServer((request, response) => {
      const headers = new Headers();
      for (const [name, value] of Object.entries(request.headers)) headers.set(name, String(value));
      response.end(clientAddress(headers, Number(headers.get('x-trusted'))));
    });
    beforeAll(async () => {
      markSocketAddresses();
      markSocketAddresses();
      await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
      url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
    });
    afterAll(() => void server.close());

    const seen = async (headers: Record<string, string>) => (await fetch(url, { headers })).text();

    it('is the socket’s, whatever a client sends in its place', async () => {
      const lies = { 'x-socket-address': '203.0.113.9', 'x-forwarded-for': '203.0.113.9', 'x-trusted': '0' };
      expect(await seen(lies)).toBe('127.0.0.1');
    });

    it('is what the outermost trusted proxy wrote', async () => {
      const forwarded = '198.51.100.1, 203.0.113.9, 192.0.2.4';
      expect(await seen({ 'x-forwarded-for': forwarded, 'x-trusted': '1' })).toBe('192.0.2.4');
      expect(await seen({ 'x-forwarded-for': forwarded, 'x-trusted': '2' })).toBe('203.0.113.9');
    });

    it('is the socket’s where fewer proxies wrote than are trusted', async () => {
      expect(await seen({ 'x-forwarded-for': '192.0.2.4', 'x-trusted': '2' })).toBe('127.0.0.1');
      expect(await seen({ 'x-trusted': '1' })).toBe('127.0.0.1');
    });
  });

  it.each([
    ['::ffff:192.0.2.4', '192.0.2.4'],
    ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2::/64'],
    ['2001:db8:1:2:ffff::1', '2001:db8:1:2::/64'],
    ['2001:0db8::1', '2001:db8:0:0::/64'],
    ['::1', '0:0:0:0::/64'],
    ['fe80::1%eth0', 'fe80:0:0:0::/64'],
  ])('of %s is %s', (address, network) => {
    expect(clientAddress(new Headers({ 'x-forwarded-for': address }), 1)).toBe(network);
  });
});
