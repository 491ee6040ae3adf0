import type { EstimatorComparison, EstimatorEstimate } from '../../contract/estimator-comparison.ts';
import type { ReportClaim } from '../../contract/project.ts';
import { decimalsFor, formatInterval, formatNumber, formatYears } from '../../quantities/notation.ts';
import { html, nothing, table, type Html, type HtmlValue } from '../html.ts';
import { caveatsPart } from './caveats-part.ts';

/** The number under every estimator, the stated one beside all. */
export function estimatorsPart({ claim, estimators }: ReportClaim): Html {
  const { bound, value } = claim.statement;
  return html`<h2>Other estimators</h2>
    ${
      estimators
        ? content(estimators, bound === 'equals' ? value : `${bound} ${value}`)
        : nothing('The number has not been held against other estimators.')
    }`;
}

function content(comparison: EstimatorComparison, stated: string): HtmlValue {
  const { unit, window, nObs, estimates, notComputed, gaps, caveats } = comparison;
  // The smallest error decides how many digits all rows show.
  const decimals = Math.max(
    1,
    ...estimates.map(({ standardError }) => (standardError ? decimalsFor(standardError) : 0)),
  );
  return [
    html`<p>
      The same ${nObs} rows, ${formatYears(window)}, under other ways to fit the line and to count its error, turned
      into the unit of the claim by the same factor. ${gaps.sentence}
    </p>`,
    caveatsPart(caveats),
    table(
      `The number under each estimator, ${unit}; stated: ${stated}`,
      [
        { heading: 'Estimator' },
        { heading: 'Number', isNumber: true },
        { heading: '± 1 s.e.', isNumber: true },
        { heading: '95 % interval', isNumber: true },
        { heading: 'Minus stated', isNumber: true },
      ],
      estimates.map((estimate) => estimateRow(estimate, comparison.stated.value, decimals)),
      'halves',
    ),
    estimates.map(({ label, random }) =>
      random
        ? html`<p class="quiet">
            Random numbers of ${label}: ${random.generator}, seed ${random.seed}, ${random.nDraws} draws.
          </p>`
        : null,
    ),
    notComputed.map(({ labels, reason }) => html`<p class="quiet">No number by ${labels.join(' and ')}: ${reason}</p>`),
  ];
}

function estimateRow(estimate: EstimatorEstimate, stated: number, decimals: number): HtmlValue[] {
  const { label, value, standardError, interval95, convention, parameters, isOwn, caveats } = estimate;
  const found = parameters.map(({ symbol, value: figure }) => `; ${symbol} = ${formatNumber(figure)}`).join('');
  return [
    html`${label}${isOwn ? ': the procedure’s own' : null}<br /><span class="quiet">${convention}${found}</span
      >${caveatsPart(caveats)}`,
    formatNumber(value, { decimals }),
    standardError === null ? 'none of its own' : formatNumber(standardError, { decimals }),
    interval95 ? formatInterval(interval95, '', decimals) : 'none',
    formatNumber(value - stated, { decimals, withSign: true }),
  ];
}
