// npm test: types, lint, build, then every test. Goes on after a failed step, so that one run tells everything, and
// says at the very end, alone on a line, how many passed and how many failed. Arguments go to the tests.
import { spawn, spawnSync } from 'node:child_process';
import { readFileSync, rmSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { tallyFile } from './tally-reporter.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const reporters = ['--reporter=default', '--reporter=./scripts/tally-reporter.mjs'];
const testArguments = process.argv.slice(2);

/** @type {(title: string, outcome: boolean, startedAt: number) => void} */
const say = (title, outcome, startedAt) =>
  console.log(`— ${title}: ${outcome ? 'good' : 'failed'}, ${((performance.now() - startedAt) / 1000).toFixed(1)} s`);

/** @type {(title: string, program: string, args: string[]) => boolean} */
const succeeds = (title, program, args) => {
  console.log(`\n— ${title}`);
  const startedAt = performance.now();
  const { status } = spawnSync(program, args, { cwd: root, stdio: 'inherit', shell: process.platform === 'win32' });
  say(title, status === 0, startedAt);
  return status === 0;
};

/** As `succeeds`, beside others: what it prints is kept until it has ended. @type {(step: string) => Promise<boolean>} */
const succeedsBeside = (step) =>
  new Promise((resolve) => {
    const startedAt = performance.now();
    const child = spawn('npm', ['run', '--silent', step], { cwd: root, shell: process.platform === 'win32' });
    /** @type {Buffer[]} */
    const printed = [];
    child.stdout.on('data', (/** @type {Buffer} */ piece) => printed.push(piece));
    child.stderr.on('data', (/** @type {Buffer} */ piece) => printed.push(piece));
    child.on('close', (status) => {
      process.stdout.write(`\n— ${step}\n${Buffer.concat(printed).toString()}`);
      say(step, status === 0, startedAt);
      resolve(status === 0);
    });
  });

/** Neither needs the other, and each keeps one core busy. */
const beside = ['types', 'lint'];
const areGood = await Promise.all(beside.map(succeedsBeside));
const failures = beside.filter((_, place) => !areGood[place]);
if (!succeeds('build', 'npm', ['run', '--silent', 'build'])) failures.push('build');

rmSync(tallyFile, { force: true });
const hasPassed = succeeds('tests', 'vitest', ['run', ...reporters, ...testArguments]);
const { passed, failed, skipped } = readTally() ?? { passed: 0, failed: 0, skipped: [] };
// A run can say no without a failed test: it broke down before it could tell.
if (!hasPassed && failed === 0) failures.push('tests');

console.log('');
for (const { name, reason } of skipped) console.log(`skipped: ${name} (${reason ?? 'no reason given'})`);
// Tests left out by an argument need no reason; all others do.
if (testArguments.length === 0 && skipped.some(({ reason }) => reason === null))
  failures.push('a test skipped without a reason');
for (const failure of failures) console.log(`failed: ${failure}`);
console.log(`${passed} passed, ${failed + failures.length} failed`);
process.exitCode = failed + failures.length === 0 ? 0 : 1;

/** What the run came to; null when it did not come to an end. */
function readTally() {
  try {
    return JSON.parse(readFileSync(tallyFile, 'utf8'));
  } catch {
    return null;
  }
}
