import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { connect } from '@/db/connection';
import { migrate } from '@/db/migrate';
import { startServer } from '@/db/server/server';
import { generateDemo } from '@/lib/demo/generate';
import { insertDemo } from '@/lib/demo/insert';
import { DEMO_SEED } from '@/lib/demo/seed';
import { NOBODYS_HASH } from '@/lib/people/passwords';
import { allSpecies } from '@/lib/species/catalogue';
import { syncSpecies } from '@/lib/species/sync';
import { untilToldToStop } from '../start/signals';
import { startProduct } from '../test/product';
import { alone, load, type Load } from './load';

const say = console.log;
const SPECIES = 'ficus-carica';

/**
 * Pages against an empty page of the same build and headers, the response route against a constant through the same
 * wrapper, and the second start; all in one run, so that only ratios matter. With `entries`, on so many.
 */
export async function benchPages({
  entries,
  seconds,
}: {
  entries: number | undefined;
  seconds: number;
}): Promise<void> {
  const dataDir = mkdtempSync(join(tmpdir(), 'aftercut-bench-'));
  const told = untilToldToStop();
  try {
    if (entries !== undefined) await fill(dataDir, entries);
    const first = await startProduct(dataDir, ['--import', 'tsx'], told);
    await first.stop();
    const started = performance.now();
    const product = await startProduct(dataDir, ['--import', 'tsx'], told);
    say(`second start: ${((performance.now() - started) / 1000).toFixed(1)} s (aim: under 10)`);
    try {
      await measure(product.url, seconds);
      await coldResponses(product.url);
    } finally {
      await product.stop();
    }
  } finally {
    told.done();
    rmSync(dataDir, { recursive: true, force: true });
  }
}

async function measure(url: string, seconds: number): Promise<void> {
  const list = await fetch(`${url}/api/entries?species=${SPECIES}&status=accepted&limit=1`);
  const { items } = (await list.json()) as { items: { id: string }[] };
  const empty = await load(`${url}/measure/empty`, seconds);
  line('an empty page', empty);
  for (const path of ['/', `/species/${SPECIES}`, `/entries/${items[0]?.id}`]) {
    line(path, await load(url + path, seconds), empty, 0.35);
  }
  const constant = await load(`${url}/api/measure/constant`, seconds);
  line('a constant through handler()', constant);
  const response = `/api/species/${SPECIES}/response`;
  line(response, await load(url + response, seconds), constant, 0.6);
}

/** The first answer of each species, with nothing kept yet. */
async function coldResponses(url: string): Promise<void> {
  const median = await alone(allSpecies().map(({ slug }) => `${url}/api/species/${slug}/response?weeks=9`));
  const repeated = await alone(Array.from({ length: 200 }, () => `${url}/api/species/${SPECIES}/response`));
  say(
    `response, one at a time: ${repeated.toFixed(1)} ms median kept, ${median.toFixed(1)} ms over all species not kept (aim: under 50)`,
  );
}

function line(name: string, now: Load, baseline?: Load, aim?: number): void {
  const ratio = baseline ? `  ratio ${(now.perSecond / baseline.perSecond).toFixed(2)} (aim: ${aim})` : '';
  say(`${name}: ${now.perSecond.toFixed(0)} requests/s, median ${now.medianMs.toFixed(1)} ms${ratio}`);
}

async function fill(dataDir: string, entries: number): Promise<void> {
  say(`Making ${entries} invented entries …`);
  const server = await startServer({ dataDir, log: say });
  const db = connect(server.url, { poolMax: 2, statementTimeoutSeconds: 600 });
  try {
    await migrate(db);
    await syncSpecies(db);
    const today = new Date().toISOString().slice(0, 10);
    const demo = generateDemo({ seed: DEMO_SEED, today, entries });
    const moderator = demo.people.find(({ role }) => role === 'moderator');
    if (!moderator) throw new Error('the demo has no moderator');
    await db.transaction((trx) =>
      insertDemo(trx, demo, { acceptedBy: moderator.id, passwordHashOf: () => NOBODYS_HASH }),
    );
  } finally {
    await db.destroy();
    await server.stop();
  }
}
