import type { Claim } from '../contract/claim.ts';
import type { XyFigure } from '../contract/figure.ts';
import type { Recomputation } from '../contract/result.ts';
import { formatNumber } from '../quantities/notation.ts';
import { autocorrelations } from '../statistics/autocorrelations.ts';
import { normalQuantilePlot } from '../statistics/normal-quantile-plot.ts';

type Fit = NonNullable<Recomputation['fit']>;

export interface ResidualFigures {
  lag: XyFigure | null;
  autocorrelation: XyFigure | null;
  quantiles: XyFigure | null;
}

/** What the residuals of a line look like beside their own past and beside a normal sample; null for an exact fit. */
export function residualFigures(claim: Claim, recomputation: Recomputation | null, digests: string[]): ResidualFigures {
  const fit = recomputation?.fit;
  // An exact fit leaves rounding only, and residuals that are all alike have no likeness to show.
  if (!fit || fit.regression.durbinWatson === null || fit.diagnostics.lag1Autocorrelation === null) {
    return { lag: null, autocorrelation: null, quantiles: null };
  }
  const named = (name: string) => ({ name: `claim-${claim.id}-residual-${name}`, digests, isXYears: false });
  return {
    lag: { kind: 'xy', ...named('lag'), ...lagPlot(fit) },
    autocorrelation: { kind: 'xy', ...named('autocorrelation'), ...autocorrelationPlot(fit) },
    quantiles: { kind: 'xy', ...named('quantiles'), ...quantilePlot(fit) },
  };
}

type Drawn = Pick<XyFigure, 'title' | 'caption' | 'xLabel' | 'yLabel' | 'marks'>;

function lagPlot({ years, regression: { residuals } }: Fit): Drawn {
  const [r1 = 0] = autocorrelations(residuals, years, 1);
  const rowOf = new Map(years.map((year, row) => [year, row]));
  const pairs = years.flatMap((year, row) => {
    const before = rowOf.get(year - 1);
    return before === undefined ? [] : [{ before: residuals[before] ?? 0, now: residuals[row] ?? 0 }];
  });
  const x = pairs.map(({ before }) => before);
  const ends = [Math.min(...x), Math.max(...x)];
  const nLost = years.length - 1 - pairs.length;
  return {
    title: 'Residuals beside those of the year before',
    caption: `A cloud without direction means that neighbouring years are independent; r₁ = ${formatNumber(r1, { decimals: 2 })}.${nLost > 0 ? ` Years with a gap before them have no partner and are not drawn.` : ''}`,
    xLabel: 'Residual of the year before (K)',
    yLabel: 'Residual (K)',
    marks: [
      { label: 'years', mark: 'points', x, y: pairs.map(({ now }) => now), y2: null, role: 'data' },
      { label: 'slope r₁', mark: 'line', x: ends, y: ends.map((end) => r1 * end), y2: null, role: 'reference' },
    ],
  };
}

function autocorrelationPlot({ years, leftOut, window, regression: { residuals } }: Fit): Drawn {
  const n = years.length;
  const maxLag = Math.min(n - 1, Math.floor(10 * Math.log10(n)));
  const lags = Array.from({ length: maxLag }, (_, k) => k + 1);
  const bound = 1.96 / Math.sqrt(n);
  const hasGap = leftOut.some(({ year }) => year > window.start && year < window.end);
  return {
    title: 'Autocorrelation of the residuals',
    caption: `Likeness of residuals some years apart. Of unrelated residuals 95 % lie within ±1.96/√n = ±${formatNumber(bound, { decimals: 2 })}, one lag at a time.${hasGap ? ' Years apart are those of the calendar; pairs with a missing year are left out.' : ''}`,
    xLabel: 'Years apart',
    yLabel: 'Autocorrelation',
    marks: [
      {
        label: '±1.96/√n',
        mark: 'band',
        x: lags,
        y: lags.map(() => -bound),
        y2: lags.map(() => bound),
        role: 'data',
      },
      {
        label: 'residuals',
        mark: 'points',
        x: lags,
        y: autocorrelations(residuals, years, maxLag),
        y2: null,
        role: 'data',
      },
    ],
  };
}

function quantilePlot({ regression: { residuals } }: Fit): Drawn {
  const { normal, values, line } = normalQuantilePlot(residuals);
  const ends = [normal[0] ?? 0, normal.at(-1) ?? 0];
  return {
    title: 'Residuals beside a normal sample',
    caption:
      'Residuals by size against standard normal quantiles. Points along the line mean errors close to normal; ends that leave it mean more, or fewer, large ones. The line goes through the quartiles.',
    xLabel: 'Standard normal quantile',
    yLabel: 'Residual (K)',
    marks: [
      { label: 'years', mark: 'points', x: normal, y: values, y2: null, role: 'data' },
      {
        label: 'quartile line',
        mark: 'line',
        x: ends,
        y: ends.map((end) => line.intercept + line.slope * end),
        y2: null,
        role: 'reference',
      },
    ],
  };
}
