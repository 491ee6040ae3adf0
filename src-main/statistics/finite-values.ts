import { InputError } from '../errors.ts';

export interface ValuesRequirement {
  /** Exactly this many values. */
  length?: number;
  /** At least this many values; 1 unless given. */
  atLeast?: number;
  sign?: 'positive' | 'non-negative';
}

/** Beyond this the square of a value, summed over a million of them, is no longer a finite double. */
const LARGEST_MAGNITUDE = 1e150;

/**
 * The door of every numeric function: values that are finite, of the asked length and sign, or an error that names the
 * caller, the argument and the first offending place. A comparison with NaN is false, so a NaN let in here would come
 * out as a number that looks like an answer.
 *
 * @returns the values as a Float64Array; the same array when it already is one, so treat it as read-only
 * @throws  InputError wrong-length, too-few-values, not-finite, too-large, not-positive, negative
 */
export function finiteValues(
  caller: string,
  name: string,
  values: ArrayLike<number>,
  { length, atLeast = 1, sign }: ValuesRequirement = {},
): Float64Array {
  const refuse = (code: string, place: string, expected: string, received: string, hint: string) =>
    new InputError({ code, where: `${caller}, ${place}`, expected, received, hint });

  if (length !== undefined && values.length !== length) {
    throw refuse(
      'wrong-length',
      name,
      `${length} values`,
      `${values.length}`,
      'All rows must be given for each column.',
    );
  }
  if (values.length < atLeast) {
    throw refuse('too-few-values', name, `at least ${atLeast} values`, `${values.length}`, 'Give a longer series.');
  }
  const checked = values instanceof Float64Array ? values : Float64Array.from(values);
  for (let i = 0; i < checked.length; i++) {
    const value = checked[i]!;
    if (!Number.isFinite(value)) {
      const hint = 'Leave missing values out first, as a step of its own that says which they are.';
      throw refuse('not-finite', `${name}[${i}]`, 'a finite number', String(values[i]), hint);
    }
    if (Math.abs(value) > LARGEST_MAGNITUDE) {
      const hint = 'Give the values in a larger unit.';
      throw refuse('too-large', `${name}[${i}]`, `a magnitude of at most ${LARGEST_MAGNITUDE}`, String(value), hint);
    }
    if (sign === 'positive' && value <= 0) {
      throw refuse('not-positive', `${name}[${i}]`, 'a number above 0', String(value), 'Leave the row out instead.');
    }
    if (sign === 'non-negative' && value < 0) {
      throw refuse('negative', `${name}[${i}]`, 'a number of at least 0', String(value), 'Check the sign.');
    }
  }
  return checked;
}

export interface NumberRequirement {
  /** Exclusive bounds. */
  above?: number;
  below?: number;
  /** Inclusive bounds. */
  atLeast?: number;
  atMost?: number;
  isWhole?: boolean;
  /** The way out, where there is a better one than another number. */
  hint?: string;
}

/** The same door for a single number. @throws InputError out-of-range */
export function finiteNumber(
  caller: string,
  name: string,
  value: number,
  {
    above = -Infinity,
    below = Infinity,
    atLeast = -Infinity,
    atMost = Infinity,
    isWhole = false,
    hint,
  }: NumberRequirement = {},
): number {
  const isInside = value > above && value < below && value >= atLeast && value <= atMost;
  if (Number.isFinite(value) && isInside && (!isWhole || Number.isInteger(value))) return value;
  const bounds = [
    above > -Infinity ? `above ${above}` : '',
    atLeast > -Infinity ? `at least ${atLeast}` : '',
    below < Infinity ? `below ${below}` : '',
    atMost < Infinity ? `at most ${atMost}` : '',
  ].filter(Boolean);
  throw new InputError({
    code: 'out-of-range',
    where: `${caller}, ${name}`,
    expected: [isWhole ? 'a whole number' : 'a finite number', bounds.join(' and ')].filter(Boolean).join(' '),
    received: String(value),
    hint: hint ?? `Give ${isWhole ? 'a whole number' : 'a number'}${bounds.length > 0 ? ' within these bounds' : ''}.`,
  });
}
