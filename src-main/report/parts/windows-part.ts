import type { ReportClaim } from '../../contract/project.ts';
import { formatNumber, formatQuantity, formatShare, formatYears } from '../../quantities/notation.ts';
import { html, nothing, table, type Html, type HtmlValue } from '../html.ts';
import { caveatsPart } from './caveats-part.ts';
import { figurePart, figuresOf } from './figure-part.ts';

/** The same procedure over every start and end year. */
export function windowsPart(claim: ReportClaim): Html {
  const figures = figuresOf(claim, 'windows').map((figure) => figurePart(figure));
  return html`<h2>Other windows</h2>
    ${content(claim.sweep)}${figures}`;
}

function content(sweep: ReportClaim['sweep']): HtmlValue {
  if (!sweep) return nothing('The procedure has not been run over other windows, or what was computed is out of date.');
  const { stated, valueQuantiles: q, windows, minYears, unit, shareAtOrBelowStated } = sweep;
  return [
    html`<p>
      The procedure run on all ${windows.length} windows of at least ${minYears} years. The window as stated,
      ${formatYears(stated.window)}, gives ${formatQuantity(stated.value, unit)}; its number stands at the
      ${formatShare(stated.percentile / 100)} point of all windows. In ${formatShare(shareAtOrBelowStated)} of them the
      number is at or below the stated one.
    </p>`,
    table(
      `Quantiles of the number over all windows, ${unit}. Windows overlap: this is a spread, not a confidence interval.`,
      [
        { heading: 'Least', isNumber: true },
        { heading: '5 %', isNumber: true },
        { heading: 'Median', isNumber: true },
        { heading: '95 %', isNumber: true },
        { heading: 'Greatest', isNumber: true },
      ],
      [[q.min, q.q05, q.q50, q.q95, q.max].map((value) => formatNumber(value))],
      'quantiles',
    ),
    caveatsPart(sweep.caveats),
  ];
}
