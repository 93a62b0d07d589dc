import { Agent, get } from 'node:http';

export type Load = { perSecond: number; medianMs: number; worstMs: number };

const AT_ONCE = 8;

/** Asks one address of this machine again and again for so many seconds, eight at a time, on kept connections. */
export async function load(url: string, seconds: number): Promise<Load> {
  const agent = new Agent({ keepAlive: true, maxSockets: AT_ONCE });
  const times: number[] = [];
  await Promise.all(Array.from({ length: AT_ONCE }, () => ask(url, agent)));
  const started = performance.now();
  const until = started + seconds * 1000;
  await Promise.all(
    Array.from({ length: AT_ONCE }, async () => {
      while (performance.now() < until) times.push(await ask(url, agent));
    }),
  );
  const elapsed = (performance.now() - started) / 1000;
  agent.destroy();
  times.sort((a, b) => a - b);
  return {
    perSecond: times.length / elapsed,
    medianMs: times[Math.floor(times.length / 2)] ?? NaN,
    worstMs: times.at(-1) ?? NaN,
  };
}

/** One request after another, so that each has the server to itself; gives the median in ms. */
export async function alone(urls: readonly string[]): Promise<number> {
  const agent = new Agent({ keepAlive: true, maxSockets: 1 });
  const times: number[] = [];
  for (const url of urls) times.push(await ask(url, agent));
  agent.destroy();
  return times.sort((a, b) => a - b)[Math.floor(times.length / 2)] ?? NaN;
}

function ask(url: string, agent: Agent): Promise<number> {
  const started = performance.now();
  return new Promise((done, fail) => {
    const request = get(url, { agent }, (answer) => {
      answer.resume();
      answer.once('end', () =>
        answer.statusCode === 200
          ? done(performance.now() - started)
          : fail(new Error(`${url}: ${answer.statusCode}`)),
      );
    });
    request.once('error', fail);
  });
}
