import { reviewerOptions, type Command } from './command.ts';

export function helpOverview(commands: readonly Command[]): string {
  const width = Math.max(...commands.map((command) => command.name.length));
  return [
    'footing <command> …   checks stated numbers about climate sensitivity, offline',
    '',
    ...commands.map((command) => `  ${command.name.padEnd(width)}  ${command.summary}`),
    '',
    'Every command takes --json: one JSON value on standard output and nothing else there.',
    'Exit status: 0 done · 1 checked and found wanting · 2 bad input · 3 project in use or unreadable.',
    'footing help <command> shows its options with examples.',
  ].join('\n');
}

export function helpOf(command: Command): string {
  const options = Object.entries({ ...command.options, ...reviewerOptions }).map(
    ([name, { value, help }]) => [`--${name}${value ? ` ${value}` : ''}`, help] as const,
  );
  const width = Math.max(...options.map(([left]) => left.length));
  return [
    `footing ${[command.name, command.usage].filter(Boolean).join(' ')}`,
    '',
    command.summary,
    '',
    ...options.map(([left, help]) => `  ${left.padEnd(width)}  ${help}`),
    '',
    'Examples',
    ...command.examples.map((example) => `  footing ${example}`),
  ].join('\n');
}
