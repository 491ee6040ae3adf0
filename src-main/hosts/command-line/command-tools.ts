import { readFileSync, statSync } from 'node:fs';
import type { ErrorAnswer } from '../../contract/requests.ts';
import { fileProblem } from '../../handlers/file-problem.ts';
import { askPassphrase } from './ask-passphrase.ts';
import { badUsage, CommandFailure, type CommandTools } from './command.ts';
import { oneLine } from './one-line.ts';

export interface CommandCore {
  handle(name: string, input: unknown): Promise<{ ok: true; value: unknown } | { ok: false; error: ErrorAnswer }>;
}

export interface Streams {
  out(text: string): void;
  error(text: string): void;
  isTerminal: boolean;
  environment: Record<string, string | undefined>;
  /** Comes about when whoever runs the command stops it. */
  interruption: Promise<void>;
}

const maxMebibytes = 64;

export function commandTools(core: CommandCore, streams: Streams): CommandTools {
  return {
    async ask(name, input) {
      const answer = await core.handle(name, input);
      if (answer.ok) return answer.value as never;
      throw new CommandFailure(answer.error);
    },
    tryAsk: (name, input) => core.handle(name, input),
    readFile,
    async readJson(path) {
      const text = path === '-' ? await readStandardInput() : readFile(path).toString('utf8');
      return parseJson(path === '-' ? 'standard input' : path, text);
    },
    async passphrase(isNew) {
      const given = streams.environment['FOOTING_PASSPHRASE'];
      if (given !== undefined) return given;
      if (streams.isTerminal) return askPassphrase(isNew);
      throw badUsage(
        'Passphrase',
        isNew ? 'a passphrase to protect the new signing key' : 'the passphrase of the signing key',
        'none',
        'Set FOOTING_PASSPHRASE, or run in a terminal to be asked.',
      );
    },
    tell: (line) => streams.error(`${oneLine(line)}\n`),
  };
}

function readFile(path: string): Buffer {
  const mebibytes = reading(path, () => statSync(path).size) / 2 ** 20;
  if (mebibytes > maxMebibytes) {
    const found = `${Math.ceil(mebibytes)} MiB`;
    throw badUsage(path, `a file of at most ${maxMebibytes} MiB`, found, 'Cut it to the part that is needed.');
  }
  return reading(path, () => readFileSync(path));
}

function reading<Value>(path: string, read: () => Value): Value {
  try {
    return read();
  } catch (error) {
    throw fileProblem('file-unreadable', path, 'a file that can be read', error);
  }
}

async function readStandardInput(): Promise<string> {
  const chunks: Buffer[] = [];
  for await (const chunk of process.stdin) chunks.push(Buffer.from(chunk as Uint8Array));
  return Buffer.concat(chunks).toString('utf8');
}

function parseJson(where: string, text: string): unknown {
  try {
    // Some editors put a byte order mark before everything else.
    return JSON.parse(text.replace(/^\ufeff/, ''));
  } catch (error) {
    throw badUsage(where, 'JSON', text.trim() === '' ? 'nothing' : String(error).replace(/^SyntaxError: /, ''));
  }
}
