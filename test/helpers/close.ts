import { expect } from 'vitest';

/** How far a number may be off, and why: |actual − expected| ≤ max(abs, rel·|expected|). */
export interface Tolerance {
  rel: number;
  abs: number;
  why: string;
}

/** Numbers, and tables of them: arrays and records of any depth. */
export type Table = number | string | boolean | null | ArrayLike<Table> | { [key: string]: Table };

/**
 * Compares a whole table with what it should be; every difference is listed with its place, what came, what was
 * expected, and the tolerance. Both sides must have the same shape: nothing is left uncompared.
 */
export function expectClose(actual: unknown, expected: unknown, tolerance: Tolerance, place = ''): void {
  const found = differences(actual, expected, tolerance, place);
  if (found.length > 0) expect.fail(`${found.length} differences:\n${found.slice(0, 20).join('\n')}`);
}

export function differences(actual: unknown, expected: unknown, tolerance: Tolerance, place = ''): string[] {
  const { rel, abs, why } = tolerance;
  if (!(rel >= 0 && abs >= 0 && rel < 0.1) || why === '') {
    return [`${place}: a tolerance needs rel (below 0.1), abs and a reason, not ${JSON.stringify(tolerance)}`];
  }
  const line = (got: unknown, wanted: unknown) =>
    `${place || 'value'}: got ${String(got)}, expected ${String(wanted)} within rel ${rel}, abs ${abs} (${why})`;

  if (typeof expected === 'number') {
    if (!Number.isFinite(expected)) return [line(actual, `a finite reference, not ${expected}`)];
    if (typeof actual !== 'number') return [line(actual, expected)];
    return Math.abs(actual - expected) <= Math.max(abs, rel * Math.abs(expected)) ? [] : [line(actual, expected)];
  }
  if (isArrayLike(expected)) {
    if (!isArrayLike(actual)) return [line(actual, `${expected.length} values`)];
    if (actual.length !== expected.length) return [line(`${actual.length} values`, `${expected.length} values`)];
    return Array.from(expected).flatMap((value, i) => differences(actual[i], value, tolerance, `${place}[${i}]`));
  }
  if (typeof expected === 'object' && expected !== null) {
    if (typeof actual !== 'object' || actual === null) return [line(actual, 'a record')];
    const keys = new Set([...Object.keys(actual), ...Object.keys(expected)]);
    return [...keys].flatMap((key) =>
      differences(
        (actual as Record<string, unknown>)[key],
        (expected as Record<string, unknown>)[key],
        tolerance,
        place ? `${place}.${key}` : key,
      ),
    );
  }
  return Object.is(actual, expected) && expected !== undefined ? [] : [line(actual, expected)];
}

function isArrayLike(value: unknown): value is ArrayLike<unknown> {
  return Array.isArray(value) || ArrayBuffer.isView(value);
}
