import { describe, expect, it } from 'vitest';
import type { ClaimView } from '../../../../src-main/contract/project.ts';
import { estimatorsLines } from '../../../../src-main/hosts/command-line/estimators-text.ts';
import { inventedComparison } from '../../../helpers/invented-comparison.ts';
import { inventedClaim } from '../../report/invented-report.ts';

const view = (answer: typeof inventedComparison | null) =>
  ({ claim: inventedClaim.claim, estimators: answer && { answer } }) as ClaimView;

describe('estimatorsLines', () => {
  const lines = estimatorsLines(view(inventedComparison));

  it('has the stated number above and a line for each estimator', () => {
    expect(lines[1]).toBe('stated at most 1.9; 58 years, 1960–2019; in K per doubling');
    const row = (label: string) => lines.find((line) => line.startsWith(label))?.split(/ {2,}/);
    expect(row('Least squares, classical errors (own)')?.slice(1)).toEqual(['1.87', '0.04', '1.79 to 1.96', '−0.03']);
    expect(row('Theil–Sen')?.slice(1)).toEqual(['2.21', '–', '2.01 to 2.41', '+0.31']);
  });

  it('has conventions, doubts, tests and what could not be computed', () => {
    const text = lines.join('\n');
    for (const said of [
      'as gls-ar1-ml has it; ρ = 0.520; σ = 0.0930',
      'note: This estimator always fits an intercept.',
      'no number by York, stated errors alone and York, errors scaled to the scatter: series',
      'Breusch–Godfrey 16.20, 3 df, p = 0.001',
      'Taking the years on either side for neighbours',
    ])
      expect(text).toContain(said);
  });

  it('says why the residuals are not tested, or that nothing was compared', () => {
    const untested = { ...inventedComparison, residualTests: [], testsMissing: 'The fit is exact.' };
    expect(estimatorsLines(view(untested)).join('\n')).toContain('have not been tested. The fit is exact.');
    expect(estimatorsLines(view(null))).toEqual(['Not compared.']);
  });
});
