// Plain Node.js, for it runs before anything is installed. Says what it does on standard error, so that commands
// whose output is read by other programs stay clean.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';

const STAMP = 'node_modules/.aftercut-lock-hash';
const LOCK = '.install-lock';
const LOCK_WAIT_MS = 600_000;

const say = (line) => process.stderr.write(`${line}\n`);
const sleep = (ms) => Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, ms);
const wanted = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
const isInstalled = () => existsSync(STAMP) && readFileSync(STAMP, 'utf8') === wanted;

const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
if (major !== 20 || minor < 19) {
  say(`Aftercut runs on Node.js 20.19 or a later 20; this is ${process.versions.node}.`);
  process.exit(1);
}

if (!isInstalled()) {
  takeLock();
  try {
    if (!isInstalled()) install();
  } finally {
    rmSync(LOCK, { recursive: true, force: true });
  }
}

/** Two commands may start at once in a fresh clone; one installs, the other waits. */
function takeLock() {
  const deadline = Date.now() + LOCK_WAIT_MS;
  for (let said = false; ; sleep(200)) {
    try {
      mkdirSync(LOCK);
      writeFileSync(`${LOCK}/pid`, String(process.pid));
      return;
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
    }
    if (!holderLives()) rmSync(LOCK, { recursive: true, force: true });
    else if (Date.now() > deadline) {
      say('Another installation of the npm packages does not end. Stop it, or remove .install-lock.');
      process.exit(1);
    } else if (!said) {
      say('Waiting for another installation of the npm packages …');
      said = true;
    }
  }
}

function holderLives() {
  try {
    process.kill(Number(readFileSync(`${LOCK}/pid`, 'utf8')), 0);
    return true;
  } catch (error) {
    // Between the folder and its pid there is a moment; a holder that died in it is found on the next look.
    if (error.code === 'ENOENT') sleep(500);
    return existsSync(`${LOCK}/pid`) && error.code === 'EPERM';
  }
}

function install() {
  say('Installing the npm packages; the first time takes about a minute …');
  const outcome = spawnSync('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], {
    stdio: ['ignore', 'ignore', 'pipe'],
    encoding: 'utf8',
  });
  if (outcome.status !== 0) {
    say(
      `The npm packages could not be installed:\n${(outcome.stderr ?? '').trim().split('\n').slice(-6).join('\n')}`,
    );
    process.exit(1);
  }
  writeFileSync(STAMP, wanted);
}
