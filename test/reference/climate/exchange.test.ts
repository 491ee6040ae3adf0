import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { exchange } from '../../../src-main/climate/carbon/exchange.ts';
import { exchangeCoefficient } from '../../../src-main/climate/carbon/exchange-coefficient.ts';
import { exchangeRange } from '../../../src-main/climate/carbon/exchange-range.ts';
import { riseFromWarming } from '../../../src-main/climate/carbon/rise-from-warming.ts';
import { warmingForRise } from '../../../src-main/climate/carbon/warming-for-rise.ts';
import { exchangeSource } from '../../../src-main/contract/carbon.ts';
import { recordedCo2Changes } from '../../../src-main/quantities/recorded-co2-changes.ts';
import { expectClose } from '../../helpers/close.ts';

const near = { rel: 1e-12, abs: 0, why: 'closed form, by another order of operations' };

const [header = '', ...lines] = readFileSync(new URL('./exchange-coefficients.csv', import.meta.url), 'utf8')
  .trim()
  .split('\n')
  .filter((line) => !line.startsWith('#'));
const names = header.split(',');
const cases = lines.map((line) => Object.fromEntries(line.split(',').map((cell, i) => [names[i] ?? '', cell])));

/** To half a unit of the last digit that the table gives. */
function expectPrinted(found: number | undefined, cell = ''): void {
  const digits = cell.split('.')[1]?.length ?? 0;
  expectClose(found, Number(cell), { rel: 0, abs: 0.5000001 * 10 ** -digits, why: 'half a unit of the last digit' });
}

const recordLabels: Readonly<Record<string, string>> = {
  '190 to 280 ppm over 6.1 K': 'Glacial to interglacial, 190 to 280 ppm, 6.1 K global',
  '180 to 280 ppm over 5 K': 'Glacial to interglacial, 180 to 280 ppm, 5 K global',
  '180 to 280 ppm over 9 K in Antarctica': 'Glacial to interglacial, 180 to 280 ppm, 9 K in Antarctica',
};

describe('exchange', () => {
  // Level B: computed independently of this project; the marks of the inputs are in the file.
  it.each(cases)('computed elsewhere: $case at $temperatureC °C', (row) => {
    const temperatureC = Number(row['temperatureC']);
    const source = exchangeSource.safeParse(row['kind']).data;
    const recorded = recordedCo2Changes.find(({ label }) => label === recordLabels[row['case'] ?? '']);
    const answers = [280, 420].map((co2Ppm) =>
      source
        ? exchange({ source, temperatureC, salinity: 35, co2Ppm })
        : exchangeRange(temperatureC, 35, co2Ppm).rows.find(({ label }) => label === recorded?.label),
    );
    const [at280, at420] = answers;
    const coefficient = exchangeCoefficient(at280?.dLnPco2PerK ?? NaN, temperatureC);
    for (const name of ['dLnPco2PerK', 'vantHoffK', 'exchangeCoefficientK', 'doublingK'] as const) {
      expectPrinted(coefficient[name], row[name]);
    }
    expectPrinted(at280?.exchangeCoefficientK, row['exchangeCoefficientK']);
    expectPrinted(at280?.ppmPerK, row['ppmPerKAt280']);
    expectPrinted(at420?.ppmPerK, row['ppmPerKAt420']);
  });

  it('computed elsewhere: 9.91 K for 278 to 422.8 ppm; 1 K gives 12.1 ppm at 280 and 18.1 at 420', () => {
    const base = { source: 'takahashi1993', temperatureC: 15 } as const;
    expectPrinted(exchange({ ...base, co2Ppm: 278, toPpm: 422.8 }).warmingNeededK, '9.91');
    expectPrinted(exchange({ ...base, co2Ppm: 280, warmingK: 1 }).rise?.risePpm, '12.1');
    expectPrinted(exchange({ ...base, co2Ppm: 420, warmingK: 1 }).rise?.risePpm, '18.1');
  });

  it('the range runs over all sources and records, each once', () => {
    const { lowK, highK, rows } = exchange({ source: 'weiss1974', temperatureC: 25, salinity: 35 }).range;
    expect(rows).toHaveLength(exchangeSource.options.length + recordedCo2Changes.length);
    expect(new Set(rows.map(({ label }) => label)).size).toBe(rows.length);
    expectPrinted(lowK, '11.32');
    expectPrinted(highK, '39.61');
    expect(rows.map(({ exchangeCoefficientK }) => exchangeCoefficientK)).toEqual(
      rows.map(({ exchangeCoefficientK }) => exchangeCoefficientK).toSorted((one, other) => one - other),
    );
    expect(exchangeRange(25).rows.map(({ label }) => label)).toContain('Weiss 1974, solubility, S 35');
    expect(exchangeRange(25, 20).rows.map(({ label }) => label)).toContain('Weiss 1974, solubility, S 20');
  });
});

describe('closed forms', () => {
  it('τ of warming is a factor e, τ ln 2 a doubling, and cooling takes it back', () => {
    for (const coefficientK of [11, 23.64]) {
      expectClose(riseFromWarming(coefficientK, 280, coefficientK).toPpm, 280 * Math.E, near);
      expectClose(riseFromWarming(coefficientK, 280, coefficientK * Math.LN2).risePpm, 280, near);
      expectClose(riseFromWarming(coefficientK, 560, -coefficientK * Math.LN2).risePpm, -280, near);
      expectClose(riseFromWarming(coefficientK, 280, 3).risePpmBySlope, 840 / coefficientK, near);
    }
  });

  it('warmingForRise turns riseFromWarming round', () => {
    for (const warmingK of [-4, 0, 0.8, 9.9]) {
      const { toPpm } = riseFromWarming(24, 300, warmingK);
      expectClose(warmingForRise(24, 300, toPpm), warmingK, { ...near, abs: 1e-13 });
    }
  });

  it('α grows with the square of the temperature at which the slope is taken', () => {
    const [cold, warm] = [exchangeCoefficient(0.04, 0), exchangeCoefficient(0.04, 30)];
    expectClose(warm.vantHoffK / cold.vantHoffK, (303.15 / 273.15) ** 2, near);
    expectClose(cold.exchangeCoefficientK, 25, near);
  });

  it('a water of Revelle factor 10 loses 0.423 % of its carbon per K to keep its pressure', () => {
    const base = { source: 'takahashi1993', temperatureC: 15 } as const;
    expectClose(exchange({ ...base, revelleFactor: 10 }).dicPercentPerK, 0.423, near);
    expectClose(exchange({ ...base, revelleFactor: 12.5 }).dicPercentPerK, 0.3384, near);
  });
});
