import { expect, it } from 'vitest';
import { gregoryCaveats } from '../../../src-main/climate/gregory-caveats.ts';
import type { GregoryLine } from '../../../src-main/contract/climate-response.ts';

const split = { early: { from: 1, to: 20 }, late: { from: 21, to: 150 } };
const line = (feedback: number, error = 0.1, changes: Partial<GregoryLine> = {}): GregoryLine => ({
  nYears: 150,
  forcingWm2: 7,
  feedbackWm2PerK: feedback,
  equilibriumK: 7 / feedback,
  forcingStandardErrorWm2: 0.1,
  feedbackStandardErrorWm2PerK: error,
  equilibriumStandardErrorK: 0.2,
  equilibriumFieller95: null,
  ...changes,
});
const codes = (whole: GregoryLine, early: GregoryLine | null, late: GregoryLine | null): string[] =>
  gregoryCaveats({ line: whole, early, late, split }).map(({ code }) => code);

it('gregoryCaveats: a bend from 1.96 combined standard errors on', () => {
  // √(0.06² + 0.08²) = 0.1
  expect(codes(line(1.2), line(1.3, 0.06), line(1.105, 0.08))).toEqual([]);
  expect(codes(line(1.2), line(1.3, 0.06), line(1.103, 0.08))).toEqual(['curved']);
  expect(codes(line(1.2), line(1.2, 0), line(1.2 + 1e-12, 0))).toEqual([]);
  const below = gregoryCaveats({ line: line(1.2), early: line(1.5), late: line(0.9), split });
  expect(below[0]?.detail).toContain('below the equilibrium');
  const above = gregoryCaveats({ line: line(1.2), early: line(0.9), late: line(1.5), split });
  expect(above[0]?.detail).toContain('above the equilibrium');
});

it('gregoryCaveats: few years, parts without a line, no distinct feedback', () => {
  expect(codes(line(1.2, 0.1, { nYears: 20 }), line(1.2), line(1.2))).toEqual([]);
  expect(codes(line(1.2, 0.1, { nYears: 19 }), line(1.2), line(1.2))).toEqual(['few-years']);
  expect(codes(line(1.2), null, line(1.2))).toEqual(['part-too-short']);
  expect(gregoryCaveats({ line: line(1.2), early: null, late: null, split })[0]?.detail).toContain('1–20 and 21–150');
  expect(codes(line(0.1, 0.1, { equilibriumK: null }), line(1.2), line(1.2))).toEqual(['feedback-not-distinct']);
});
