import type { RequestName } from '../../contract/request-names.ts';
import type { ErrorAnswer, RequestAnswer, RequestInput } from '../../contract/requests.ts';
import { InputError } from '../../errors.ts';

/** Stopped by Ctrl-C, as shells count it: 128 and the number of SIGINT. */
export const interrupted = 130;
/** 0 done · 1 checked and found wanting · 2 bad input · 3 project in use or unreadable · 130 interrupted. */
export type ExitStatus = 0 | 1 | 2 | 3 | typeof interrupted;

export interface OptionRule {
  /** Word for the value in the usage line; absent for a switch. */
  value?: string;
  help: string;
  isRepeatable?: boolean;
}

export interface CommandArguments {
  positionals: string[];
  option(name: string): string | undefined;
  options(name: string): string[];
  has(name: string): boolean;
}

/** What a command may use: requests of the core, and the machine's files and streams. */
export interface CommandTools {
  /** Sends a request and gives its value; an error answer ends the command. */
  ask<Name extends RequestName>(name: Name, input: RequestInput<Name>): Promise<RequestAnswer<Name>>;
  /** Sends a request and gives the answer as it is. */
  tryAsk(name: RequestName, input: unknown): Promise<{ ok: true; value: unknown } | { ok: false; error: ErrorAnswer }>;
  readFile(path: string): Buffer;
  /** The JSON in a file, or in standard input for "-". */
  readJson(path: string): Promise<unknown>;
  /** The passphrase of the reviewer's key, from the environment or asked for; a new one is asked for twice. */
  passphrase(isNew: boolean): Promise<string>;
  /** A line on standard error. */
  tell(line: string): void;
}

/** What a command comes to: the same facts as JSON and as lines of text. */
export interface CommandOutcome {
  json: unknown;
  lines: string[];
  status?: ExitStatus;
}

export interface Command {
  name: string;
  /** Positional arguments as the usage line shows them. */
  usage: string;
  summary: string;
  examples: string[];
  nPositionals: { min: number; max: number };
  options: Record<string, OptionRule>;
  /** The folder that stands for the reviewer's own, where a command must leave that alone. */
  home?(args: CommandArguments): string;
  /** Always JSON, whether asked for or not. */
  isJsonOnly?: boolean;
  run(args: CommandArguments, tools: CommandTools): Promise<CommandOutcome>;
}

/** Ends a command with an error that the core answered with. */
export class CommandFailure extends Error {
  readonly error: ErrorAnswer;

  constructor(error: ErrorAnswer) {
    super(error.code);
    this.error = error;
  }
}

export function badUsage(where: string, expected: string, received: string, hint = ''): InputError {
  return new InputError({ code: 'usage', where, expected, received: received || 'nothing', hint });
}

/** The value of an option that names one of a few things; undefined when it is not given. */
export function oneOf<Value extends string>(
  args: CommandArguments,
  name: string,
  values: readonly Value[],
): Value | undefined {
  const given = args.option(name);
  const found = values.find((value) => value === given);
  if (given === undefined || found !== undefined) return found;
  throw badUsage(`--${name}`, `one of ${values.join(', ')}`, given);
}

/** The value of an option that is a whole number; undefined when it is not given. */
export function wholeNumber(
  args: CommandArguments,
  name: string,
  { atLeast = 1, atMost = 999_999_999, expected }: { atLeast?: number; atMost?: number; expected?: string } = {},
): number | undefined {
  const given = args.option(name);
  if (given === undefined) return undefined;
  const number = Number(given);
  if (/^\d+$/.test(given) && number >= atLeast && number <= atMost) return number;
  throw badUsage(`--${name}`, expected ?? `a whole number from ${atLeast} to ${atMost}`, given);
}

/** The number of a claim of the open project; the only claim when none is named. */
export async function claimNumber(args: CommandArguments, tools: CommandTools): Promise<number> {
  const { claims } = await tools.ask('project.view', {});
  const numbers = claims.map(({ id }) => id);
  const list = numbers.join(', ');
  const given = wholeNumber(args, 'claim', { expected: `the number of a claim (${list || 'there is none yet'})` });
  const [only, ...others] = numbers;
  const chosen = given ?? (others.length === 0 ? only : undefined);
  if (chosen !== undefined && numbers.includes(chosen)) return chosen;
  throw badUsage(
    '--claim',
    only === undefined ? 'a claim in the project' : `the number of a claim (${list})`,
    String(given ?? 'none'),
    only === undefined ? 'footing claim FILE CLAIM.json adds one.' : '',
  );
}

export const claimOption = {
  claim: { value: 'N', help: 'number of the claim; may be left out when there is only one' },
};
/** Options of every command. */
export const commonOptions: Record<string, OptionRule> = {
  reviewer: { value: 'NAME', help: 'who is reviewing; kept for the next time' },
  role: { value: 'ROLE', help: 'the reviewer’s role; with --reviewer' },
  json: { help: 'one JSON value on standard output and nothing else there' },
};
