import { describe, expect, it } from 'vitest';
import { phi, phiDifference } from '../../../../src-main/climate/two-layer/phi-functions.ts';
import { expectClose } from '../../../helpers/close.ts';

// Level C: the series in whole numbers of 10⁻⁴⁰, for arguments that are whole numbers of 1/64.
const ONE = 10n ** 40n;
const fraction = (sixtyFourths: bigint): bigint => (sixtyFourths * ONE) / 64n;
const times = (a: bigint, b: bigint): bigint => (a * b) / ONE;
const asNumber = (value: bigint): number => Number((value * 10n ** 20n) / ONE) / 1e20;

function phiSeries(k: number, x: bigint): bigint {
  let [sum, power, factorial] = [0n, ONE, 1n];
  for (let i = 2n; i <= BigInt(k); i++) factorial *= i;
  for (let n = 0n; n < 150n; n++) {
    sum += power / factorial;
    power = times(power, x);
    factorial *= n + 1n + BigInt(k);
  }
  return sum;
}

function differenceSeries(k: number, low: bigint, high: bigint): bigint {
  if (low !== high) return ((phiSeries(k, high) - phiSeries(k, low)) * ONE) / (high - low);
  // Derivative: Σ n x^(n−1)/(n + k)!
  let [sum, power, factorial] = [0n, ONE, 1n];
  for (let i = 2n; i <= BigInt(k) + 1n; i++) factorial *= i;
  for (let n = 1n; n < 150n; n++) {
    sum += (n * power) / factorial;
    power = times(power, low);
    factorial *= n + 1n + BigInt(k);
  }
  return sum;
}

const rounding = { rel: 4e-15, abs: 0, why: 'some twenty roundings of a double' };
const sixtyFourths = [0n, -1n, -7n, -40n, -63n, -64n, -65n, -100n, -320n, -640n];

describe.each([0, 1, 2])('φ_%i', (k) => {
  it('is its series, on both sides of −1 where the form changes', () => {
    for (const x of sixtyFourths) {
      expectClose(phi(k, Number(x) / 64), asNumber(phiSeries(k, fraction(x))), rounding, `x = ${x}/64`);
    }
  });

  it('has the divided difference of its series, also at equal arguments', () => {
    for (const low of sixtyFourths) {
      for (const high of sixtyFourths.filter((value) => value >= low)) {
        const expected = asNumber(differenceSeries(k, fraction(low), fraction(high)));
        const found = phiDifference(k, Number(low) / 64, Number(high) / 64);
        expectClose(found, expected, rounding, `${low}/64, ${high}/64`);
      }
    }
  });

  it('stays finite far out', () => {
    expect(phi(k, -1e8)).toBeGreaterThanOrEqual(0);
    expect(phiDifference(k, -1e8, -1e-12)).toBeGreaterThan(0);
  });
});
