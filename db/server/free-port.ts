import { createServer } from 'node:net';

/** A port on loopback that nobody listens on just now. */
export function freePort(): Promise<number> {
  return new Promise((done, fail) => {
    const probe = createServer();
    probe.once('error', fail);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() =>
        address && typeof address === 'object' ? done(address.port) : fail(new Error('no port')),
      );
    });
  });
}

/** Why this process cannot listen on a port of loopback, or null when it can. */
export function portTrouble(port: number): Promise<'taken' | 'not allowed' | null> {
  return new Promise((done) => {
    const probe = createServer();
    probe.once('error', (error: NodeJS.ErrnoException) =>
      done(error.code === 'EACCES' ? 'not allowed' : 'taken'),
    );
    probe.listen(port, '127.0.0.1', () => probe.close(() => done(null)));
  });
}
