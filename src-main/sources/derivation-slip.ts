import { isFootingError } from '../errors.ts';
import { intervalsMeet } from '../quantities/stated-number.ts';
import type { Expression } from './derivation-expression.ts';
import { evaluateExpression, type EvaluationContext, type RoundedValue } from './derivation-interval.ts';
import type { FunctionName } from './derivation-tokens.ts';

/** Factors that slips in this field leave behind, with what was taken for what. */
const factors: readonly { factor: number; words: string }[] = [
  { factor: 10, words: 'a factor of 10: a shifted decimal mark, or per year taken for per decade' },
  { factor: 100, words: 'a factor of 100: a percentage taken for a fraction' },
  { factor: 1.8, words: 'a factor of 1.8: °F taken for K' },
  { factor: 120, words: 'a factor of 120: per month taken for per decade' },
  { factor: 12, words: 'a factor of 12: per month taken for per year' },
  { factor: 44 / 12, words: 'a factor of 44/12: mass of carbon taken for mass of CO2' },
  { factor: 2.124, words: 'a factor of 2.124: GtC taken for ppm' },
  { factor: Math.LN2, words: 'a factor of ln 2: per e-folding taken for per doubling' },
];

const logarithms: readonly FunctionName[] = ['ln', 'log10', 'log2'];

export interface StatedSide {
  /** The digits as printed, without percent sign. */
  digits: string;
  /** 100 for a percentage, else 1. */
  divisor: 1 | 100;
}

/** Whether a computed interval meets the interval of the stated digits. */
export function meetsStated({ low, high }: RoundedValue, { digits, divisor }: StatedSide): boolean {
  return intervalsMeet({ low: low * divisor, high: high * divisor }, digits);
}

/**
 * What may have gone wrong in a line that does not agree: another base of the logarithm, or one of the factors that
 * mix-ups of units leave, when with it the line does agree. Several may fit; a coarse number lets more of them pass.
 *
 * Source  5.35 log10 2 = 1.61 in place of 5.35 ln 2 = 3.71, and the like: common slips of the trade; 2.124 GtC per ppm
 *         after the Global Carbon Budget
 */
export function likelySlip(expression: Expression, context: EvaluationContext, stated: StatedSide): string | null {
  const slips: string[] = [];
  for (const from of new Set(logarithmsIn(expression))) {
    for (const to of logarithms.filter((name) => name !== from && !(from === 'log' && name === 'log10'))) {
      const replaceFunction = (name: FunctionName): FunctionName => (name === from ? to : name);
      const result = valueOrNull(() => evaluateExpression(expression, { ...context, replaceFunction }));
      if (result && meetsStated(result, stated)) slips.push(`${to} in place of ${from}`);
    }
  }
  const asWritten = evaluateExpression(expression, context);
  for (const { factor, words } of factors) {
    if (meetsStated(scaled(asWritten, factor), stated) || meetsStated(scaled(asWritten, 1 / factor), stated))
      slips.push(words);
  }
  if (meetsStated({ value: -asWritten.value, low: -asWritten.high, high: -asWritten.low }, stated))
    slips.push('the sign');
  return slips.length === 0 ? null : slips.join('; or ');
}

function scaled({ value, low, high }: RoundedValue, factor: number): RoundedValue {
  return { value: value * factor, low: low * factor, high: high * factor };
}

function logarithmsIn(expression: Expression): FunctionName[] {
  switch (expression.kind) {
    case 'number':
    case 'name':
      return [];
    case 'negate':
    case 'percent':
      return logarithmsIn(expression.operand);
    case 'binary':
      return [...logarithmsIn(expression.left), ...logarithmsIn(expression.right)];
    case 'call': {
      const { functionName, argument } = expression;
      const isLogarithm = functionName === 'log' || logarithms.includes(functionName);
      return [...(isLogarithm ? [functionName] : []), ...logarithmsIn(argument)];
    }
  }
}

/** Another logarithm inside may push an argument out of range: then this slip is not the one. */
function valueOrNull(evaluate: () => RoundedValue): RoundedValue | null {
  try {
    return evaluate();
  } catch (error) {
    if (isFootingError(error)) return null;
    throw error;
  }
}
