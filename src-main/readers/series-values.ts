import type { SeriesValues } from '../contract/series.ts';
import type { Row } from './row.ts';

/** The provider's limits around a value, and their level. */
export interface Limits {
  levelPercent: number;
  of: (row: Row, value: number) => { lower: number | null; upper: number | null };
}

/** Share of a normal distribution within one standard deviation of its mean. */
const oneSigmaPercent = 68.27;

/** Limits one standard uncertainty to either side; `place` counts the value columns of the rows. */
export function standardLimits(place: number): Limits {
  return symmetricLimits(place, oneSigmaPercent, (uncertainty) => uncertainty);
}

/** Limits one standard deviation to either side, from a column of variances. */
export function varianceLimits(place: number): Limits {
  return symmetricLimits(place, oneSigmaPercent, Math.sqrt);
}

export function symmetricLimits(place: number, levelPercent: number, halfWidthOf: (stated: number) => number): Limits {
  return {
    levelPercent,
    of(row, value) {
      const stated = row.values[place] ?? null;
      if (stated === null) return { lower: null, upper: null };
      const halfWidth = halfWidthOf(stated);
      return { lower: value - halfWidth, upper: value + halfWidth };
    },
  };
}

export function statedLimits(lowerPlace: number, upperPlace: number, levelPercent: number): Limits {
  return {
    levelPercent,
    of: (row) => ({ lower: row.values[lowerPlace] ?? null, upper: row.values[upperPlace] ?? null }),
  };
}

/** One value column of rows as a series. */
export function seriesValues(rows: readonly Row[], place: number, limits: Limits | null = null): SeriesValues {
  const values = rows.map((row) => row.values[place] ?? null);
  const isMonthly = rows[0]?.month !== null;
  const bounds = rows.map((row, index) => {
    const value = values[index] ?? null;
    return limits === null || value === null ? { lower: null, upper: null } : limits.of(row, value);
  });
  const hasBounds = bounds.some(({ lower, upper }) => lower !== null || upper !== null);
  return {
    years: rows.map((row) => row.year),
    months: isMonthly ? rows.map((row) => row.month ?? 1) : null,
    values,
    lower: hasBounds ? bounds.map(({ lower }) => lower) : null,
    upper: hasBounds ? bounds.map(({ upper }) => upper) : null,
    boundsLevelPercent: hasBounds && limits ? limits.levelPercent : null,
  };
}

/** Rows of a year with a column for each month as a monthly series; `places` are the value columns from January on. */
export function monthsAcross(rows: readonly Row[], places: readonly number[]): SeriesValues {
  return {
    years: rows.flatMap((row) => places.map(() => row.year)),
    months: rows.flatMap(() => places.map((_, index) => index + 1)),
    values: rows.flatMap((row) => places.map((place) => row.values[place] ?? null)),
    lower: null,
    upper: null,
    boundsLevelPercent: null,
  };
}
