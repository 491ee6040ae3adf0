/** A field in time on latitudes and longitudes: how to find a value, and the latitudes in degrees. */
export interface Grid {
  nTimes: number;
  latitudesDeg: readonly number[];
  nLongitudes: number;
  /** The value at a time, latitude and longitude, each counted from 0; null where there is none. */
  at: (time: number, latitude: number, longitude: number) => number | null;
}

/**
 * Area mean of each field: weights are cos(latitude), as for cells of equal width in longitude and latitude; cells
 * without a value do not count.
 *
 * @returns  means [nTimes], null where no cell has a value; the smallest share of the area that had values
 */
export function areaMean({ nTimes, latitudesDeg, nLongitudes, at }: Grid): {
  means: (number | null)[];
  leastShare: number;
} {
  const weights = latitudesDeg.map((latitude) => Math.max(0, Math.cos((latitude * Math.PI) / 180)));
  const whole = weights.reduce((sum, weight) => sum + weight, 0) * nLongitudes;
  let leastShare = 1;
  const means = Array.from({ length: nTimes }, (_, time) => {
    let [sum, area] = [0, 0];
    weights.forEach((weight, latitude) => {
      for (let longitude = 0; longitude < nLongitudes; longitude += 1) {
        const value = at(time, latitude, longitude);
        if (value === null) continue;
        sum += weight * value;
        area += weight;
      }
    });
    leastShare = Math.min(leastShare, area / whole);
    return area > 0 ? sum / area : null;
  });
  return { means, leastShare };
}
