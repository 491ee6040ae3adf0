import type { DerivationAnswer } from '../contract/result.ts';
import { InputError, isFootingError } from '../errors.ts';
import { formatInterval } from '../quantities/notation.ts';
import { decimalsPrinted, significantDigitsPrinted, statedInterval } from '../quantities/stated-number.ts';
import { parseExpression, type Expression, type ParsedSide } from './derivation-expression.ts';
import { evaluateExpression, roundedNumber, type EvaluationContext, type RoundedValue } from './derivation-interval.ts';
import { likelySlip, meetsStated, type StatedSide } from './derivation-slip.ts';
import { joinNamedPowers, nameGivenValue, splitAtEquals } from './derivation-names.ts';
import { derivationTokens } from './derivation-tokens.ts';

type DerivationLine = DerivationAnswer['lines'][number];

/** What earlier lines have given names to; null for a name whose line could not be read. */
type NamedValues = Map<string, { lineNumber: number; rounded: RoundedValue | null }>;

/**
 * Re-evaluates the arithmetic that a source shows, line by line: "2.71 * ln(2) = 1.9", "b = 2.71 K", "b ln 2 = 1.88".
 * A line agrees when the interval that its rounded inputs leave open meets the interval of the stated digits.
 *
 * Numbers   with a decimal mark stand for their rounding interval; whole numbers are exact, except alone on their side
 *           of "=", where they are a statement with that many digits
 * Names     a name alone on the left takes the stated number, or the expression where none is stated, and may be used
 *           in later lines
 * Percent   divides by 100. Other units are kept, not computed with
 *
 * @returns  an answer per line; what cannot be read is said in `problem`, nothing is thrown
 *
 * Source    common practice: rounding as half a unit of the last digit
 * Checked   test/reference/sources/derivation.test.ts (C: worked by hand)
 */
export function evaluateDerivation(lines: readonly string[]): DerivationAnswer {
  const names: NamedValues = new Map();
  return { lines: lines.map((line, index) => evaluateLine(line, index + 1, names)) };
}

function evaluateLine(line: string, lineNumber: number, names: NamedValues): DerivationLine {
  const empty: DerivationLine = {
    line,
    value: null,
    unit: null,
    stated: null,
    statedInterval: null,
    computedInterval: null,
    agrees: null,
    likelySlip: null,
    remark: null,
    problem: null,
  };
  if (line.trim() === '') return empty;
  let assignedName: string | null = null;
  try {
    const isKnown = (name: string): boolean => names.has(name);
    const sides = splitAtEquals(joinNamedPowers(derivationTokens(line), isKnown));
    assignedName = nameGivenValue(sides, isKnown);
    const parsed = (assignedName === null ? sides : sides.slice(1)).map(parseExpression);
    const { answer, assigned } = evaluateSides(parsed, contextOf(names));
    if (assignedName !== null) names.set(assignedName, { lineNumber, rounded: assigned });
    return { ...empty, ...answer };
  } catch (error) {
    if (!isFootingError(error)) throw error;
    if (assignedName !== null) names.set(assignedName, { lineNumber, rounded: null });
    return { ...empty, problem: error.message };
  }
}

function evaluateSides(
  sides: readonly ParsedSide[],
  context: EvaluationContext,
): { answer: Partial<DerivationLine>; assigned: RoundedValue } {
  const statedPlace = sides.length === 1 ? -1 : statedSidePlace(sides);
  const statedSide = sides[statedPlace];
  const stated = statedSide ? printedAlone(statedSide.expression) : null;
  const computedSides = sides.filter((_, place) => place !== statedPlace);
  const values = computedSides.map(({ expression }) => sideValue(expression, context));
  const [first] = values;
  const [principal] = computedSides;
  if (!first || !principal) throw new TypeError('a derivation line has at least one computed side');
  const remarks = sides.flatMap((side) => side.remarks);
  const sidesMeet = values.every((value) => isSameWithinRounding(value, first));
  const computed = { value: first.value, computedInterval: { low: first.low, high: first.high } };
  if (!stated || !statedSide) {
    if (!sidesMeet) remarks.push('The sides of this line do not have the same value.');
    const answer = {
      ...computed,
      unit: printedAlone(principal.expression) ? principal.unit : null,
      agrees: values.length > 1 ? sidesMeet : null,
      remark: remarks.join(' ') || null,
    };
    return { answer, assigned: first };
  }
  const failing = computedSides.find((_, place) => !meetsStated(values[place] ?? first, stated));
  const agrees = failing === undefined;
  const { low, high } = statedInterval(stated.digits);
  if (agrees && significantDigitsPrinted(stated.digits) === 1) {
    const ends = formatInterval({ low, high }, stated.divisor === 100 ? '%' : '', decimalsPrinted(stated.digits) + 1);
    remarks.push(`Agrees to one digit only: any number in ${ends} would.`);
  }
  const answer = {
    ...computed,
    unit: statedSide.unit,
    stated: stated.divisor === 1 ? stated.digits : `${stated.digits} %`,
    statedInterval: { low: low / stated.divisor, high: high / stated.divisor },
    agrees,
    likelySlip: failing ? likelySlip(failing.expression, context, stated) : null,
    remark: remarks.join(' ') || null,
  };
  return { answer, assigned: sideValue(statedSide.expression, context) };
}

/** Whether two intervals meet; sides that are the same by algebra differ in their last binary digits. */
function isSameWithinRounding(a: RoundedValue, b: RoundedValue): boolean {
  const slack = 1e-12 * Math.max(Math.abs(a.value), Math.abs(b.value));
  return a.low <= b.high + slack && a.high >= b.low - slack;
}

/** A side's value; a number alone on its side is rounded even when it is whole. */
function sideValue(expression: Expression, context: EvaluationContext): RoundedValue {
  const printed = printedAlone(expression);
  if (!printed) return evaluateExpression(expression, context);
  const { value, low, high } = roundedNumber(printed.digits);
  return { value: value / printed.divisor, low: low / printed.divisor, high: high / printed.divisor };
}

/** The printed digits when a side is nothing but a number, with sign and percent sign. */
function printedAlone(expression: Expression): StatedSide | null {
  switch (expression.kind) {
    case 'number':
      return { digits: expression.text, divisor: 1 };
    case 'negate': {
      const printed = printedAlone(expression.operand);
      return printed && !printed.digits.startsWith('−') ? { ...printed, digits: `−${printed.digits}` } : null;
    }
    case 'percent': {
      const printed = printedAlone(expression.operand);
      return printed?.divisor === 1 ? { ...printed, divisor: 100 } : null;
    }
    default:
      return null;
  }
}

/** The last side when it is a number alone, else the first; -1 when neither is. */
function statedSidePlace(sides: readonly ParsedSide[]): number {
  if (sides.length < 2) return -1;
  const isAlone = sides.map(({ expression }) => printedAlone(expression) !== null);
  return isAlone.at(-1) ? sides.length - 1 : isAlone[0] ? 0 : -1;
}

function contextOf(names: NamedValues): EvaluationContext {
  return {
    valueOf(name, column) {
      const named = names.get(name);
      if (named?.rounded) return named.rounded;
      throw new InputError({
        code: 'unknown-name',
        where: `column ${column}`,
        expected: 'a number, a known unit behind a number, or a name that an earlier line gives a value',
        received: named ? `“${name}”, whose line ${named.lineNumber} could not be read` : `“${name}”`,
      });
    },
  };
}
