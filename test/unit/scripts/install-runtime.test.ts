import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';

const script = readFileSync(new URL('../../../scripts/install-runtime.mjs', import.meta.url), 'utf8');

describe('the step after an install', () => {
  let folder: string;
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'footing-install-'));
    mkdirSync(join(folder, 'scripts'));
  });
  afterEach(() => rmSync(folder, { recursive: true }));

  /** Runs the script in a package whose Electron has this installer; null for none at all. */
  const run = (installer: string | null, text = script, environment = {}) => {
    writeFileSync(join(folder, 'scripts', 'install-runtime.mjs'), text);
    if (installer !== null) {
      mkdirSync(join(folder, 'node_modules', 'electron'), { recursive: true });
      writeFileSync(join(folder, 'node_modules', 'electron', 'install.js'), installer);
    }
    const { ELECTRON_SKIP_BINARY_DOWNLOAD: _skip, ...env } = process.env;
    const options = { encoding: 'utf8', env: { ...env, ...environment } } as const;
    const { status, stdout, stderr } = spawnSync(
      process.execPath,
      [join(folder, 'scripts', 'install-runtime.mjs')],
      options,
    );
    return { status, stdout, stderr };
  };
  const quiet = { status: 0, stdout: '', stderr: '' };

  it('says nothing when the runtime is there or was fetched', () => {
    expect(run('console.log("noise")')).toEqual(quiet);
  });

  it('says nothing without the development packages', () => {
    expect(run(null)).toEqual(quiet);
  });

  it('does not fetch when told not to', () => {
    expect(run('process.exit(1)', script, { ELECTRON_SKIP_BINARY_DOWNLOAD: '1' })).toEqual(quiet);
  });

  it('says in one line why the runtime could not be fetched, and passes', () => {
    const { status, stdout, stderr } = run('console.error("no way out\\n  at somewhere"); process.exit(1)');
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout).toBe(
      'The Electron runtime could not be fetched (no way out); npm start will use the browser instead.\n',
    );
  });

  it('gives up after its time limit of a minute, and passes', () => {
    const impatient = script.replace('timeLimitMs = 60_000', 'timeLimitMs = 400');
    expect(impatient).not.toBe(script);
    const { status, stdout } = run('setInterval(() => undefined, 1000)', impatient);
    expect(status).toBe(0);
    expect(stdout).toContain('it took longer than a minute');
  });
});
