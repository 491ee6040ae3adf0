import { readFileSync } from 'node:fs';

const data = (name: string) =>
  readFileSync(new URL(`../../node_modules/vega-datasets/data/${name}`, import.meta.url), 'utf8')
    .trim()
    .split(/\r?\n/)
    .slice(1)
    .map((line) => line.split(','));

/**
 * The real record that the tests use: Mauna Loa CO2, calendar-year means of the twelve monthly values, joined with the
 * annual global temperature anomaly, from the open data of the npm package vega-datasets (co2-concentration.csv,
 * column CO2; global-temp.csv).
 */
export function co2AndTemperature(): { years: number[]; co2Ppm: number[]; temperatureK: number[] } {
  const months = Map.groupBy(data('co2-concentration.csv'), ([date = '']) => Number(date.slice(0, 4)));
  const temperature = new Map(data('global-temp.csv').map(([year, value]) => [Number(year), Number(value)]));
  const rows = [...months]
    .filter(([year, values]) => values.length === 12 && temperature.has(year))
    .map(([year, values]) => ({
      year,
      co2Ppm: values.reduce((total, [, co2]) => total + Number(co2), 0) / 12,
      temperatureK: temperature.get(year) ?? NaN,
    }));
  return {
    years: rows.map(({ year }) => year),
    co2Ppm: rows.map(({ co2Ppm }) => co2Ppm),
    temperatureK: rows.map(({ temperatureK }) => temperatureK),
  };
}
