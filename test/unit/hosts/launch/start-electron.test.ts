import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startElectron } from '../../../../src-main/hosts/launch/start-electron.ts';

/** Node stands in for the Electron program: both take a script and run it. */
describe('startElectron', () => {
  let folder: string;
  beforeAll(() => (folder = mkdtempSync(join(tmpdir(), 'footing-electron-'))));
  afterAll(() => rmSync(folder, { recursive: true }));

  const run = (script: string, args: string[] = []) => {
    const file = join(folder, 'app.cjs');
    writeFileSync(file, script);
    return startElectron(process.execPath, file, args);
  };

  it('hands the arguments on and comes back with the exit code', async () => {
    const script = 'process.exit(process.argv[2] === "--demo" ? 0 : 2)';
    await expect(run(script, ['--demo'])).resolves.toEqual({ hasStarted: true, exitCode: 0 });
    await expect(run(script)).resolves.toEqual({ hasStarted: true, exitCode: 2 });
  });

  it('keeps what would turn Electron into something else away from it', async () => {
    process.env['ELECTRON_RUN_AS_NODE'] = '1';
    process.env['NODE_OPTIONS'] = '';
    const script = 'process.exit("ELECTRON_RUN_AS_NODE" in process.env || "NODE_OPTIONS" in process.env ? 1 : 0)';
    try {
      await expect(run(script)).resolves.toEqual({ hasStarted: true, exitCode: 0 });
    } finally {
      delete process.env['ELECTRON_RUN_AS_NODE'];
      delete process.env['NODE_OPTIONS'];
    }
  });

  it('notices a runtime that cannot start: missing libraries, a broken sandbox, no program', async () => {
    await expect(run('process.exit(127)')).resolves.toEqual({
      hasStarted: false,
      problem: 'it ended at once with exit code 127',
    });
    await expect(run('process.kill(process.pid, "SIGTRAP"); setTimeout(() => {}, 5000)')).resolves.toEqual({
      hasStarted: false,
      problem: 'it ended at once with SIGTRAP',
    });
    await expect(startElectron(join(folder, 'nothing'), folder, [])).resolves.toMatchObject({
      hasStarted: false,
      problem: expect.stringContaining('ENOENT') as string,
    });
  });
});
