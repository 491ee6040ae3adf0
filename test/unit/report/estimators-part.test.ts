import { describe, expect, it } from 'vitest';
import type { ReportClaim } from '../../../src-main/contract/project.ts';
import { estimatorsPart } from '../../../src-main/report/parts/estimators-part.ts';
import { residualsPart } from '../../../src-main/report/parts/residuals-part.ts';
import { inventedComparison } from '../../helpers/invented-comparison.ts';
import { inventedClaim, untouchedClaim } from './invented-report.ts';

/** Rows of a table's body as the texts of their cells. */
const rows = (markup: string) =>
  [...markup.matchAll(/<tr>([\s\S]*?)<\/tr>/g)].slice(1).map(([, row = '']) =>
    [...row.matchAll(/<t[hd][^>]*>([\s\S]*?)<\/t[hd]>/g)].map(([, cell = '']) =>
      cell
        .replace(/<[^>]*>/g, ' ')
        .replace(/\s+/g, ' ')
        .trim(),
    ),
  );
const estimators = (claim: ReportClaim) => estimatorsPart(claim).markup;

describe('estimatorsPart', () => {
  it('has the number, its error, its interval and its distance from the stated one by each estimator', () => {
    const [own, neweyWest, ml, , theilSen] = rows(estimators(inventedClaim));
    expect(own).toEqual([
      'Least squares, classical errors: the procedure’s own as ols-classical has it',
      '1.87',
      '0.04',
      '1.79 – 1.96',
      '−0.03',
    ]);
    expect(neweyWest?.[0]).toContain('the years on either side count as neighbours');
    expect(ml?.[0]).toContain('ρ = 0.520; σ = 0.0930');
    expect(theilSen?.slice(1, 3)).toEqual(['2.21', 'none of its own']);
    expect(theilSen?.[0]).toContain('always fits an intercept');
  });

  it('says what is stated, what could not be computed, and that gaps are not counted as time', () => {
    const markup = estimators(inventedClaim);
    expect(markup).toContain('stated: at most 1.9');
    expect(markup).toContain('Random numbers of Least squares, block bootstrap: invented, seed 7, 500 draws.');
    expect(markup).toContain('No number by York, stated errors alone and York, errors scaled to the scatter: series');
    expect(markup).toContain('Taking the years on either side for neighbours');
    expect(markup).toContain('The anchor year is itself a row');
  });

  it('says when nothing was compared', () => {
    expect(estimators(untouchedClaim)).toContain('has not been held against other estimators');
  });
});

describe('residualsPart', () => {
  it('has a row for each test, with what it asks, its convention and its doubts', () => {
    const [durbinWatson, breuschGodfrey] = rows(residualsPart(inventedClaim).markup);
    expect(durbinWatson).toEqual([
      'Durbin–Watson: neighbouring residuals are unrelated Σ(e_t − e_(t−1))²/Σe_t² Without an intercept the published bounds do not apply.',
      '0.96',
      '–',
      '–',
    ]);
    expect(breuschGodfrey?.slice(1)).toEqual(['16.20', '3', '0.001']);
  });

  it('says why there are no tests', () => {
    const without = { ...inventedComparison, residualTests: [], testsMissing: 'The fit is exact.' };
    expect(residualsPart({ ...inventedClaim, estimators: without }).markup).toContain(
      'not been tested. The fit is exact.',
    );
    expect(residualsPart(untouchedClaim).markup).toContain('The residuals have not been tested.');
  });

  it('draws only the figures of residuals', () => {
    const figure = inventedClaim.figures.find(({ kind }) => kind === 'xy');
    if (!figure) throw new Error('the invented claim has a figure');
    const named = (name: string) => ({ ...figure, name });
    const claim = {
      ...inventedClaim,
      figures: [named('claim-1-fit'), named('claim-1-residuals'), named('claim-1-residual-lag')],
    };
    expect(residualsPart(claim).markup.match(/<figure>/g)).toHaveLength(1);
  });
});
