import { InputError } from '../errors.ts';
import { statedInterval, statedValue } from '../quantities/stated-number.ts';
import type { Expression } from './derivation-expression.ts';
import type { FunctionName } from './derivation-tokens.ts';

/** A value at the printed digits, and the interval that these digits leave open. */
export interface RoundedValue {
  value: number;
  low: number;
  high: number;
}

export interface EvaluationContext {
  /** @throws InputError when the name has no value */
  valueOf: (name: string, column: number) => RoundedValue;
  /** Reads one logarithm as another, to look for a slip. */
  replaceFunction?: (name: FunctionName) => FunctionName;
}

/**
 * Value of an expression and the interval over the rounding of its inputs, by interval arithmetic: exact ends for
 * monotone functions, the extreme corners for products, quotients and powers.
 *
 * Numbers with a decimal mark are rounded ("2.0" is [1.95, 2.05)); whole numbers are exact ("ln 2", "5/9"). A name that
 * occurs twice counts as two independent numbers, so its interval may come out too wide, never too narrow.
 *
 * @throws InputError `undefined` where a function or a quotient has no value, with the column
 *
 * Source  interval arithmetic on the half-unit of the last printed digit: common practice
 */
export function evaluateExpression(expression: Expression, context: EvaluationContext): RoundedValue {
  switch (expression.kind) {
    case 'number':
      return /[.,]/.test(expression.text) ? roundedNumber(expression.text) : exact(statedValue(expression.text));
    case 'name':
      return context.valueOf(expression.name, expression.column);
    case 'negate':
      return negated(evaluateExpression(expression.operand, context));
    case 'percent':
      return increasing(evaluateExpression(expression.operand, context), (value) => value / 100);
    case 'call': {
      const name = context.replaceFunction?.(expression.functionName) ?? expression.functionName;
      return finite(call(name, evaluateExpression(expression.argument, context), expression.column), expression.column);
    }
    case 'binary': {
      const left = evaluateExpression(expression.left, context);
      const right = evaluateExpression(expression.right, context);
      return finite(binary(expression.operator, left, right, expression.column), expression.column);
    }
  }
}

/** A printed number with its rounding interval, whole or not. */
export function roundedNumber(text: string): RoundedValue {
  return { value: statedValue(text), ...statedInterval(text) };
}

function exact(value: number): RoundedValue {
  return { value, low: value, high: value };
}

function negated({ value, low, high }: RoundedValue): RoundedValue {
  return { value: -value, low: -high, high: -low };
}

function increasing({ value, low, high }: RoundedValue, f: (value: number) => number): RoundedValue {
  return { value: f(value), low: f(low), high: f(high) };
}

function call(name: FunctionName, argument: RoundedValue, column: number): RoundedValue {
  if (name === 'exp') return increasing(argument, Math.exp);
  if (name === 'sqrt') {
    if (argument.value < 0) throw noValue(column, 'a number of at least 0 under the root', argument);
    return increasing({ ...argument, low: Math.max(0, argument.low) }, Math.sqrt);
  }
  if (argument.low <= 0) throw noValue(column, `a number above 0 in “${name}”, also within its rounding`, argument);
  return increasing(argument, { ln: Math.log, log: Math.log10, log10: Math.log10, log2: Math.log2 }[name]);
}

function binary(operator: '+' | '-' | '*' | '/' | '^', a: RoundedValue, b: RoundedValue, column: number): RoundedValue {
  switch (operator) {
    case '+':
      return { value: a.value + b.value, low: a.low + b.low, high: a.high + b.high };
    case '-':
      return { value: a.value - b.value, low: a.low - b.high, high: a.high - b.low };
    case '*':
      return overCorners(a, b, (x, y) => x * y);
    case '/':
      if (b.low <= 0 && b.high >= 0) throw noValue(column, 'a divisor that is not 0, also within its rounding', b);
      return overCorners(a, b, (x, y) => x / y);
    case '^':
      return power(a, b, column);
  }
}

function power(base: RoundedValue, exponent: RoundedValue, column: number): RoundedValue {
  const isWhole = exponent.low === exponent.high && Number.isInteger(exponent.value);
  if (!isWhole && base.low <= 0) throw noValue(column, 'a base above 0 for a power that is not whole', base);
  if (isWhole && exponent.value < 0 && base.low <= 0 && base.high >= 0) {
    throw noValue(column, 'a base that is not 0 for a negative power, also within its rounding', base);
  }
  const result = overCorners(base, exponent, (x, y) => x ** y);
  const isEven = isWhole && exponent.value % 2 === 0 && exponent.value > 0;
  return isEven && base.low < 0 && base.high > 0 ? { ...result, low: 0 } : result;
}

function overCorners(a: RoundedValue, b: RoundedValue, f: (x: number, y: number) => number): RoundedValue {
  const corners = [f(a.low, b.low), f(a.low, b.high), f(a.high, b.low), f(a.high, b.high)];
  return { value: f(a.value, b.value), low: Math.min(...corners), high: Math.max(...corners) };
}

function finite(result: RoundedValue, column: number): RoundedValue {
  if (Number.isFinite(result.low) && Number.isFinite(result.high) && Number.isFinite(result.value)) return result;
  throw noValue(column, 'a result within the range of numbers', result);
}

function noValue(column: number, expected: string, { value, low, high }: RoundedValue): InputError {
  return new InputError({
    code: 'undefined',
    where: `column ${column}`,
    expected,
    received: low === high ? `${value}` : `${value} (${low} to ${high})`,
  });
}
