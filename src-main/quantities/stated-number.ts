import type { Bound } from '../contract/stated.ts';
import type { Agreement } from '../contract/result.ts';
import { InputError } from '../errors.ts';
import { formatNumber, formatQuantity } from './notation.ts';

const printedNumber = /^([+\-−]?)(?:(\d+)(?:[.,](\d*))?|[.,](\d+))(?:[eE]([+\-−]?\d{1,3}))?$/;

interface PrintedDigits {
  isNegative: boolean;
  /** All digits as one integer. */
  digits: bigint;
  /** The last printed digit counts 10^lastPlace. */
  lastPlace: number;
}

/** What a stated number stands for: every value that rounds to its printed digits. */
export interface RoundingInterval {
  low: number;
  high: number;
}

/**
 * The value of a number as printed: decimal point or comma, minus or hyphen, with or without a power of ten ("1.2e-3").
 *
 * @throws InputError `not-a-number` when the text is anything else
 */
export function statedValue(text: string): number {
  const printed = readDigits(text);
  return signed(printed, toDouble(printed.digits, printed.lastPlace));
}

/**
 * The numbers that round to the printed digits: half a unit of the last printed digit to either side, so that "2.0" is
 * [1.95, 2.05). The end further from zero does not belong to the interval (half rounds away from zero).
 * Trailing zeros of whole numbers count as printed: "300" is [299.5, 300.5).
 *
 * Source   common practice: half the unit of the last digit as rounding error
 * @throws  InputError `not-a-number`
 */
export function statedInterval(text: string): RoundingInterval {
  const printed = readDigits(text);
  const near = toDouble(printed.digits * 10n - 5n, printed.lastPlace - 1);
  const far = toDouble(printed.digits * 10n + 5n, printed.lastPlace - 1);
  return printed.isNegative ? { low: -far, high: -near } : { low: near, high: far };
}

/** Half a unit of the last printed digit: how far a printed number may be off by rounding. */
export function statedHalfUnit(text: string): number {
  return toDouble(5n, readDigits(text).lastPlace - 1);
}

/** Whether a value rounds to the printed digits. */
export function roundsToStated(text: string, value: number): boolean {
  const { low, high } = statedInterval(text);
  return readDigits(text).isNegative ? value > low && value <= high : value >= low && value < high;
}

export interface AgreementContext {
  bound: Bound;
  /** As set beside the numbers; "1" for a number without a unit. */
  unit: string;
  /** What the recomputed number may be when its inputs are rounded; absent: the value alone. */
  computedInterval?: RoundingInterval;
}

/**
 * Holds a recomputed value against the number as stated: reproduced when it rounds to the printed digits (or, with
 * rounded inputs, when its interval meets the interval of the printed digits), otherwise by how much not.
 * A stated bound is compared as the number it names; the sentence adds on which side of the bound the value lies.
 */
export function agreementWithStated(text: string, value: number, context: AgreementContext): Agreement {
  const { bound, unit, computedInterval } = context;
  const interval = statedInterval(text);
  const isReproduced = computedInterval ? intervalsMeet(computedInterval, text) : roundsToStated(text, value);
  const difference = value - statedValue(text);
  const decimals = Math.min(Math.max(decimalsPrinted(text) + 1, 2), 12);
  const shown = formatQuantity(value, unit, { decimals });
  const range = `${formatNumber(interval.low, { decimals })} to ${formatNumber(interval.high, { decimals })}`;
  const stated = `the stated ${printedText(text)} (${range})`;
  const first = isReproduced
    ? `Reproduced within rounding: ${shown} against ${stated}.`
    : `Not reproduced: ${shown} is ${formatNumber(Math.abs(difference), { decimals })} ${difference > 0 ? 'above' : 'below'} ${stated}.`;
  return {
    statedInterval: interval,
    isReproduced,
    difference,
    sentence: isReproduced ? first : first + boundSentence(text, value, bound),
  };
}

/** On which side of a stated bound a number lies that is not the number stated. */
function boundSentence(text: string, value: number, bound: Bound): string {
  const { low, high } = statedInterval(text);
  const words = `“${bound} ${printedText(text)}”`;
  if (bound === 'at most') return value < high ? ` It stays within ${words}.` : ` It exceeds ${words}.`;
  if (bound === 'at least') return value >= low ? ` It stays within ${words}.` : ` It falls short of ${words}.`;
  return '';
}

/** Whether an interval of computed values and the interval of the printed digits have numbers in common. */
export function intervalsMeet(computed: RoundingInterval, text: string): boolean {
  const { low, high } = statedInterval(text);
  if (computed.low === computed.high) return roundsToStated(text, computed.low);
  return computed.high > low && computed.low < high;
}

/** Digits after the decimal mark, less the power of ten; 0 for whole numbers. */
export function decimalsPrinted(text: string): number {
  return Math.max(0, -readDigits(text).lastPlace);
}

/** Digits from the first that is not zero: 1.90 has three, 0.05 has one. */
export function significantDigitsPrinted(text: string): number {
  const { digits } = readDigits(text);
  return digits === 0n ? 1 : digits.toString().length;
}

function printedText(text: string): string {
  return text.trim().replace(/^-/, '−');
}

function readDigits(text: string): PrintedDigits {
  const match = printedNumber.exec(text.trim());
  const isInRange = match !== null && Number.isFinite(Number(text.trim().replace(',', '.').replaceAll('−', '-')));
  if (!match || !isInRange) {
    throw new InputError({
      code: 'not-a-number',
      where: 'stated number',
      expected: 'a plain decimal number as printed, such as 1.9, −0.2 or 3e-4',
      received: text.trim() === '' ? 'nothing' : `“${text}”`,
      hint: 'Write the digits only; the unit has its own field.',
    });
  }
  const [, sign = '', whole = '', fraction = '', bareFraction = '', exponent = '0'] = match;
  const decimals = fraction + bareFraction;
  return {
    isNegative: sign === '-' || sign === '−',
    digits: BigInt(whole + decimals),
    lastPlace: Number(exponent.replace('−', '-')) - decimals.length,
  };
}

/** Through the decimal text, so that the result is the double nearest to the exact decimal. */
function toDouble(digits: bigint, power: number): number {
  return Number(`${digits}e${power}`);
}

function signed(printed: PrintedDigits, magnitude: number): number {
  return printed.isNegative ? -magnitude : magnitude;
}
