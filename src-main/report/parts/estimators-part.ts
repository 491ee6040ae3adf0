import type { EstimatorComparison, EstimatorEstimate, ResidualTest } from '../../contract/estimator-comparison.ts';
import type { Caveat } from '../../contract/primitives.ts';
import type { ReportClaim } from '../../contract/project.ts';
import { decimalsFor, formatInterval, formatNumber, formatP, formatYears } from '../../quantities/notation.ts';
import { html, nothing, table, type Html, type HtmlValue } from '../html.ts';
import { caveatsPart } from './caveats-part.ts';

/** The number under every estimator, and what the residuals of the line say about its errors. */
export function estimatorsPart({ claim, estimators }: ReportClaim): Html {
  return html`<h2>Other estimators</h2>
    ${
      estimators
        ? content(
            estimators,
            `${claim.statement.bound === 'equals' ? '' : `${claim.statement.bound} `}${claim.statement.value}`,
          )
        : nothing('The number has not been held against other estimators.')
    }`;
}

function content(comparison: EstimatorComparison, stated: string): HtmlValue {
  const { unit, window, nObs, estimates, notComputed, gaps, residualTests, testsMissing, caveats } = comparison;
  return [
    html`<p>
      The same ${nObs} rows, ${formatYears(window)}, under other ways to fit the line and to count its error, in the
      unit of the claim. ${gaps.sentence}
    </p>`,
    caveatsPart(caveats),
    table(
      `The number under each estimator, ${unit}; stated: ${stated}`,
      [
        { heading: 'Estimator' },
        { heading: 'Number', isNumber: true },
        { heading: '± 1 standard error', isNumber: true },
        { heading: '95 % interval', isNumber: true },
        { heading: 'Minus stated', isNumber: true },
      ],
      estimates.map((estimate) => estimateRow(estimate, comparison.stated.value)),
      'estimators',
    ),
    notComputed.map(({ labels, reason }) => html`<p class="quiet">No number by ${labels.join(' and ')}: ${reason}</p>`),
    testsMissing
      ? nothing(`The residuals have not been tested: ${testsMissing}`)
      : table(
          'Tests of the residuals of the least-squares line',
          [
            { heading: 'Test, and what a small p speaks against' },
            { heading: 'Statistic', isNumber: true },
            { heading: 'Degrees of freedom', isNumber: true },
            { heading: 'p', isNumber: true },
          ],
          residualTests.map(testRow),
          'estimators',
        ),
  ];
}

function estimateRow(estimate: EstimatorEstimate, stated: number): HtmlValue[] {
  const { label, value, standardError, interval95, convention, parameters, isOwn, caveats } = estimate;
  const decimals = standardError === null ? 2 : decimalsFor(standardError);
  const found = parameters.map(({ symbol, value: figure }) => `${symbol} = ${formatNumber(figure)}`).join(', ');
  return [
    named(isOwn ? `${label} (the procedure’s own)` : label, found ? `${convention}; ${found}` : convention, caveats),
    formatNumber(value, { decimals }),
    standardError === null ? 'none of its own' : formatNumber(standardError, { decimals }),
    interval95 ? formatInterval(interval95) : 'none',
    formatNumber(value - stated, { decimals, withSign: true }),
  ];
}

function testRow({ label, asks, statistic, df, p, convention, caveats }: ResidualTest): HtmlValue[] {
  return [
    named(label, `${asks}. ${convention}`, caveats),
    formatNumber(statistic, { decimals: 2 }),
    df === null ? '–' : df,
    p === null ? '–' : formatP(p).replace(/^p = /, ''),
  ];
}

function named(label: string, convention: string, caveats: readonly Caveat[]): Html {
  return html`${label}<br /><span class="quiet">${convention}</span>${caveatsPart(caveats)}`;
}
