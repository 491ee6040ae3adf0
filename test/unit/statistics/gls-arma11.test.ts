import { describe, expect, it } from 'vitest';
import { glsArma11 } from '../../../src-main/statistics/gls-arma11.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';
import { expectClose } from '../../helpers/close.ts';

/** A line with ARMA(1,1) errors, invented. */
function madeLine(nRows: number, phi: number, theta: number, seed: number) {
  const stream = randomStream(seed, 0);
  let [error, before] = [0, stream.normal()];
  const x = Array.from({ length: nRows }, (_, t) => t / 10);
  const y = x.map((value) => {
    const innovation = stream.normal();
    error = phi * error + innovation + theta * before;
    before = innovation;
    return 1 + 2 * value + error;
  });
  return { x, y };
}

const codes = (request: Parameters<typeof glsArma11>[0]) => glsArma11(request).caveats.map(({ code }) => code);

describe('glsArma11', () => {
  it('follows units and levels', () => {
    const { x, y } = madeLine(80, 0.7, 0.4, 1);
    const plain = glsArma11({ x, y, intercept: true });
    const moved = glsArma11({ x: x.map((v) => 100 * v), y: y.map((v) => 3 * v - 8), intercept: true });
    const rounding = { rel: 1e-8, abs: 1e-9, why: 'φ and θ stand still to 1e-10' };
    expectClose([moved.phi, moved.theta], [plain.phi, plain.theta], rounding);
    expectClose(moved.coefficients[1], (3 / 100) * plain.coefficients[1]!, rounding);
    expectClose(moved.coefficients[0], 3 * plain.coefficients[0]! - 8, rounding);
    expectClose(moved.standardErrors[1], (3 / 100) * plain.standardErrors[1]!, rounding);
    expectClose(moved.sigma, 3 * plain.sigma, rounding);
    expectClose(moved.logLikelihood, plain.logLikelihood - 80 * Math.log(3), rounding);
  });

  it('finds φ and θ again in a long series', () => {
    const fit = glsArma11({ ...madeLine(600, 0.8, -0.4, 2), intercept: true });
    // Asymptotic standard errors of φ and θ here are about 0.04 and 0.06 (Brockwell & Davis 1991, §8.8).
    expect(Math.abs(fit.phi - 0.8)).toBeLessThan(4 * 0.04);
    expect(Math.abs(fit.theta + 0.4)).toBeLessThan(4 * 0.06);
    expect(fit.caveats).toEqual([]);
  });

  it('reversing time changes nothing', () => {
    const { x, y } = madeLine(50, 0.6, 0.5, 3);
    const { caveats, ...plain } = glsArma11({ x, y, intercept: true });
    const { caveats: reversed, ...fit } = glsArma11({ x: x.toReversed(), y: y.toReversed(), intercept: true });
    expectClose(fit, plain, { rel: 1e-7, abs: 1e-8, why: 'φ and θ stand still to 1e-10' });
    expect(reversed).toEqual(caveats);
  });

  it('white noise: φ and θ cancel', () => {
    expect(codes({ ...madeLine(60, 0, 0, 8), intercept: true })).toContain('near-cancelling-roots');
  });

  it('errors like a random walk: near a unit root', () => {
    expect(codes({ ...madeLine(200, 0.995, 0.3, 7), intercept: true })).toContain('near-unit-root');
  });

  it('differences of noise: near |θ| = 1', () => {
    expect(codes({ ...madeLine(60, 0, -1, 6), intercept: true })).toContain('near-noninvertible');
  });

  const years = Array.from({ length: 12 }, (_, t) => 1960 + t);
  const wiggle = years.map((year) => Math.sin(year ** 2));
  const asked = { x: years, y: wiggle, intercept: true };
  it.each([
    ['an exact fit', { ...asked, y: years.map((year) => 3 * year - 2) }, 'glsArma11: expected residuals'],
    ['four rows for a line', { x: [1, 2, 3, 4], y: [1, 3, 2, 4], intercept: true }, 'at least 5 rows'],
    ['a constant predictor', { ...asked, x: years.map(() => 7) }, 'a constant predictor'],
    ['a missing value', { ...asked, y: wiggle.with(4, NaN) }, 'glsArma11, y[4]'],
    ['mismatched lengths', { ...asked, x: years.slice(2) }, 'expected 12 values'],
    ['a year twice', { ...asked, years: years.with(3, 1962) }, 'glsArma11, years[3]: expected a year after 1962'],
  ])('refuses %s', (_, request, sentence) => expect(() => glsArma11(request)).toThrow(sentence));
});
