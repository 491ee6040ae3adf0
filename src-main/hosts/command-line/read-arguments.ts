import { parseArgs, type ParseArgsConfig } from 'node:util';
import { badUsage, commonOptions, type Command, type CommandArguments } from './command.ts';

type ParseOptions = NonNullable<ParseArgsConfig['options']>;

/** The words after a command's name as its rules read them. */
export function readArguments(command: Command, argv: string[]): CommandArguments {
  const rules = { ...command.options, ...commonOptions };
  const options: ParseOptions = Object.fromEntries(
    Object.entries(rules).map(([name, { value }]) => [name, { type: value ? 'string' : 'boolean', multiple: true }]),
  );
  const { positionals, values } = parse(command, argv, options);
  const given = (name: string) => [values[name] ?? []].flat();
  for (const [name, { isRepeatable }] of Object.entries(rules)) {
    if (isRepeatable || given(name).length <= 1) continue;
    throw badUsage(`--${name}`, 'to be given once', given(name).join(' and '), 'Leave out all but one.');
  }
  const { min, max } = command.nPositionals;
  if (positionals.length < min || positionals.length > max) {
    throw badUsage(
      `footing ${command.name}`,
      command.usage || 'no further words',
      positionals.map((word) => `“${word}”`).join(' ') || 'nothing',
      `footing help ${command.name} shows examples.`,
    );
  }
  const args: CommandArguments = {
    positionals,
    option: (name) => args.options(name)[0],
    options: (name) => given(name).filter((value) => typeof value === 'string'),
    has: (name) => given(name).length > 0,
  };
  if (args.has('role') && !args.has('reviewer')) throw badUsage('--role', 'a --reviewer whose role it is', 'none');
  return args;
}

function parse(command: Command, args: string[], options: ParseOptions) {
  try {
    return parseArgs({ args, options, allowPositionals: true });
  } catch (error) {
    throw badUsage(
      `footing ${command.name}`,
      'options that this command knows',
      error instanceof Error ? error.message.replace(/\.\s[\s\S]*$/, '') : String(error),
      `footing help ${command.name} lists them. Words that begin with “-” go after “--”.`,
    );
  }
}
