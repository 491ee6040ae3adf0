import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { derivationAnswer } from '../../../src-main/contract/result.ts';
import { evaluateDerivation } from '../../../src-main/sources/derivation.ts';

const evaluate = (...lines: string[]) => evaluateDerivation(lines).lines;
const last = (...lines: string[]) => {
  const answer = evaluate(...lines).at(-1);
  if (!answer) throw new Error('expected an answer');
  return answer;
};

describe('reading a line', () => {
  it.each([
    ['2 + 3 * 4', 14],
    ['(2 + 3) * 4', 20],
    ['20 / 4 / 5', 1],
    ['2 ^ 3 ^ 2', 512],
    ['-3^2', -9],
    ['2^-1', 0.5],
    ['10 − 4 – 3', 3],
    ['3 × 4 ÷ 2 · 5', 30],
    ['3 ** 2', 9],
    ['5²', 25],
    ['2³ + 10⁻¹', 8.1],
    ['50 %', 0.5],
    ['200 * 10 %', 20],
    ['sqrt(16)', 4],
    ['√16 + 1', 5],
    ['exp(0)', 1],
    ['ln(exp(2))', 2],
    ['log10 1000', 3],
    ['log2(8)', 3],
    ['log 100', 2],
    ['LN(1)', 0],
    ['ln2 - ln 2', 0],
    ['2 (3 + 4)', 14],
    ['(1 + 1)(2 + 2)', 8],
    ['ln 2² - ln(4)', 0],
    ['ln(2)^2 - ln(2) ln(2)', 0],
    ['4 ln 2 / ln 4', 2],
    ['[{(7)}]', 7],
    ['1e2 + 1', 101],
  ])('%s is %d', (line, value) => {
    const answer = last(line);
    expect(answer.problem).toBeNull();
    expect(answer.value).toBeCloseTo(value, 12);
  });

  it.each([
    ['2.71 K * ln 2 = 1.88 K per doubling', 'K per doubling'],
    ['5.35 W/m² ln(560 ppm / 280 ppm) = 3.71 W m⁻²', 'W m⁻²'],
    ['3.93 W m-2 / 1.16 W m⁻² K⁻¹ = 3.39 °C', '°C'],
    ['0.018 K/yr * 10 = 0.18 K/decade', 'K/decade'],
    ['2.124 GtC/ppm * 100 ppm = 212.4 GtC', 'GtC'],
    ['1.88 * 1 = 1.88 K per doubling of CO2', 'K per doubling of CO2'],
    ['1.88 * 1 = 1.88 per doubling', 'per doubling'],
    ['1.8 * 1.04 = 1.87 degF', 'degF'],
    ['2.71 * ln(2) = 1.88', null],
  ])('keeps units and does not compute with them: %s', (line, unit) => {
    expect(last(line)).toMatchObject({ unit, agrees: true, problem: null });
  });

  it('reads decimal commas, and says so where a comma may stand for thousands', () => {
    expect(last('2,71 × ln 2 = 1,88')).toMatchObject({ agrees: true, stated: '1,88', remark: null });
    expect(last('1,950 * 2').value).toBeCloseTo(3.9, 12);
    expect(last('1,950 * 2').remark).toMatch(/“1,950” is read with a decimal comma/);
  });

  it('says how it reads “log”, and a function without brackets before a slash', () => {
    expect(last('log(100) = 2').remark).toMatch(/base 10/);
    expect(last('ln 8 / 2 = 1.04').remark).toMatch(/only what stands before the “\/”/);
    expect(last('ln(8) / 2 = 1.04').remark).toBeNull();
  });
});

describe('exact and rounded numbers', () => {
  it('whole numbers within an expression are exact, numbers with a decimal mark are rounded', () => {
    expect(last('2 * 3').computedInterval).toEqual({ low: 6, high: 6 });
    const { low, high } = last('2.0 * 3').computedInterval ?? { low: 0, high: 0 };
    expect([low, high]).toEqual([1.95 * 3, 2.05 * 3]);
  });

  it('a number alone on its side is a statement, rounded to its digits', () => {
    expect(last('b = 3').computedInterval).toEqual({ low: 2.5, high: 3.5 });
    expect(last('7 / 2 = 4').agrees).toBe(true);
    expect(last('7 / 2 = 3').agrees).toBe(false);
    expect(last('-7 / 2 = -4').agrees).toBe(true);
  });

  it('takes the ends of quotients, differences and powers the right way round', () => {
    expect(last('1 / 2.0').computedInterval).toEqual({ low: 1 / 2.05, high: 1 / 1.95 });
    expect(last('5 - 2.0').computedInterval).toEqual({ low: 5 - 2.05, high: 5 - 1.95 });
    expect(last('(0.0)^2').computedInterval?.low).toBe(0);
    expect(last('2.0^-1').computedInterval).toEqual({ low: 2.05 ** -1, high: 1.95 ** -1 });
    const { low, high } = last('(-2.0) * 3.0').computedInterval ?? { low: 0, high: 0 };
    expect([low, high]).toEqual([-2.05 * 3.05, -1.95 * 2.95]);
  });

  it('the interval holds the value for every choice of inputs within their rounding', () => {
    const inside = fc.double({ min: -0.49, max: 0.49, noNaN: true });
    fc.assert(
      fc.property(
        fc.integer({ min: -500, max: 500 }),
        fc.integer({ min: 20, max: 500 }),
        inside,
        inside,
        fc.constantFrom('+', '-', '*', '/'),
        (p, q, shiftP, shiftQ, operator) => {
          const { computedInterval } = last(`(${(p / 10).toFixed(1)}) ${operator} ${(q / 10).toFixed(1)}`);
          const a = (p + shiftP) / 10;
          const b = (q + shiftQ) / 10;
          const value = { '+': a + b, '-': a - b, '*': a * b, '/': a / b }[operator];
          expect(value).toBeGreaterThanOrEqual((computedInterval?.low ?? NaN) - 1e-9);
          expect(value).toBeLessThanOrEqual((computedInterval?.high ?? NaN) + 1e-9);
        },
      ),
    );
  });
});

describe('names', () => {
  it('carries a named number into later lines, with its rounding', () => {
    const [given, used] = evaluate('b = 2.71 K', 'b * ln 2 = 1.9 K per doubling');
    expect(given).toMatchObject({ value: 2.71, unit: 'K', agrees: null, stated: null });
    expect(used).toMatchObject({ agrees: true, computedInterval: { low: 2.705 * Math.LN2, high: 2.715 * Math.LN2 } });
  });

  it('checks a line that gives a name and states a number, and goes on with the number as stated', () => {
    const [first, second] = evaluate('S = 2.71 * ln 2 = 1.9', 'S * 2 = 3.8');
    expect(first).toMatchObject({ agrees: true, stated: '1.9' });
    expect(second?.value).toBeCloseTo(3.8, 12);
  });

  it('holds a known name against what is stated for it', () => {
    expect(last('b = 5.42 / 2', 'b = 2.71')).toMatchObject({ agrees: true, stated: '2.71' });
    expect(last('b = 5.42 / 2', 'b = 2.8')).toMatchObject({ agrees: false });
  });

  it('takes letters of the field as names, units only behind a number', () => {
    expect(last('ΔT = 1.03 K', 'F_2x = 3.93', 'λ = 1.56', 'F_2x / λ = 2.52')).toMatchObject({ agrees: true });
    expect(last('C = 560', 'C0 = 280', '5.35 ln(C/C0) = 3.7')).toMatchObject({ agrees: true });
    expect(last('K = 2.0', '3 * K = 6.0')).toMatchObject({ agrees: true });
  });

  it('takes a squared name for a name of its own', () => {
    expect(last('r = 0.61', 'r² = 37 %')).toMatchObject({ agrees: true, stated: '37 %' });
    expect(last('r² = 0.61² = 0.37', 'r^2 * 2 = 0.74')).toMatchObject({ agrees: true });
  });

  it('reads a statement on the left and a chain of sides', () => {
    expect(last('1.9 = 2.71 ln 2')).toMatchObject({ agrees: true, stated: '1.9' });
    expect(last('2.71 ln 2 = 2.71 * 0.693 = 1.88')).toMatchObject({ agrees: true });
    expect(last('2.71 ln 2 = 2.71 log10(2) = 1.88')).toMatchObject({
      agrees: false,
      likelySlip: 'ln in place of log10',
    });
    expect(last('2 * 3 = 3 * 2')).toMatchObject({ agrees: true, stated: null });
    expect(last('ln(2) * 3 / 7 = 3 * (ln(2) / 7)')).toMatchObject({ agrees: true, remark: null });
    expect(last('2 * 3 = 3 * 3')).toMatchObject({
      agrees: false,
      remark: expect.stringMatching(/do not have the same/) as string,
    });
  });
});

describe('what cannot be read', () => {
  it.each([
    ['x = 3 + * 2', /^column 9: expected a number, a name, a function or “\(”, but found “\*”/],
    ['(2 + 3 = 5', /^column 8: expected an operator or “\)”, but found the end of this side/],
    ['2 + 3) = 5', /^column 6: expected an operator, a known unit or “=”, but found “\)”/],
    ['= 5', /^column 1: .*the end of this side/],
    ['2 * 3 =', /^column 8: .*the end of this side/],
    ['4 # 3', /^column 3: .*“#”/],
    ['2 3', /^column 3: .*“3”/],
    ['ln(0)', /^column 1: expected a number above 0 in “ln”, also within its rounding, but found 0/],
    ['ln(0.0)', /within its rounding, but found 0 \(-0\.05 to 0\.05\)/],
    ['sqrt(-1)', /at least 0 under the root/],
    ['1 / 0', /a divisor that is not 0/],
    ['1 / 0.0', /a divisor that is not 0/],
    ['(-2)^0.5', /a base above 0/],
    ['(0.0)^-1', /a base that is not 0/],
    ['exp(1000)', /within the range of numbers/],
    ['2 * y = 4', /^column 5: .*“y”/],
  ])('%s', (line, problem) => {
    const answer = last(line);
    expect(answer.problem).toMatch(problem);
    expect(answer).toMatchObject({ value: null, agrees: null, computedInterval: null });
  });

  it('tells which line a name without a value comes from', () => {
    expect(last('b = 2.71 *', 'b ln 2 = 1.9').problem).toMatch(/“b”, whose line 1 could not be read/);
  });

  it('leaves blank lines alone', () => {
    expect(last('  ')).toMatchObject({ line: '  ', value: null, problem: null });
  });

  it('never throws, whatever is typed, and answers by the contract', () => {
    const marks = '0123456789.,+-−*/^×÷·()=%²⁻³ lnexpsqrtlogKWm/°CFbΔT"#€\t'.split('');
    const line = fc.string({ unit: fc.constantFrom(...marks), maxLength: 40 });
    fc.assert(
      fc.property(fc.array(line, { maxLength: 4 }), (lines) => {
        const answer = evaluateDerivation(lines);
        expect(answer.lines).toHaveLength(lines.length);
        expect(derivationAnswer.parse(answer)).toEqual(answer);
      }),
      { numRuns: 2000 },
    );
  });

  it('copes with the longest line that may be asked', () => {
    expect(last(`${'('.repeat(249)}2${')'.repeat(249)}`).value).toBe(2);
    expect(last(`${'-'.repeat(498)}2`).value).toBe(2);
  });
});
