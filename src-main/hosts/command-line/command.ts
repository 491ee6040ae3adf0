import type { RequestName } from '../../contract/request-names.ts';
import type { ErrorAnswer, RequestAnswer, RequestInput } from '../../contract/requests.ts';

/** 0 done · 1 checked and found wanting · 2 bad input · 3 project in use or unreadable. */
export type ExitStatus = 0 | 1 | 2 | 3;

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
  readStandardInput(): Promise<string>;
  /** The passphrase of the reviewer's key, from the environment or asked for. */
  passphrase(purpose: string): Promise<string>;
  /** A line on standard error. */
  tell(line: string): void;
}

/** What a command comes to: the same facts as JSON and as text. */
export interface CommandOutcome {
  json: unknown;
  text: string;
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

/** Ends a command with an error of the core or of the command line itself. */
export class CommandFailure extends Error {
  readonly error: ErrorAnswer;

  constructor(error: ErrorAnswer) {
    super(error.code);
    this.error = error;
  }
}

export function badUsage(where: string, expected: string, received: string, hint = ''): CommandFailure {
  return new CommandFailure({ kind: 'InputError', code: 'usage', where, expected, received, hint });
}

/** The number of a claim; the only claim when none is named. */
export async function claimNumber(args: CommandArguments, tools: CommandTools): Promise<number> {
  const given = args.option('claim');
  if (given !== undefined) {
    const number = Number(given);
    if (Number.isInteger(number) && number > 0) return number;
    throw badUsage('--claim', 'the number of a claim', given);
  }
  const { claims } = await tools.ask('project.view', {});
  const [only, ...others] = claims;
  if (only && others.length === 0) return only.id;
  throw badUsage(
    '--claim',
    'the number of a claim',
    only ? `none, and ${claims.length} to choose from` : 'none, and no claim in the project',
  );
}

export const claimOption = {
  claim: { value: 'N', help: 'number of the claim; may be left out when there is only one' },
};
export const reviewerOptions = {
  reviewer: { value: 'NAME', help: 'who is reviewing; kept for the next time' },
  role: { value: 'ROLE', help: 'the reviewer’s role' },
};
