import type { z } from 'zod';
import { InputError } from '../errors.ts';
import { inputProblem, placeIn, type Path } from './input-problem.ts';

/**
 * The input in the form that a schema asks for. A field that the schema does not know is refused: passing over a
 * misspelt “intercept” would compute something else than was asked.
 *
 * @throws InputError input-form, unknown-field
 */
export function checkInput<Schema extends z.ZodType>(name: string, schema: Schema, input: unknown): z.infer<Schema> {
  const parsed = schema.safeParse(input);
  if (!parsed.success) throw inputProblem(name, parsed.error, input);
  const unknown = unknownField(input, parsed.data);
  if (unknown) throw unknownFieldError(name, unknown);
  return parsed.data;
}

/** The way to the first field that is in the input and not in what the schema made of it. */
function unknownField(input: unknown, known: unknown): Path | null {
  if (!isObject(input) || !isObject(known)) return null;
  for (const key of Array.isArray(input) ? input.keys() : Object.keys(input)) {
    const value = input[key];
    if (value === undefined) continue;
    if (!Object.hasOwn(known, key)) return [key];
    const deeper = unknownField(value, known[key]);
    if (deeper) return [key, ...deeper];
  }
  return null;
}

function isObject(value: unknown): value is Record<PropertyKey, unknown> {
  return typeof value === 'object' && value !== null;
}

function unknownFieldError(name: string, path: Path): InputError {
  return new InputError({
    code: 'unknown-field',
    where: placeIn(name, path.slice(0, -1)),
    expected: 'only fields that are known there',
    received: `a field “${String(path.at(-1)).slice(0, 80)}”`,
    hint: 'Correct its name, or leave it out.',
  });
}
