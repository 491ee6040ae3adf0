import type { Claim } from '../contract/claim.ts';
import type { XyFigure } from '../contract/figure.ts';
import type { ClaimSweep, Recomputation } from '../contract/result.ts';
import { straightLine } from '../statistics/straight-line.ts';

type Mark = XyFigure['marks'][number];

/** The points of the fit, the line as stated, and the line with a free intercept beside it. */
export function fitFigure(claim: Claim, { fit }: Recomputation, digests: string[]): XyFigure | null {
  if (!fit) return null;
  const { x, y, xLabel, yLabel, regression: stated } = fit;
  const low = Math.min(0, ...x);
  const high = Math.max(0, ...x);
  const line = (label: string, intercept: number, slope: number, role: Mark['role']): Mark => ({
    label,
    mark: 'line',
    x: [low, high],
    y: [intercept + slope * low, intercept + slope * high],
    y2: null,
    role,
  });
  const [first = 0, second = 0] = stated.coefficients;
  const hasIntercept = fit.intercept !== null;
  const marks: Mark[] = [
    { label: 'years', mark: 'points', x, y, y2: null, role: 'data' },
    line(
      hasIntercept ? 'line as stated' : 'line as stated, through zero',
      hasIntercept ? first : 0,
      hasIntercept ? second : first,
      'stated',
    ),
  ];
  const free = hasIntercept ? null : straightLine(x, y);
  if (free) marks.push(line('line with free intercept', free.intercept, free.slope, 'alternative'));
  return {
    kind: 'xy',
    name: `claim-${claim.id}-fit`,
    title: 'The fit',
    caption: `${yLabel} against ${xLabel}, ${fit.window.start}–${fit.window.end}, ${fit.diagnostics.nObs} years.`,
    digests,
    xLabel,
    yLabel,
    isXYears: xLabel === 'Year',
    marks,
  };
}

/** What the fit leaves over, year by year. */
export function residualsFigure(claim: Claim, { fit }: Recomputation, digests: string[]): XyFigure | null {
  if (!fit) return null;
  const { years, regression: stated } = fit;
  return {
    kind: 'xy',
    name: `claim-${claim.id}-residuals`,
    title: 'Residuals in time',
    caption:
      'What the stated line leaves over. Runs on one side of zero mean that neighbouring years are not independent.',
    digests,
    xLabel: 'Year',
    yLabel: 'Residual (K)',
    isXYears: true,
    marks: [
      {
        label: 'zero',
        mark: 'line',
        x: [Math.min(...years), Math.max(...years)],
        y: [0, 0],
        y2: null,
        role: 'reference',
      },
      { label: 'residual', mark: 'points', x: years, y: stated.residuals, y2: null, role: 'data' },
    ],
  };
}

/** The number with the start of the window varied and its end kept, and the other way round. */
export function sweepFigure(claim: Claim, sweep: ClaimSweep, digests: string[]): XyFigure {
  const { stated, factor, windows, unit, minYears } = sweep;
  const varied = (
    label: string,
    keep: (window: ClaimSweep['windows'][number]) => boolean,
    at: 'start' | 'end',
    role: Mark['role'],
  ): Mark[] => {
    const kept = windows.filter(keep);
    const x = kept.map((window) => window[at]);
    const value = (shift: number) => kept.map(({ slope, standardError }) => (slope + shift * standardError) * factor);
    return [
      { label: `${label}, 95 %`, mark: 'band', x, y: value(-1.96), y2: value(1.96), role },
      { label, mark: 'line', x, y: value(0), y2: null, role },
    ];
  };
  const years = windows.flatMap(({ start, end }) => [start, end]);
  return {
    kind: 'xy',
    name: `claim-${claim.id}-windows`,
    title: 'Other windows',
    caption: `The number over every window of at least ${minYears} years that keeps one end of the stated one (${stated.window.start}–${stated.window.end}). Bands are ±1.96 standard errors.`,
    digests,
    xLabel: 'First year, or last year, of the window',
    yLabel: unit,
    isXYears: true,
    marks: [
      ...varied(
        `from any year to ${stated.window.end}`,
        ({ end }) => end === stated.window.end,
        'start',
        'alternative',
      ),
      ...varied(`from ${stated.window.start} to any year`, ({ start }) => start === stated.window.start, 'end', 'data'),
      {
        label: 'recomputed as stated',
        mark: 'line',
        x: [Math.min(...years), Math.max(...years)],
        y: [stated.value, stated.value],
        y2: null,
        role: 'stated',
      },
    ],
  };
}
