import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { twoSidedP } from '../../../src-main/statistics/two-sided-p.ts';
import { upperTailChiSquared } from '../../../src-main/statistics/upper-tail-chi-squared.ts';
import { upperTailF } from '../../../src-main/statistics/upper-tail-f.ts';
import { expectClose, type Tolerance } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

// Level B: R's pt, pf, pchisq, pnorm, qnorm, qt, in the same run, from the middle to the far tails.

let r: RSession;
beforeAll(async () => {
  r = await startR();
});
afterAll(() => r.close());

const degrees = [1, 2, 3, 4, 5, 7, 10, 15, 20, 34, 50, 100, 140, 500, 1000, 10_000];

/** Below this a double loses digits on its way to zero. */
const SMALLEST = 1e-290;

const near: Tolerance = { rel: 1e-12, abs: 0, why: 'what a p-value needs, tails included' };

/** Every combination of the lists, one array per argument. */
function grid(...lists: number[][]): number[][] {
  const rows = lists.reduce<number[][]>((rows, list) => rows.flatMap((row) => list.map((v) => [...row, v])), [[]]);
  return lists.map((_, place) => rows.map((row) => row[place]!));
}

async function compare(code: string, f: (...values: number[]) => number, lists: number[][], tolerance = near) {
  const [a = [], b = a, c = a] = grid(...lists);
  const { v: fromR = [] } = await r.numbers(`list(v = ${code})`, { a, b, c });
  const rows = fromR.flatMap((value, i) => (Math.abs(value) < SMALLEST ? [] : [i]));
  expect(rows.length).toBeGreaterThan(fromR.length / 2);
  const label = (i: number) => `${code} at ${a[i]}, ${b[i]}, ${c[i]}`;
  expectClose(
    Object.fromEntries(rows.map((i) => [label(i), f(a[i]!, b[i]!, c[i]!)])),
    Object.fromEntries(rows.map((i) => [label(i), fromR[i]!])),
    tolerance,
  );
}

describe('tail probabilities against R', () => {
  it('twoSidedP', async () => {
    const t = [0, 1e-8, 1e-3, 0.1, 0.5, 1, 1.5, 2, 2.5, 3, 4, 6, 8, 10, 15, 20, 50, 100, 1000];
    await compare('2 * pt(-abs(a), b)', twoSidedP, [[...t, ...t.map((value) => -value)], degrees]);
  });

  it('twoSidedP keeps its digits where 1 − F has none', async () => {
    const { p, cancelled } = await r.numbers('list(p = 2 * pt(-20, 50), cancelled = 2 * (1 - pt(20, 50)))');
    expect(cancelled).toEqual([0]);
    expectClose([twoSidedP(20, 50)], p, near);
  });

  it('upperTailF', async () => {
    const f = [1e-16, 1e-8, 1e-4, 0.01, 0.1, 0.5, 1, 1.5, 2, 3, 5, 10, 30, 100, 1000, 1e5, 5.4e6];
    const many = { ...near, rel: 3e-12, why: 'with 1e4 degrees of freedom on one side' };
    await compare('pf(a, b, c, lower.tail = FALSE)', upperTailF, [f, [1, 2, 3, 5, 10, 40], degrees], many);
    const most = { ...near, rel: 1e-10, why: 'with 1e6 degrees of freedom on one side' };
    await compare(
      'pf(a, b, c, lower.tail = FALSE)',
      upperTailF,
      [
        [0.5, 1, 2, 5, 20],
        [1, 3],
        [1e5, 1e6],
      ],
      most,
    );
  });

  it('upperTailChiSquared', async () => {
    const x = [1e-6, 1e-3, 0.1, 0.5, 1, 2, 3, 5, 10, 20, 50, 100, 200, 500, 1000];
    await compare('pchisq(a, b, lower.tail = FALSE)', upperTailChiSquared, [x, [1, 2, 3, 4, 5, 8, 10, 20, 40, 100]]);
  });

  it('normal distribution function, as the library gives it', async () => {
    const z = Array.from({ length: 723 }, (_, i) => (i - 361) / 10);
    await compare('pnorm(a)', (value) => normalCdf(value, 0, 1), [z]);
  });
});

describe('quantiles against R', () => {
  it('t, as the library gives it', async () => {
    await compare('qt(a, b)', tQuantile, [
      [1e-8, 1e-3, 0.025, 0.05, 0.6, 0.75, 0.9, 0.95, 0.975, 0.995, 0.99999],
      degrees,
    ]);
  });

  it('normal, as the library gives it', async () => {
    const halves = Array.from({ length: 53 }, (_, k) => 2 ** -(k + 1));
    const thousandths = Array.from({ length: 999 }, (_, i) => (i + 1) / 1000);
    const p = [...halves, ...halves.map((value) => 1 - value), ...thousandths];
    const digits = { rel: 1e-14, abs: 1e-300, why: 'random normals are made of it' };
    await compare('qnorm(a)', (value) => normalQuantile(value, 0, 1), [p.filter((value) => value !== 0.5)], digits);
    expect(normalQuantile(0.5, 0, 1)).toBe(0);
  });
});
