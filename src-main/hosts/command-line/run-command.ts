import type { ProgressEvent } from '../../contract/events.ts';
import type { ErrorAnswer } from '../../contract/requests.ts';
import { engineVersion } from '../../engine-version.ts';
import { errorSentence } from '../../errors.ts';
import { errorAnswer } from '../../handlers/error-answer.ts';
import {
  badUsage,
  CommandFailure,
  interrupted,
  type Command,
  type CommandOutcome,
  type ExitStatus,
} from './command.ts';
import { commandTools, type CommandCore, type Streams } from './command-tools.ts';
import { commands } from './commands.ts';
import { helpOf, helpOverview } from './help.ts';
import { oneLine } from './one-line.ts';
import { readArguments } from './read-arguments.ts';

const clearLine = '\r\u001b[K';

interface Core extends CommandCore {
  onProgress(listener: (event: ProgressEvent) => void): () => void;
  close(): Promise<void>;
}
type CreateCore = (home: string | undefined) => Core;

/** Runs one command of the command line and gives its exit status. */
export async function runCommand(argv: string[], createCore: CreateCore, streams: Streams): Promise<ExitStatus> {
  const end = argv.indexOf('--');
  const words = argv.filter((word, place) => word !== '--json' || (end >= 0 && place > end));
  const command = commands.find(({ name }) => name === words[0]);
  const isJson = words.length < argv.length || command?.isJsonOnly === true;
  try {
    const { json, lines, status = 0 } = helpFor(words, command) ?? (await run(words, createCore, streams));
    streams.out(isJson ? `${JSON.stringify(json)}\n` : `${lines.map(oneLine).join('\n')}\n`);
    return status;
  } catch (failure) {
    const error = failure instanceof CommandFailure ? failure.error : errorAnswer(failure, `footing ${words[0] ?? ''}`);
    if (isJson) streams.out(`${JSON.stringify({ ok: false, error })}\n`);
    streams.error(`${oneLine(errorSentence(error))}\n`);
    return statusOf(error);
  }
}

function helpFor([first = 'help', second]: string[], command: Command | undefined): CommandOutcome | null {
  if (first === '--version') return { json: { engineVersion }, lines: [engineVersion] };
  if (first !== 'help' && first !== '--help' && first !== '-h') {
    return command && (second === '--help' || second === '-h') ? helpOf(command) : null;
  }
  return second === undefined ? helpOverview(commands) : helpOf(findCommand(second));
}

async function run([name = '', ...rest]: string[], createCore: CreateCore, streams: Streams): Promise<CommandOutcome> {
  const command = findCommand(name);
  const args = readArguments(command, rest);
  const core = createCore(command.home?.(args));
  const stop = core.onProgress(progressLine(streams));
  try {
    const tools = commandTools(core, streams);
    const reviewer = args.option('reviewer');
    if (reviewer !== undefined) {
      await tools.ask('reviewer.set', { name: reviewer, role: args.option('role') ?? '' });
    }
    return await Promise.race([command.run(args, tools), stopped(name, streams)]);
  } finally {
    stop();
    await core.close();
  }
}

/** Ends a command that is being waited for. Nothing is in the middle of being stored then: that is done in one step. */
async function stopped(name: string, streams: Streams): Promise<never> {
  await streams.interruption;
  if (streams.isTerminal) streams.error(clearLine);
  throw new CommandFailure({
    kind: 'Cancelled',
    code: 'interrupted',
    where: `footing ${name}`,
    expected: 'to come to its end',
    received: 'that it was stopped',
    hint: 'What it had stored before is kept; nothing is half-written.',
  });
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

function statusOf({ kind }: ErrorAnswer): ExitStatus {
  if (kind === 'Cancelled') return interrupted;
  return kind === 'ProjectError' ? 3 : 2;
}

function progressLine(streams: Streams): (event: ProgressEvent) => void {
  return ({ label, shareDone, isFinished }) => {
    if (!streams.isTerminal) return;
    streams.error(isFinished ? clearLine : `\r${label} · ${Math.round(100 * shareDone)} %`);
  };
}
