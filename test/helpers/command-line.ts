import { spawn, type ChildProcessWithoutNullStreams } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { createCore } from '../../src-main/handlers/handle.ts';
import { runCommand } from '../../src-main/hosts/command-line/run-command.ts';
import { directRunner } from './direct-runner.ts';

const installation = fileURLToPath(new URL('../..', import.meta.url));
export const builtProgram = `${installation}out/main/cli.js`;
export const passphrase = 'an invented passphrase';

/** How a command came to its end. */
export interface Ran {
  status: number | null;
  /** Everything on standard output. */
  out: string;
  /** Everything on standard error. */
  errors: string;
}

export interface RunOptions {
  /** The folder of the reviewer's own; the one that the command runs in unless given. */
  home?: string;
  environment?: Record<string, string>;
}

export interface ChildOptions extends RunOptions {
  /** What it reads on standard input. */
  input?: string;
  /** Whoever has the process: to stop it, or to leave its input open. */
  hold?: (child: ChildProcessWithoutNullStreams) => void;
}

/** Runs the built command line as a terminal or a script does. */
export function footing(folder: string, args: readonly string[], options: ChildOptions = {}): Promise<Ran> {
  const { input, home = folder, environment = {}, hold } = options;
  const child = spawn(process.execPath, [builtProgram, ...args], {
    cwd: folder,
    env: { ...process.env, FOOTING_HOME: home, FOOTING_PASSPHRASE: passphrase, ...environment },
  });
  child.stdin.on('error', () => undefined);
  if (!hold) child.stdin.end(input);
  let out = '';
  let errors = '';
  child.stdout.setEncoding('utf8').on('data', (text: string) => (out += text));
  child.stderr.setEncoding('utf8').on('data', (text: string) => (errors += text));
  hold?.(child);
  return new Promise((resolve) => child.on('close', (status) => resolve({ status, out, errors })));
}

/** The same command in this process, unbuilt: for long tables of them. */
export async function footingHere(folder: string, args: readonly string[], options: RunOptions = {}): Promise<Ran> {
  const { home: ownHome = folder, environment = {} } = options;
  const back = process.cwd();
  let out = '';
  let errors = '';
  process.chdir(folder);
  try {
    const reviewerIfUnknown = { name: 'R. Example', role: '' };
    const status = await runCommand(
      [...args],
      (home = ownHome) =>
        createCore({ host: 'command line', jobs: directRunner(), installation, reviewerIfUnknown, home }),
      {
        out: (text) => (out += text),
        error: (text) => (errors += text),
        isTerminal: false,
        environment: { FOOTING_PASSPHRASE: passphrase, ...environment },
        interruption: new Promise(() => undefined),
      },
    );
    return { status, out, errors };
  } finally {
    process.chdir(back);
  }
}

/** The one JSON value that a command printed; `run` says in which way it is run. */
export async function jsonOf(run: typeof footing | typeof footingHere, folder: string, args: readonly string[]) {
  const { status, out, errors } = await run(folder, [...args, '--json']);
  if (status !== 0) throw new Error(`footing ${args.join(' ')}: exit status ${status}\n${errors}`);
  return JSON.parse(out) as unknown;
}

/** Words as a shell splits them. */
export function shellWords(line: string): string[] {
  return [...line.matchAll(/"([^"]*)"|(\S+)/g)].map(([, quoted, plain]) => quoted ?? plain ?? '');
}
