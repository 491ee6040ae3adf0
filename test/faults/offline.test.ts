import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { DemoWalk } from '../helpers/walk-the-demo.ts';

const at = (path: string) => fileURLToPath(new URL(`../helpers/${path}`, import.meta.url));
const walk = at('walk-the-demo.ts');

let home: string;
beforeEach(() => void (home = mkdtempSync(join(tmpdir(), 'footing-offline-'))));
afterEach(() => rmSync(home, { recursive: true }));

const run = (program: string, args: string[], environment: NodeJS.ProcessEnv = {}) =>
  spawnSync(program, args, { encoding: 'utf8', env: { ...process.env, ...environment }, timeout: 100_000 });

/** Runs a script of Node with the tripwire in it; answers what the tripwire wrote. */
function withTripwire(args: string[]) {
  const record = join(home, 'tripwire.txt');
  const outcome = run(process.execPath, args, {
    NODE_OPTIONS: `--import=${pathToFileURL(at('network-tripwire.ts')).href}`,
    FOOTING_TRIPWIRE: record,
  });
  return { ...outcome, lines: readFileSync(record, 'utf8').trim().split('\n') };
}

function expectWholeWalk(output: string): DemoWalk {
  const demo = JSON.parse(output) as DemoWalk;
  expect(Object.entries(demo.answers).filter(([, isAnswered]) => !isAnswered)).toEqual([]);
  expect(Object.keys(demo.pages).length).toBeGreaterThan(1);
  expect(Object.values(demo.pages).every((status) => status === 200)).toBe(true);
  expect(demo.exitStatus).toBe(0);
  return demo;
}

describe('the tripwire', () => {
  it.each([
    ['fetch("http://footing.example/").catch(() => {})', 'footing.example'],
    ['require("net").connect(80, "192.0.2.1")', '192.0.2.1'],
    ['require("net").connect({ port: 80, host: "192.0.2.1" })', '192.0.2.1'],
    ['require("https").get("https://192.0.2.1/")', '192.0.2.1'],
    ['require("dns").lookup("footing.example", () => {})', 'footing.example'],
    ['require("dns").promises.resolve("footing.example")', 'footing.example'],
    ['import("node:dns/promises").then(({ lookup }) => lookup("footing.example"))', 'footing.example'],
    ['require("dgram").createSocket("udp4")', 'datagram'],
    ['require("net").createServer().listen(0)', 'every interface'],
    ['require("http").createServer().listen(0, "0.0.0.0")', '0.0.0.0'],
    [
      'new (require("worker_threads").Worker)(new URL(`data:text/javascript,fetch("http://192.0.2.1/")`)).on("error", () => {})',
      '192.0.2.1',
    ],
    ['require("child_process").execFileSync(process.execPath, ["-e", "fetch(`http://192.0.2.1/`)"])', '192.0.2.1'],
  ])('is set off by %s', (script, what) => {
    const tried = withTripwire(['-e', script]).lines.filter((line) => line.startsWith('tried: '));
    expect(tried).toEqual([expect.stringContaining(what)]);
  });

  it('is not set off by this machine talking to itself', () => {
    const script = `
      const server = require('http').createServer((_, response) => response.end('yes'));
      server.listen(0, '127.0.0.1', async () => {
        console.log(await (await fetch('http://127.0.0.1:' + server.address().port)).text());
        server.close();
        server.closeAllConnections();
      });`;
    const { lines, stdout } = withTripwire(['-e', script]);
    expect(stdout).toBe('yes\n');
    expect(lines).toEqual(['armed: main thread']);
  });
});

describe('Footing', { timeout: 120_000 }, () => {
  it('walks through the worked example without trying the network once, in any of its threads', () => {
    const { stdout, stderr, lines } = withTripwire([walk, home]);
    expect(stderr).toBe('');
    expectWholeWalk(stdout);
    expect(lines.filter((line) => line.startsWith('tried: '))).toEqual([]);
    // The walker itself, the host, and the worker that computes.
    expect(lines.filter((line) => line === 'armed: main thread')).toHaveLength(2);
    expect(lines.filter((line) => line === 'armed: worker thread').length).toBeGreaterThan(0);
  });

  it('walks through the worked example on a machine without any network interface', ({ skip }) => {
    const isolated = (command: string, ...args: string[]) =>
      run('unshare', ['--map-root-user', '--net', 'sh', '-c', `ip link set lo up && exec ${command}`, 'sh', ...args]);
    const trial = isolated('true');
    if (trial.status !== 0) {
      const reason = trial.error?.message ?? trial.stderr.trim();
      console.log(`skipped: a machine without a network cannot be made here (${reason})`);
      skip(`a machine without a network cannot be made here: ${reason}`);
    }
    const { stdout, stderr } = isolated('"$@"', process.execPath, walk, home);
    expect(stderr).toBe('');
    expect(expectWholeWalk(stdout).interfaces).toEqual(['lo']);
  });
});
