import type { ReportClaim } from '../../contract/project.ts';
import type { Recomputation, WorkingTable } from '../../contract/result.ts';
import {
  formatInterval,
  formatNumber,
  formatQuantity,
  formatWithUncertainty,
  formatYears,
} from '../../quantities/notation.ts';
import { quantityNames } from '../../quantities/quantity-names.ts';
import { facts, html, nothing, table, type Html, type HtmlValue } from '../html.ts';
import { caveatsPart } from './caveats-part.ts';
import { figurePart, figuresOf } from './figure-part.ts';
import { procedureWords } from './procedure-words.ts';

type Fit = NonNullable<Recomputation['fit']>;

/** The stated procedure run on the data: the number, how it compares with the stated one, and how good the fit is. */
export function recomputationPart(claim: ReportClaim): Html {
  const { recomputation } = claim;
  const procedure = html`<p>${procedureWords(claim.claim, claim.series)}</p>`;
  if (!recomputation) {
    return html`<h2>Recomputation</h2>
      ${procedure}${nothing('The number has not been recomputed, or what was computed is out of date.')}`;
  }
  const { agreement, fit, unit, working } = recomputation;
  return html`<h2>Recomputation</h2>
    ${procedure}
    <p class="lead">${agreement.sentence}</p>
    ${facts([
      [
        'Recomputed',
        `${formatWithUncertainty(recomputation.value, recomputation.standardError, unit)} (${quantityNames[recomputation.quantity].label}${recomputation.standardError === null ? '' : '; ± one standard error'})`,
      ],
      [
        recomputation.interval ? `${recomputation.interval.levelPercent} % interval` : 'Interval',
        recomputation.interval
          ? formatInterval(recomputation.interval, unit)
          : 'none: the procedure gives no uncertainty',
      ],
      ['Minus stated', formatQuantity(agreement.difference, unit, { withSign: true, significantDigits: 2 })],
      ['Within rounding', agreement.isReproduced ? 'yes' : 'no'],
      ['Conversion', recomputation.conversion ?? 'none'],
      ['Full precision', html`<code>${String(recomputation.value)}</code>`],
    ])}
    ${fit ? fitPart(fit, claim.claim.procedure?.kind === 'trend' ? 'K per year' : 'K per e-folding') : working.map(workingPart)}
    ${caveatsPart([...recomputation.caveats, ...(fit?.regression.caveats ?? [])])}
    ${figuresOf(claim, 'recomputation').map((figure) => figurePart(figure))}`;
}

function workingPart({ caption, columns, rows }: WorkingTable): Html {
  const isNumber = (column: number) => rows.every((row) => typeof row[column] === 'number' || row[column] === null);
  return table(
    caption,
    columns.map((heading, column) => ({ heading, isNumber: isNumber(column) })),
    rows.map((row) =>
      row.map((cell) => (typeof cell === 'number' ? formatNumber(cell, { significantDigits: 4 }) : (cell ?? ''))),
    ),
  );
}

function fitPart(fit: Fit, slopeUnit: string): HtmlValue {
  const { diagnostics: d, anchorValues } = fit;
  const optional = (value: number | null, significantDigits = 3) =>
    value === null ? 'does not exist for this fit' : formatNumber(value, { significantDigits });
  return [
    facts([
      ['Years', `${formatYears(fit.window)}, ${d.nObs} used`],
      ['Left out', leftOutText(fit)],
      [
        'Anchor',
        anchorValues
          ? `C₀ ${formatQuantity(anchorValues.co2Ppm, 'ppm', { significantDigits: 5 })}, T₀ ${formatQuantity(anchorValues.temperatureK, 'K', { significantDigits: 2 })}, ${formatYears(anchorValues.years)}`
          : 'none',
      ],
      [
        'Intercept',
        fit.intercept
          ? formatWithUncertainty(fit.intercept.value, fit.intercept.standardError, 'K')
          : 'none: the line is forced through zero',
      ],
    ]),
    table(
      `Slope, ${slopeUnit}, under each convention for its error; the procedure’s own first`,
      [
        { heading: 'Convention' },
        { heading: 'Slope', isNumber: true },
        { heading: 'Standard error', isNumber: true },
        { heading: '95 % interval', isNumber: true },
      ],
      fit.slopes.map(({ convention, value, standardError, interval95 }) => [
        convention,
        formatNumber(value, { significantDigits: 4 }),
        formatNumber(standardError, { significantDigits: 2 }),
        formatInterval(interval95),
      ]),
    ),
    table(
      'Goodness of fit and independence of the residuals',
      [{ heading: 'Measure' }, { heading: 'Value', isNumber: true }, { heading: 'What it is' }],
      [
        ['R², centred', optional(d.rSquaredCentred), 'share of the variance about the mean'],
        [
          'R², uncentred',
          optional(d.rSquaredUncentred),
          'share of the sum of squares about zero; larger, and what many programs print for a line through zero',
        ],
        ['Correlation r', optional(d.correlation), 'of the two variables'],
        ['Durbin–Watson', optional(d.durbinWatson), 'near 2 when neighbouring residuals are unrelated'],
        ['Lag-1 autocorrelation', optional(d.lag1Autocorrelation), 'of the residuals'],
        [
          'Effective sample size',
          optional(d.effectiveSampleSize),
          `n (1 − r₁)/(1 + r₁), of n = ${d.nObs} (Santer et al. 2000)`,
        ],
        ['Residual standard deviation', formatNumber(d.residualStandardDeviation), 'in the unit of the vertical axis'],
      ],
    ),
    html`<p class="quiet">
      The rows used, year by year, with residuals, leverages and Cook’s distances, are in the data form of this report
      (report.json).
    </p>`,
  ];
}

function leftOutText({ leftOut }: Fit): string {
  if (leftOut.length === 0) return 'no year of the window';
  return leftOut.map(({ year, reason }) => `${year}: ${reason}`).join('; ');
}
