import { commonOptions, type Command, type CommandOutcome } from './command.ts';

export function helpOverview(commands: readonly Command[]): CommandOutcome {
  const width = Math.max(...commands.map((command) => command.name.length));
  return {
    json: commands.map(({ name, usage, summary }) => ({ name, usage, summary })),
    lines: [
      'footing <command> …   checks stated numbers about climate sensitivity, offline',
      '',
      ...commands.map((command) => `  ${command.name.padEnd(width)}  ${command.summary}`),
      '',
      'Every command takes --json: one JSON value on standard output and nothing else there.',
      'Its form is what footing schema command.<command> prints; that of an error, footing schema refusal.',
      'Exit status: 0 done · 1 checked and found wanting · 2 bad input · 3 project in use or unreadable · 130 stopped by Ctrl-C.',
      'footing help <command> shows its options with examples; footing --version says which version this is.',
    ],
  };
}

export function helpOf({ name, usage, summary, options, examples }: Command): CommandOutcome {
  const rows = Object.entries({ ...options, ...commonOptions }).map(
    ([option, { value, help }]) => [`--${option}${value ? ` ${value}` : ''}`, help] as const,
  );
  const width = Math.max(...rows.map(([left]) => left.length));
  return {
    json: { name, usage, summary, options: Object.fromEntries(rows), examples: examples.map(withProgram) },
    lines: [
      withProgram([name, usage].filter(Boolean).join(' ')),
      '',
      summary,
      '',
      ...rows.map(([left, help]) => `  ${left.padEnd(width)}  ${help}`),
      '',
      'Examples',
      ...examples.map((example) => `  ${withProgram(example)}`),
    ],
  };
}

function withProgram(words: string): string {
  return `footing ${words}`;
}
