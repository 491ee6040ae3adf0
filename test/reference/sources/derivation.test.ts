import { describe, expect, it } from 'vitest';
import { evaluateDerivation } from '../../../src-main/sources/derivation.ts';
import { expectClose } from '../../helpers/close.ts';

// Level C, worked by hand; the facts are common practice of the trade: half a unit of the last printed digit as
// rounding error, 2.71 K per e-folding is 1.88 K per doubling, r = 0.61 is R² = 37 %, 5.35 ln 2 = 3.71 W/m².

const hand = { rel: 0, abs: 5e-6, why: 'worked by hand to five decimals' };
const evaluate = (line: string) => {
  const [answer] = evaluateDerivation([line]).lines;
  if (!answer) throw new Error('expected one answer');
  return answer;
};

describe('rounded inputs and stated outputs', () => {
  it('2.71 ln 2 lies in 1.87496 – 1.88189: 1.9 agrees, 1.8 does not', () => {
    const line = evaluate('2.71 * ln(2) = 1.9');
    expectClose(line.computedInterval, { low: 1.87496, high: 1.88189 }, hand);
    expectClose(line.value, 1.87843, hand);
    expect(line.statedInterval).toEqual({ low: 1.85, high: 1.95 });
    expect(line.agrees).toBe(true);
    expect(evaluate('2.71 * ln(2) = 1.8').agrees).toBe(false);
  });

  it('0.61² lies in 0.366025 – 0.378225: 37 % agrees, 0.40 does not', () => {
    const line = evaluate('0.61^2 = 37 %');
    expectClose(line.computedInterval, { low: 0.366025, high: 0.378225 }, hand);
    expect(line.agrees).toBe(true);
    expect(evaluate('0.61² = 0.40').agrees).toBe(false);
  });

  it('5.35 ln 2 is 3.70834: 3.7 agrees; 4 agrees to one digit and is told apart', () => {
    expectClose(evaluate('5.35 ln 2 = 3.7').value, 3.70834, hand);
    expect(evaluate('5.35 ln 2 = 3.7')).toMatchObject({ agrees: true, remark: null });
    expect(evaluate('5.35 ln 2 = 4')).toMatchObject({
      agrees: true,
      remark: expect.stringMatching(/one digit only/) as string,
    });
  });

  it('5.35 log10 2 is 1.61051: stated for ln 2, it is the slip of the base', () => {
    expectClose(evaluate('5.35 log10 2').value, 1.61051, hand);
    expect(evaluate('5.35 * ln(2) = 1.61')).toMatchObject({ agrees: false, likelySlip: 'log10 in place of ln' });
    expect(evaluate('5.35 * ln(2) = 5.35')).toMatchObject({
      agrees: false,
      likelySlip: 'log2 in place of ln; or a factor of ln 2: per e-folding taken for per doubling',
    });
  });
});

describe('likely slips', () => {
  it.each([
    ['0.018 * 1.00 = 0.18', /factor of 10:/],
    ['0.372 * 1.00 = 37.2', /factor of 100:/],
    ['1.88 * 1.00 = 3.38', /factor of 1\.8:/],
    ['0.0015 * 1.00 = 0.18', /factor of 120:/],
    ['10.0 * 1.00 = 36.7', /44\/12/],
    ['5.00 * 1.00 = 10.6', /2\.124/],
    ['2.710 * 1.000 = 1.878', /factor of ln 2/],
    ['2.50 - 3.60 = 1.10', /the sign/],
  ])('%s', (line, slip) => {
    const answer = evaluate(line);
    expect(answer.agrees).toBe(false);
    expect(answer.likelySlip).toMatch(slip);
  });

  it('names none where none fits, and looks for none where the line agrees', () => {
    expect(evaluate('2.71 * ln(2) = 1.8')).toMatchObject({ agrees: false, likelySlip: null });
    expect(evaluate('2.71 * ln(2) = 1.88').likelySlip).toBeNull();
  });
});
