import type { ResidualTest } from '../../contract/estimator-comparison.ts';
import type { ReportClaim } from '../../contract/project.ts';
import { formatNumber, formatP } from '../../quantities/notation.ts';
import { html, nothing, table, type Html, type HtmlValue } from '../html.ts';
import { caveatsPart } from './caveats-part.ts';
import { figurePart, figuresOf } from './figure-part.ts';

const halfWidthPx = 340;

/** What the residuals of the line say about its errors: in tests, and in figures. */
export function residualsPart(claim: ReportClaim): Html {
  return html`<h2>Residuals</h2>
    ${tests(claim.estimators)}
    <div class="pair">${figuresOf(claim, 'residuals').map((figure) => figurePart(figure, halfWidthPx))}</div>`;
}

function tests(comparison: ReportClaim['estimators']): HtmlValue {
  if (!comparison) return nothing('The residuals have not been tested.');
  const { residualTests, testsMissing } = comparison;
  if (testsMissing !== null) return nothing(`The residuals have not been tested. ${testsMissing}`);
  return table(
    'Tests of the residuals of the least-squares line',
    [
      { heading: 'Test, and what a small p speaks against' },
      { heading: 'Statistic', isNumber: true },
      { heading: 'Degrees of freedom', isNumber: true },
      { heading: 'p', isNumber: true },
    ],
    residualTests.map(testRow),
    'halves',
  );
}

function testRow({ label, asks, statistic, df, p, convention, caveats }: ResidualTest): HtmlValue[] {
  return [
    html`${label}: ${asks}<br /><span class="quiet">${convention}</span>${caveatsPart(caveats)}`,
    formatNumber(statistic, { decimals: 2 }),
    df === null ? '–' : df,
    p === null ? '–' : formatP(p).replace(/^p (= )?/, ''),
  ];
}
