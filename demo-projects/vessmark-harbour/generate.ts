/**
 * Makes the invented series of this worked example: a two-layer energy-balance model (Geoffroy et al. 2013, Journal of
 * Climate 26, 1841) of known sensitivity, driven by invented concentrations and forcings, with AR(1) noise.
 *
 *   node demo-projects/vessmark-harbour/generate.ts
 *
 * Nothing here is a measurement. The same seed gives the same files.
 */
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { randomStream } from '../../src-main/statistics/random-stream.ts';

const seed = 19;
const firstYear = 1850;
const lastYear = 2019;
const recordStart = 1950;

const doublingWm2 = 3.9;
const ecsK = 3;
const feedbackWm2PerK = doublingWm2 / ecsK;
const heatCapacityWYrPerM2K = 8;
const deepHeatCapacityWYrPerM2K = 105;
const exchangeWm2PerK = 0.7;
const ar1 = 0.55;
const noiseSdK = 0.085;

const years = Array.from({ length: lastYear - firstYear + 1 }, (_, place) => firstYear + place);
const { normal } = randomStream(seed, 0);

const co2Ppm = years.map((year) => {
  const early = 284 * Math.exp(0.0009 * (year - firstYear));
  const late = Math.max(0, year - 1945);
  return early * Math.exp(0.000038 * late * late + 0.00009 * late) + 0.12 * normal();
});
const co2Wm2 = co2Ppm.map((ppm) => (doublingWm2 / Math.LN2) * Math.log(ppm / 284));
const otherGasesWm2 = years.map((year) => 0.0022 * (year - firstYear) + 0.011 * Math.max(0, year - 1955));
const aerosolWm2 = years.map((year) => -0.0016 * (year - firstYear) - 0.62 / (1 + Math.exp(-(year - 1964) / 9)));
const totalWm2 = years.map((_, place) => (co2Wm2[place] ?? 0) + (otherGasesWm2[place] ?? 0) + (aerosolWm2[place] ?? 0));

const { surfaceK, imbalanceWm2 } = respond(totalWm2);
let noiseK = 0;
const anomalyK = surfaceK.map((warming, place) => {
  noiseK = ar1 * noiseK + noiseSdK * Math.sqrt(1 - ar1 * ar1) * normal();
  // An unusually warm first year of the record: what a line through one single year hangs on.
  const isFirst = years[place] === recordStart;
  return warming + noiseK + (isFirst ? 0.05 : 0);
});
const baseline = mean(inSpan(1961, 1990, anomalyK));

write('vessmark-co2.csv', ['# Invented data: no measurement.', 'year,co2_ppm', ...rows((place) => (co2Ppm[place] ?? 0).toFixed(2))]);
write('vessmark-temperature.csv', [
  '# Invented data: no measurement. Anomalies in K relative to 1961-1990.',
  'year,temperature_anomaly_K',
  ...rows((place) => ((anomalyK[place] ?? 0) - baseline).toFixed(3)),
]);
write('vessmark-forcing.csv', [
  '# Invented data: no measurement. Effective radiative forcing in W/m2 relative to 1850.',
  'year,co2,other_gases,aerosol,total',
  ...rows((place) => [co2Wm2, otherGasesWm2, aerosolWm2, totalWm2].map((series) => (series[place] ?? 0).toFixed(4)).join(',')),
]);

const change = (series: number[]) => mean(inSpan(2010, 2019, series)) - mean(inSpan(1850, 1879, series));
console.log('1850–1879 to 2010–2019:', {
  warmingK: change(surfaceK),
  forcingWm2: change(totalWm2),
  uptakeWm2: change(imbalanceWm2),
  feedbackWm2PerK,
});

/** Annual forcing held within each year; hundred steps a year are exact to far below the noise. */
function respond(forcing: number[]): { surfaceK: number[]; imbalanceWm2: number[] } {
  const steps = 100;
  let surface = 0;
  let deep = 0;
  const surfaceK: number[] = [];
  const imbalanceWm2: number[] = [];
  for (const wm2 of forcing) {
    let sumK = 0;
    for (let step = 0; step < steps; step += 1) {
      const flow = exchangeWm2PerK * (surface - deep);
      surface += (wm2 - feedbackWm2PerK * surface - flow) / (heatCapacityWYrPerM2K * steps);
      deep += flow / (deepHeatCapacityWYrPerM2K * steps);
      sumK += surface;
    }
    surfaceK.push(sumK / steps);
    imbalanceWm2.push(wm2 - (feedbackWm2PerK * sumK) / steps);
  }
  return { surfaceK, imbalanceWm2 };
}

function inSpan(start: number, end: number, series: number[]): number[] {
  return series.filter((_, place) => (years[place] ?? 0) >= start && (years[place] ?? 0) <= end);
}

function mean(series: number[]): number {
  return series.reduce((sum, value) => sum + value, 0) / series.length;
}

function rows(cells: (place: number) => string): string[] {
  return years.flatMap((year, place) => (year < recordStart ? [] : [`${year},${cells(place)}`]));
}

function write(name: string, lines: string[]): void {
  writeFileSync(join(import.meta.dirname, 'data', name), `${lines.join('\n')}\n`);
}
