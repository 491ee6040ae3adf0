import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import type { Caveat } from '../../contract/primitives.ts';
import type { SeriesData } from '../../contract/series.ts';
import { checkUnit } from '../../quantities/check-unit.ts';
import { formatNumber } from '../../quantities/notation.ts';
import { york } from '../../statistics/york.ts';
import { seriesOf } from '../procedures/series-of.ts';
import { annualStandardDeviations } from './annual-standard-deviations.ts';
import { freeInterceptCaveats, tInterval, tWords, type ComparedLine, type Estimator } from './estimator.ts';

interface RowErrors {
  sx: number | number[];
  sy: number[];
  words: string;
}

/** Standard deviations of the rows' x and y, from the limits of the series behind them. */
function rowErrors({ computation, procedure, fit: { years, aligned } }: ComparedLine): RowErrors {
  const temperature =
    procedure.kind === 'trend'
      ? seriesOf(computation, 'seriesId', 'the series whose trend is taken')
      : seriesOf(computation, 'temperatureSeriesId', 'the temperature series');
  const kPerUnit = checkUnit(temperature, 'K');
  const sy = annualStandardDeviations(temperature, years).map((sd) => sd * kPerUnit);
  const from = `errors of y from the limits of ${temperature.name} (${levelWords(temperature)})`;
  if (procedure.kind === 'trend') return { sx: 0, sy, words: `${from}, years exact` };

  const co2 = seriesOf(computation, 'co2SeriesId', 'the CO2 series');
  if (!co2.values.lower || co2.step !== 'year') return { sx: 0, sy, words: `${from}, CO2 taken as exact` };
  const ppmPerUnit = checkUnit(co2, 'ppm');
  const sx = annualStandardDeviations(co2, years).map((sd, row) => (sd * ppmPerUnit) / (aligned?.co2Ppm[row] ?? NaN));
  return { sx, sy, words: `${from}, of x from those of ${co2.name} (${levelWords(co2)}) as sd(C)/C` };
}

function levelWords({ values: { boundsLevelPercent } }: SeriesData): string {
  return `${formatNumber(boundsLevelPercent, { decimals: 0 })} %, normal`;
}

function yorkLine(line: ComparedLine) {
  const { sx, sy, words } = rowErrors(line);
  const { x, y } = line.fit;
  const caveats: Caveat[] = [
    ...freeInterceptCaveats(line),
    {
      code: 'errors-shared',
      detail:
        'The errors of different years are taken as independent. Published limits are largely shared between neighbouring years, so that this error is too small.',
    },
  ];
  return { fit: york({ x, y, sx, sy }), words: `York et al. 2004; ${words}`, caveats };
}

/** The line that allows for stated errors in both variables, under both published conventions for its error. */
export const yorkEstimators: readonly Estimator[] = [
  {
    id: 'york',
    label: 'York, limits alone',
    order: 'not used',
    estimate(line) {
      const { fit, words, caveats } = yorkLine(line);
      const { slope, slopeStandardError: standardError, goodness } = fit;
      const halfWidth = normalQuantile(0.975, 0, 1) * standardError;
      if (goodness > 2) {
        caveats.push({
          code: 'scatter-beyond-limits',
          detail: `The years scatter about the line by √${formatNumber(goodness)} = ${formatNumber(Math.sqrt(goodness))} times what the limits allow for: the weather of single years is not in the limits. The scaled error counts it.`,
        });
      }
      return {
        slope,
        standardError,
        interval95: { low: slope - halfWidth, high: slope + halfWidth },
        convention: `${words}; the error at the adjusted points, from the stated errors alone; normal`,
        parameters: [{ symbol: 'χ²/(n − 2)', value: goodness }],
        caveats,
      };
    },
  },
  {
    id: 'york-scaled',
    label: 'York, scaled to the scatter',
    order: 'not used',
    estimate(line) {
      const { fit, words, caveats } = yorkLine(line);
      const { slope, scaledSlopeStandardError: standardError, goodness } = fit;
      const degreesOfFreedom = line.fit.y.length - 2;
      return {
        slope,
        standardError,
        interval95: tInterval(slope, standardError, degreesOfFreedom),
        convention: `${words}; the error times √(χ²/(n − 2)), as for errors known up to a common factor; ${tWords(degreesOfFreedom)}`,
        parameters: [{ symbol: 'χ²/(n − 2)', value: goodness }],
        caveats: caveats.filter(({ code }) => code !== 'errors-shared'),
      };
    },
  },
];
