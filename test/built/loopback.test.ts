import { spawn } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, it, onTestFinished } from 'vitest';
import type { Answer } from '../../src-main/contract/requests.ts';
import { enter, send } from '../helpers/http-client.ts';

const at = (path: string) => fileURLToPath(new URL(`../../${path}`, import.meta.url));
const addressPattern = /http:\/\/127\.0\.0\.1:\d+\/enter\?token=\S+/;

let home: string;
beforeEach(() => void (home = mkdtempSync(join(tmpdir(), 'footing-loopback-'))));
afterEach(() => rmSync(home, { recursive: true }));

/** Runs a built entry as a terminal does. */
function run(entry: string, args: string[], environment: NodeJS.ProcessEnv = {}) {
  const { DISPLAY: _display, WAYLAND_DISPLAY: _wayland, INIT_CWD: _directory, ...env } = process.env;
  const child = spawn(process.execPath, [entry, ...args], {
    cwd: home,
    env: { ...env, FOOTING_HOME: home, ...environment },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  onTestFinished(() => void child.kill('SIGKILL'));
  let output = '';
  let errors = '';
  const ended = new Promise<number | null>((resolve) => child.on('close', resolve));
  child.stderr.setEncoding('utf8').on('data', (text: string) => (errors += text));
  const address = new Promise<string>((resolve, reject) => {
    child.stdout.setEncoding('utf8').on('data', (text: string) => {
      output += text;
      const [found] = addressPattern.exec(output) ?? [];
      if (found) resolve(found);
    });
    void ended.then(() => reject(new Error(`no address: ${output}${errors}`)));
  });
  address.catch(() => undefined);
  return { child, address, ended, output: () => output, errors: () => errors };
}

/** A page of this host that can ask. */
async function page(address: string) {
  const { origin } = new URL(address);
  const headers = { cookie: await enter(address), origin, 'content-type': 'application/json' };
  return async (name: string, input: object) => {
    const { body } = await send(origin, {
      path: `/request/${name}`,
      method: 'POST',
      headers,
      body: JSON.stringify(input),
    });
    return JSON.parse(body) as Answer<'session.get'>;
  };
}

describe('the built loopback host', () => {
  it('prints one line with its address and answers there', async () => {
    const host = run(at('out/main/loopback.js'), []);
    const ask = await page(await host.address);
    expect(host.output().trim().split('\n')).toHaveLength(1);
    await expect(ask('session.get', {})).resolves.toMatchObject({
      ok: true,
      value: { host: 'loopback', projectsDirectory: home },
    });
    host.child.kill('SIGINT');
    expect(await host.ended).toBe(0);
    expect(host.errors()).toBe('');
  });

  it.each(['SIGINT', 'SIGTERM', 'SIGHUP'] as const)(
    'ends in good order on %s, even on two of them, with the project closed',
    async (signal) => {
      const path = join(home, 'review.footing');
      const first = run(at('out/main/loopback.js'), ['--no-open']);
      const ask = await page(await first.address);
      await ask('reviewer.set', { name: 'A. Reviewer', role: 'reviewer' });
      expect(await ask('project.create', { title: 'Review', path })).toMatchObject({ ok: true });
      first.child.kill(signal);
      first.child.kill(signal);
      expect(await first.ended).toBe(0);
      expect(first.errors()).toBe('');

      const second = run(at('out/main/loopback.js'), ['--no-open', '--project', 'review.footing']);
      const again = await page(await second.address);
      expect(await again('session.get', {})).toMatchObject({
        ok: true,
        value: { project: { path, isReadOnly: false } },
      });
    },
  );

  it('opens the worked example', async () => {
    const host = run(at('out/main/loopback.js'), ['--demo', '--no-open']);
    const ask = await page(await host.address);
    expect(await ask('session.get', {})).toMatchObject({
      ok: true,
      value: { project: { project: { isInvented: true } } },
    });
  });

  it('ends an open page’s stream of progress when it is stopped', async () => {
    const host = run(at('out/main/loopback.js'), ['--no-open']);
    const address = await host.address;
    const cookie = await enter(address);
    const stream = send(new URL(address).origin, { path: '/progress', headers: { cookie } });
    // Long enough for the stream to be open: it answers only when it ends.
    await new Promise((resolve) => setTimeout(resolve, 300));
    host.child.kill('SIGINT');
    expect((await stream).status).toBe(200);
    expect(await host.ended).toBe(0);
  });

  it('says what is wrong with an option, and with a file', async () => {
    const wrong = run(at('out/main/loopback.js'), ['--dmeo']);
    expect(await wrong.ended).toBe(2);
    expect(wrong.errors()).toContain('--dmeo');
    const missing = run(at('out/main/loopback.js'), ['--project', 'missing.footing']);
    expect([2, 3]).toContain(await missing.ended);
    expect(missing.errors()).toContain(join(home, 'missing.footing'));
    expect(wrong.output() + missing.output()).toBe('');
  });
});

describe('the built launcher', () => {
  /** What is not bundled. */
  function nativeModules(): string[] {
    const manifest = JSON.parse(readFileSync(at('package.json'), 'utf8')) as { dependencies: Record<string, string> };
    return Object.keys(manifest.dependencies);
  }

  /** The built program with its dependencies, in a place without Electron. */
  function bareInstallation(): string {
    const root = join(home, 'bare');
    mkdirSync(root);
    cpSync(at('out'), join(root, 'out'), { recursive: true });
    for (const name of nativeModules()) {
      mkdirSync(dirname(join(root, 'node_modules', name)), { recursive: true });
      symlinkSync(at(`node_modules/${name}`), join(root, 'node_modules', name), 'junction');
    }
    return root;
  }

  it('says in one line that there is no Electron and runs the loopback host in its place', async () => {
    const host = run(join(bareInstallation(), 'out/main/launch.js'), ['--no-open'], { DISPLAY: ':0' });
    const ask = await page(await host.address).catch((error: unknown) => {
      throw new Error(`${String(error)} ${host.errors()}`);
    });
    const [line, ...others] = host.output().trim().split('\n');
    expect(line).toBe(
      'Electron does not start here (its runtime is not installed); Footing runs in the browser instead.',
    );
    expect(others).toEqual([expect.stringMatching(addressPattern)]);
    await expect(ask('session.get', {})).resolves.toMatchObject({ ok: true, value: { host: 'loopback' } });
    host.child.kill('SIGINT');
    expect(await host.ended).toBe(0);
  });

  it('takes no option that it does not know', async () => {
    const host = run(at('out/main/launch.js'), ['--remote-debugging-port=9222']);
    expect(await host.ended).toBe(2);
    expect(host.errors()).toContain('Options: --demo');
  });
});
