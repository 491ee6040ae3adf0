import { describe, expect, it } from 'vitest';
import { differences, expectClose } from '../../helpers/close.ts';

const tolerance = { rel: 1e-9, abs: 0, why: 'nine digits are printed' };

describe('expectClose', () => {
  it('passes an answer inside the tolerance and fails one that is off by ten tolerances', () => {
    expectClose(1234.5 * (1 + 5e-10), 1234.5, tolerance);
    expect(() => expectClose(1234.5 * (1 + 1e-8), 1234.5, tolerance)).toThrow('1234.5');
    expectClose(3e-13, 0, { rel: 0, abs: 1e-12, why: 'zero by symmetry' });
    expect(() => expectClose(1e-11, 0, { rel: 0, abs: 1e-12, why: 'zero by symmetry' })).toThrow('1e-11');
  });

  it('does not let an absolute tolerance stand for a relative one', () => {
    expect(differences(5, 1, { rel: 4, abs: 0, why: 'a slip' })).toHaveLength(1);
  });

  it('fails NaN, missing and superfluous values, wrong lengths, and null against a number', () => {
    expect(differences(NaN, 1, tolerance)).toHaveLength(1);
    expect(differences(NaN, NaN, tolerance)).toHaveLength(1);
    expect(differences({ a: 1 }, { a: 1, b: 2 }, tolerance)).toHaveLength(1);
    expect(differences({ a: 1, b: 2 }, { a: 1 }, tolerance)).toHaveLength(1);
    expect(differences([1, 2], [1, 2, 3], tolerance)).toHaveLength(1);
    expect(differences([1, null], [1, 2], tolerance)).toHaveLength(1);
    expect(differences([1, 2], [1, null], tolerance)).toHaveLength(1);
    expect(differences({ a: undefined }, { a: undefined }, tolerance)).toHaveLength(1);
  });

  it('lists every difference with its place', () => {
    const found = differences(
      { slope: 1, rows: [[1, 2], Float64Array.of(3, 9)] },
      {
        slope: 2,
        rows: [
          [1, 2],
          [3, 4],
        ],
      },
      tolerance,
    );
    expect(found).toHaveLength(2);
    expect(found[0]).toContain('slope: got 1, expected 2');
    expect(found[1]).toContain('rows[1][1]: got 9, expected 4');
  });

  it('wants a reason', () => {
    expect(differences(1, 1, { rel: 0, abs: 0, why: '' })).toHaveLength(1);
  });
});
