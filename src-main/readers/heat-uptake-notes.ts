import type { SeriesValues } from '../contract/series.ts';

/** A year of 365.2425 days. */
const secondsPerYear = 31_556_952;
const earthSurfaceM2 = 5.101e14;
/**
 * Heat taken up by the ocean since the 1950s stays within this, over the Earth's surface: AR6 WG1 7.2.2 has an energy
 * imbalance of 0.79 [0.52 to 1.06] W/m² for 2006–2018, of which the ocean takes 91 %; a layer takes a part of it.
 */
const plausibleWm2 = { low: 0.1, high: 2.5 };
/** Standard errors and shares have no such trend. */
const noTrendWm2 = 0.005;
const minYears = 8;

/**
 * What an increase in heat content amounts to over the Earth's surface, and whether that speaks for another power of
 * ten: the one check that a table of heat without a trustworthy unit allows.
 */
export function heatUptakeNotes(
  column: string,
  { years, months, values }: SeriesValues,
  joulesPerUnit: number,
): string[] {
  const points = values.flatMap((value, place) => {
    const time = (years[place] ?? 0) + ((months?.[place] ?? 6.5) - 0.5) / 12;
    return value === null ? [] : [{ time, heat: value }];
  });
  const [first, last] = [points[0], points.at(-1)];
  if (first === undefined || last === undefined || last.time - first.time < minYears) return [];
  const unitsPerYear = slopeOf(points);
  const uptakeWm2 = (unitsPerYear * joulesPerUnit) / secondsPerYear / earthSurfaceM2;
  if (Math.abs(uptakeWm2) < noTrendWm2) return [];
  const stated = `The trend of ${column} is a heat uptake of ${Number(uptakeWm2.toPrecision(2))} W/m² over the Earth’s surface`;
  if (uptakeWm2 > plausibleWm2.high || (uptakeWm2 > 0 && uptakeWm2 < plausibleWm2.low)) {
    return [
      `${stated}, which is ${uptakeWm2 > plausibleWm2.high ? 'far more' : 'far less'} than any estimate for the whole ocean: the power of ten of the unit may be wrong (10²² J is 10 ZJ, not 1).`,
    ];
  }
  return [`${stated}, as it would be in this unit.`];
}

/** Slope of a straight line through points, by least squares, in their own units a year. */
function slopeOf(points: readonly { time: number; heat: number }[]): number {
  const meanTime = points.reduce((sum, { time }) => sum + time, 0) / points.length;
  const meanHeat = points.reduce((sum, { heat }) => sum + heat, 0) / points.length;
  const products = points.reduce((sum, { time, heat }) => sum + (time - meanTime) * (heat - meanHeat), 0);
  return products / points.reduce((sum, { time }) => sum + (time - meanTime) ** 2, 0);
}
