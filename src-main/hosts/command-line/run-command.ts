import { readFileSync } from 'node:fs';
import { createInterface } from 'node:readline/promises';
import { parseArgs, type ParseArgsConfig } from 'node:util';
import type { RequestName } from '../../contract/request-names.ts';
import type { ErrorAnswer } from '../../contract/requests.ts';
import type { ProgressEvent } from '../../contract/events.ts';
import { errorSentence } from '../../errors.ts';
import {
  badUsage,
  CommandFailure,
  reviewerOptions,
  type Command,
  type CommandArguments,
  type CommandTools,
  type ExitStatus,
} from './command.ts';
import { commands } from './commands.ts';
import { helpOf, helpOverview } from './help.ts';

interface CommandCore {
  handle(name: string, input: unknown): Promise<{ ok: true; value: unknown } | { ok: false; error: ErrorAnswer }>;
  onProgress(listener: (event: ProgressEvent) => void): () => void;
  close(): Promise<void>;
}

export interface Streams {
  out(text: string): void;
  error(text: string): void;
  isTerminal: boolean;
  environment: Record<string, string | undefined>;
}

/** Runs one command of the command line and gives its exit status. */
export async function runCommand(
  argv: string[],
  createCore: (home: string | undefined) => CommandCore,
  streams: Streams,
): Promise<ExitStatus> {
  const [name = 'help', ...rest] = argv;
  const isJson = rest.includes('--json');
  let core: CommandCore | null = null;
  try {
    if (name === 'help' || name === '--help' || name === '-h') {
      streams.out(`${rest[0] && !rest[0].startsWith('-') ? helpOf(findCommand(rest[0])) : helpOverview(commands)}\n`);
      return 0;
    }
    const command = findCommand(name);
    if (rest.includes('--help')) {
      streams.out(`${helpOf(command)}\n`);
      return 0;
    }
    const args = readArguments(command, rest);
    core = createCore(command.home?.(args));
    const tools = commandTools(core, streams);
    if (args.has('reviewer')) {
      await tools.ask('reviewer.set', { name: args.option('reviewer') ?? '', role: args.option('role') ?? '' });
    }
    const stop = core.onProgress(progressLine(streams));
    const outcome = await command.run(args, tools).finally(stop);
    streams.out(isJson || command.isJsonOnly ? `${JSON.stringify(outcome.json)}\n` : `${outcome.text}\n`);
    return outcome.status ?? 0;
  } catch (failure) {
    if (!(failure instanceof CommandFailure)) throw failure;
    const { error } = failure;
    if (isJson) streams.out(`${JSON.stringify({ ok: false, error })}\n`);
    streams.error(`${errorSentence(error)}\n`);
    return error.kind === 'ProjectError' ? 3 : 2;
  } finally {
    await core?.close();
  }
}

function findCommand(name: string): Command {
  const command = commands.find((candidate) => candidate.name === name);
  if (command) return command;
  throw badUsage(
    'footing',
    `one of ${commands.map((candidate) => candidate.name).join(', ')}`,
    name,
    'footing help says what each does.',
  );
}

function readArguments(command: Command, argv: string[]): CommandArguments {
  const rules = { ...command.options, ...reviewerOptions };
  const config: NonNullable<ParseArgsConfig['options']> = { json: { type: 'boolean' } };
  for (const [name, rule] of Object.entries(rules)) {
    config[name] = {
      type: rule.value ? 'string' : 'boolean',
      multiple: 'isRepeatable' in rule && rule.isRepeatable === true,
    };
  }
  const parsed = parse(command, argv, config);
  const { min, max } = command.nPositionals;
  const count = parsed.positionals.length;
  if (count < min || count > max) {
    throw badUsage(
      `footing ${command.name}`,
      `${command.usage || 'no further words'}`,
      `${count} argument(s)`,
      `footing help ${command.name} shows examples.`,
    );
  }
  const values = parsed.values as Record<string, string | boolean | (string | boolean)[] | undefined>;
  const all = (name: string) => [values[name] ?? []].flat();
  return {
    positionals: parsed.positionals,
    option: (name) =>
      all(name)
        .filter((value) => typeof value === 'string')
        .at(-1),
    options: (name) => all(name).filter((value) => typeof value === 'string'),
    has: (name) => values[name] !== undefined,
  };
}

function parse(command: Command, argv: string[], options: NonNullable<ParseArgsConfig['options']>) {
  try {
    return parseArgs({ args: argv, options, allowPositionals: true });
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    throw badUsage(
      `footing ${command.name}`,
      'options that this command knows',
      message,
      `footing help ${command.name} lists them.`,
    );
  }
}

function commandTools(core: CommandCore, streams: Streams): CommandTools {
  return {
    async ask(name, input) {
      const answer = await core.handle(name, input);
      if (answer.ok) return answer.value as never;
      throw new CommandFailure(answer.error);
    },
    tryAsk: (name: RequestName, input: unknown) => core.handle(name, input),
    readFile(path) {
      try {
        return readFileSync(path);
      } catch (error) {
        throw badUsage(
          path,
          'a file that can be read',
          error instanceof Error ? error.message : String(error),
          'Check the path.',
        );
      }
    },
    async readStandardInput() {
      const chunks: Buffer[] = [];
      for await (const chunk of process.stdin) chunks.push(Buffer.from(chunk as Uint8Array));
      return Buffer.concat(chunks).toString('utf8');
    },
    async passphrase(purpose) {
      const given = streams.environment['FOOTING_PASSPHRASE'];
      if (given !== undefined) return given;
      if (!streams.isTerminal) {
        throw badUsage(
          'Passphrase',
          `a passphrase ${purpose}`,
          'none',
          'Set FOOTING_PASSPHRASE, or run in a terminal to be asked.',
        );
      }
      const terminal = createInterface({ input: process.stdin, output: process.stderr });
      const answer = await terminal.question(`Passphrase ${purpose} (shown as typed): `);
      terminal.close();
      return answer;
    },
    tell: (line) => streams.error(`${line}\n`),
  };
}

function progressLine(streams: Streams): (event: ProgressEvent) => void {
  return ({ label, shareDone, isFinished }) => {
    if (!streams.isTerminal) return;
    streams.error(isFinished ? `\r\u001b[K` : `\r${label} · ${Math.round(100 * shareDone)} %`);
  };
}
