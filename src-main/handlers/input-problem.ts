import type { z } from 'zod';
import { InputError } from '../errors.ts';

type Issue = z.core.$ZodIssue;
export type Path = readonly PropertyKey[];

/** The first thing wrong with an input: where in it, what was expected there, what came instead. */
export function inputProblem(name: string, { issues }: z.ZodError, input: unknown): InputError {
  const found = issues.map(deepest);
  const [first = { path: [], expected: 'another form' }] = found;
  const received = valueAt(input, first.path);
  const missing = received === null && first.expected === typeWords['number'] ? missingHint : '';
  const others = found.length > 1 ? `${found.length - 1} more place(s) in it need another form too.` : '';
  return new InputError({
    code: 'input-form',
    where: placeIn(name, first.path),
    expected: first.expected,
    received: valueWords(received),
    hint: [missing, others].filter((words) => words !== '').join(' '),
  });
}

/** JSON has no NaN: a program that writes one writes null. */
const missingHint = 'Leave a row with a missing value out of every column, and say which rows those are.';

/** `claim.create.procedure.window`: the name of what was given and the way into it. */
export function placeIn(name: string, path: Path): string {
  return name + path.map((step) => (typeof step === 'number' ? `[${step}]` : `.${String(step)}`)).join('');
}

/** Where an input may have one of several forms, the one that it follows furthest says what is wrong with it. */
function deepest(issue: Issue): { path: Path; expected: string } {
  const own = { path: issue.path, expected: expectedWords(issue) };
  if (issue.code !== 'invalid_union') return own;
  return issue.errors
    .flatMap(([first]) => (first ? [deepest({ ...first, path: [...issue.path, ...first.path] })] : []))
    .reduce((best, one) => (one.path.length > best.path.length ? one : best), own);
}

const typeWords: Readonly<Record<string, string>> = {
  string: 'text',
  number: 'a finite number',
  int: 'a whole number',
  boolean: 'true or false',
  object: 'an object',
  record: 'an object',
  array: 'a list',
  tuple: 'a list',
};

function expectedWords(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_type':
      return typeWords[issue.expected] ?? issue.expected;
    case 'invalid_value':
      return issue.values.length > 1 ? `one of ${issue.values.map(String).join(', ')}` : String(issue.values[0]);
    case 'too_small':
      return `${sizeWords(issue.origin)} ${issue.inclusive === false ? 'above' : 'of at least'} ${issue.minimum}`;
    case 'too_big':
      return `${sizeWords(issue.origin)} ${issue.inclusive === false ? 'below' : 'of at most'} ${issue.maximum}`;
    case 'invalid_format':
      return issue.format === 'base64' ? 'bytes in base64' : issue.message.replace(/^Invalid /, '');
    case 'invalid_union':
      return unionWords(issue);
    default:
      return issue.message;
  }
}

function sizeWords(origin: string): string {
  if (origin === 'string') return 'text with a length';
  return origin === 'array' ? 'a list with a length' : 'a number';
}

function unionWords({ message, errors }: Extract<Issue, { code: 'invalid_union' }>): string {
  const [, options] = /Expected (.*)$/.exec(message) ?? [];
  if (options) return `one of ${options.replaceAll(' | ', ', ').replaceAll("'", '')}`;
  return [...new Set(errors.flatMap(([first]) => (first ? [expectedWords(first)] : [])))].join(', or ') || message;
}

function valueAt(input: unknown, path: Path): unknown {
  return path.reduce<unknown>(
    (value, step) =>
      typeof value === 'object' && value !== null && Object.hasOwn(value, step)
        ? (value as Record<PropertyKey, unknown>)[step]
        : undefined,
    input,
  );
}

const maxShown = 80;

function valueWords(value: unknown): string {
  if (value === undefined) return 'nothing';
  if (Array.isArray(value)) return `a list of ${value.length}`;
  if (typeof value === 'number' || typeof value === 'boolean') return String(value);
  if (typeof value !== 'string') return value === null ? 'null' : `an ${typeof value}`;
  if (value === '') return 'empty text';
  return value.length > maxShown ? `“${value.slice(0, maxShown)}…” (${value.length} characters)` : `“${value}”`;
}
