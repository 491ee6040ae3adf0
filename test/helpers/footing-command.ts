import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const program = fileURLToPath(new URL('../../out/main/cli.js', import.meta.url));

export interface CommandOutcome {
  exitStatus: number | null;
  /** What `--json` printed. */
  json: unknown;
  errors: string;
}

/** Runs one command of the built command line and reads its JSON. */
export function footingCommand(home: string, ...args: string[]): CommandOutcome {
  const { status, stdout, stderr } = spawnSync(process.execPath, [program, ...args, '--json'], {
    env: { ...process.env, FOOTING_HOME: home },
    encoding: 'utf8',
  });
  return { exitStatus: status, json: stdout.trim() === '' ? null : JSON.parse(stdout), errors: stderr };
}
