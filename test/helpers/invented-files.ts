/** Files in published layouts, with invented numbers: forty years of CO2 that rises and of a temperature that follows. */
const years = Array.from({ length: 40 }, (_, place) => 1980 + place);
const monthNames = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const months = monthNames.map((_, place) => place + 1);

const co2PpmAt = (year: number, month: number) =>
  338 * 1.0046 ** (year - 1980 + (month - 0.5) / 12) + 3 * Math.sin((month * Math.PI) / 6);
const warmingKAt = (year: number, month: number) =>
  0.1 + 2.6 * Math.log(co2PpmAt(year, 6) / 338) + 0.08 * Math.sin(year * 1.3) + 0.05 * Math.sin(month);

/** GISTEMP's table: months across, then means; the last year breaks off in July. */
export function gistempFile(): string {
  const cell = (value: number) => value.toFixed(2).replace(/^(-?)0\./, '$1.');
  const rows = years.map((year) => {
    const values = months.map((month) => warmingKAt(year, month));
    const isPart = year === years.at(-1);
    const cells = values.map((value, place) => (isPart && place > 6 ? '***' : cell(value)));
    const annual = isPart ? '***' : cell(values.reduce((sum, value) => sum + value, 0) / 12);
    return [year, ...cells, annual, '***', '***', '***', '***', '***'].join(',');
  });
  const header = `Year,${monthNames.join(',')},J-D,D-N,DJF,MAM,JJA,SON`;
  return ['Land-Ocean: Global Means', header, ...rows, ''].join('\n');
}

/** NOAA GML's monthly table of eight columns. */
export function maunaLoaFile(): string {
  const rows = years.flatMap((year) =>
    months.map((month) => {
      const ppm = co2PpmAt(year, month).toFixed(2);
      return `  ${year}   ${String(month).padStart(2)}   ${(year + (month - 0.5) / 12).toFixed(4)}      ${ppm}      ${ppm}     25    0.40    0.15`;
    }),
  );
  return [
    '# USE OF NOAA GML DATA',
    '#            decimal       monthly    de-season  #days  st.dev  unc. of',
    '#             date         average     alized          of days  mon mean',
    ...rows,
    '',
  ].join('\n');
}

/** Plain delimited text that states neither unit nor baseline. */
export function readingsFile(): string {
  return ['year,reading', ...years.map((year) => `${year},${warmingKAt(year, 6).toFixed(3)}`), ''].join('\n');
}

/** A claim on the first two files, as a script would write it. */
export const inventedClaim = {
  title: 'At most 1.8 °C per doubling (invented)',
  statement: {
    words: 'A doubling of CO2 gives at most 1.8 degrees.',
    locator: 'slide 14',
    quantity: 'apparent-sensitivity',
    value: '1.8',
    unit: 'K per doubling',
    bound: 'at most',
    presentedAs: 'equilibrium-climate-sensitivity',
  },
  derivation: ['2.6 * ln(2) = 1.8'],
  procedure: {
    kind: 'log-regression',
    temperatureSeriesId: 'gistemp-annual',
    co2SeriesId: 'co2-mauna-loa-monthly',
    window: { start: 1980, end: 2018 },
  },
  evidence: {
    energyBudget: {
      warmingK: { best: 1.0, low: 0.8, high: 1.2, levelPercent: 90, source: 'invented' },
      forcingWm2: { best: 2.4, low: 1.8, high: 3.0, levelPercent: 90, source: 'invented' },
      uptakeWm2: { best: 0.6, low: 0.3, high: 0.9, levelPercent: 90, source: 'invented' },
      doublingWm2: { best: 3.9, low: 3.5, high: 4.3, levelPercent: 90, source: 'invented' },
    },
  },
};
