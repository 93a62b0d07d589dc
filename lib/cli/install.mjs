// Plain Node.js, for it runs before anything is installed. Says what it does on standard error, so that commands
// whose output is read by other programs stay clean.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

const STAMP = 'node_modules/.aftercut-lock-hash';
const LOCK = '.install-lock';
const LOCK_WAIT_MS = 600_000;
const LOOK_MS = 200;

const say = (line) => process.stderr.write(`${line}\n`);
const sleep = (ms) => Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, ms);

process.chdir(fileURLToPath(new URL('../..', import.meta.url)));
const wanted = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
const isInstalled = () => existsSync(STAMP) && readFileSync(STAMP, 'utf8') === wanted;

try {
  refuseOtherNode();
  if (!isInstalled()) {
    takeLock();
    try {
      if (!isInstalled()) install();
    } finally {
      rmSync(LOCK, { recursive: true, force: true });
    }
  }
} catch (error) {
  say(error.message);
  process.exitCode = 1;
}

function refuseOtherNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major !== 20 || minor < 19) {
    throw new Error(`Aftercut runs on Node.js 20.19 or a later 20; this is ${process.versions.node}.`);
  }
}

/** Two commands may start at once in a fresh clone; one installs, the other waits. */
function takeLock() {
  const deadline = Date.now() + LOCK_WAIT_MS;
  for (let said = false; ; sleep(LOOK_MS)) {
    try {
      mkdirSync(LOCK);
      writeFileSync(`${LOCK}/pid`, String(process.pid));
      return;
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
    }
    if (!holderLives(LOCK)) {
      clearStale();
    } else if (Date.now() > deadline) {
      throw new Error(`Another installation of the npm packages does not end. Stop it, or remove ${LOCK}.`);
    } else if (!said) {
      say('Waiting for another installation of the npm packages …');
      said = true;
    }
  }
}

/** Two may find the same stale lock; what the slower one takes away could be the quicker one's, and is put back. */
function clearStale() {
  const aside = `${LOCK}.${process.pid}`;
  try {
    renameSync(LOCK, aside);
    if (holderLives(aside)) renameSync(aside, LOCK);
    else rmSync(aside, { recursive: true, force: true });
  } catch (error) {
    if (error.code !== 'ENOENT') throw error;
  }
}

function holderLives(lock) {
  // Between the folder and its pid there is a moment; a holder that died in it has written none on the next look either.
  if (!existsSync(`${lock}/pid`)) sleep(2 * LOOK_MS);
  try {
    const pid = Number(readFileSync(`${lock}/pid`, 'utf8'));
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes('install.mjs');
  } catch {
    return false;
  }
}

function install() {
  if (!hasAllPackages()) {
    say('Installing the npm packages; the first time takes about a minute …');
    const outcome = spawnSync('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], {
      stdio: ['ignore', 'ignore', 'pipe'],
      encoding: 'utf8',
    });
    if (outcome.status !== 0) {
      const why = (outcome.stderr || String(outcome.error ?? '')).trim().split('\n').slice(-6).join('\n');
      throw new Error(`The npm packages could not be installed:\n${why}`);
    }
  }
  writeFileSync(STAMP, wanted);
}

/** Whether npm itself, run by hand, already left every package of the lock file there in its version. */
function hasAllPackages() {
  try {
    const there = JSON.parse(readFileSync('node_modules/.package-lock.json', 'utf8')).packages;
    const { packages } = JSON.parse(readFileSync('package-lock.json', 'utf8'));
    return Object.entries(packages).every(
      ([path, { version, optional }]) => path === '' || optional || there[path]?.version === version,
    );
  } catch {
    return false;
  }
}
