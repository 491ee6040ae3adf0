import { describe, expect, it } from 'vitest';
import type { OfferedSeries } from '../../../src-main/contract/series.ts';
import { statedBasePeriods } from '../../../src-main/readers/base-period.ts';
import { preview } from './fixtures/preview.ts';

const levels = {
  anomaly: ['-0.2', '0.3', '0.4'],
  celsius: ['9.5', '14.2', '14.6'],
  ppm: ['400.1', '402.5', '405'],
  small: ['10.5', '11', '36.2'],
};

function first(header: string, values: readonly string[], preamble = '', fileName = 'table.csv'): OfferedSeries {
  const rows = values.map((value, place) => `${1990 + place};${value}`).join('\n');
  const [series] = preview(`${preamble}year;${header}\n${rows}\n`, {}, fileName).series;
  if (series === undefined) throw new Error('no series');
  return series;
}

describe('unit and quantity from the words of the file', () => {
  it.each<[string, readonly string[], OfferedSeries['quantity'], string]>([
    ['Anomaly (deg C)', levels.anomaly, 'temperature-anomaly', 'K'],
    ['Temperature anomaly [K]', levels.anomaly, 'temperature-anomaly', 'K'],
    ['anomaly_degF', levels.anomaly, 'temperature-anomaly', '°F'],
    ['anomaly, 0.01 deg C', ['-20', '30', '41'], 'temperature-anomaly', '0.01 °C'],
    ['temp_C', levels.celsius, 'temperature', '°C'],
    ['Mean temperature (°F)', ['48.2', '57', '58.1'], 'temperature', '°F'],
    ['tas (K)', ['286.5', '287.1', '287.9'], 'temperature', 'K'],
    ['co2_ppm', levels.ppm, 'co2', 'ppm'],
    ['CO2 [µmol/mol]', levels.ppm, 'co2', 'ppm'],
    ['CH4 (ppb)', ['1800', '1803', '1811'], 'other', 'ppb'],
    ['total forcing (W m-2)', levels.anomaly, 'forcing', 'W/m²'],
    ['ERF W/m²', levels.anomaly, 'forcing', 'W/m²'],
    ['solar irradiance (W m-2)', ['1360.5', '1361', '1360.75'], 'other', 'W/m²'],
    ['share (%)', levels.celsius, 'other', '%'],
    ['heat (10^22 J)', levels.celsius, 'other', '10²² J'],
    ['heat, 1e22 J', levels.celsius, 'other', '10²² J'],
    ['heat (10^22_joules)', levels.celsius, 'other', '10²² J'],
    ['emissions (PgC/yr)', levels.celsius, 'other', 'GtC/yr'],
    ['emissions [GtCO2/yr]', levels.celsius, 'other', 'GtCO2/yr'],
  ])('%s', (header, values, quantity, unit) => {
    expect(first(header, values)).toMatchObject({ quantity, unit, unitFrom: 'file' });
  });

  it.each<[string, readonly string[], OfferedSeries['quantity']]>([
    ['temp', levels.anomaly, 'temperature-anomaly'],
    ['temp', levels.celsius, 'temperature'],
    ['CO2', levels.ppm, 'co2'],
    ['CO2', levels.small, 'other'],
    ['forcing', levels.anomaly, 'forcing'],
    ['rainfall', levels.small, 'other'],
  ])('leaves the unit of %s open', (header, values, quantity) => {
    expect(first(header, values)).toMatchObject({ quantity, unit: '', unitFrom: 'unknown' });
  });

  it.each([
    ['tas (K)', ['286.5', '287.1', '287.9'], 'runs from 286.5 to 287.9 K: absolute temperatures, not anomalies'],
    ['temp_C', levels.celsius, 'runs from 9.5 to 14.6 °C: absolute temperatures, not anomalies'],
    ['temp (K)', levels.celsius, 'no absolute temperatures in K'],
    ['temp (°C)', ['286.5', '287.1', '287.9'], 'that looks like K'],
    ['anomaly_degF', levels.anomaly, 'a difference of 1.8 °F is one of 1 K'],
  ])('speaks up on %s of %j', (header, values, said) => {
    const rows = values.map((value, place) => `${1990 + place};${value}`).join('\n');
    expect(preview(`year;${header}\n${rows}\n`).notes.join('\n')).toContain(said);
  });

  it('takes a unit that stands alone over the table, or over the column of years, for all columns', () => {
    const rows = '1990,1.5,2\n1991,1.75,2\n1992,2,2\n';
    for (const head of ['GtC/yr\nyear,a,b\n', 'GtC/yr,,x\nyear,a,b\n', 'GtC/yr,,members of it\nyear,a,b\n']) {
      expect(preview(`${head}${rows}`).series.map(({ unit }) => unit)).toEqual(['GtC/yr', 'GtC/yr']);
    }
    const perHead = preview(`MtC/yr\nyear,Coal,Per.Capita\n${rows}`).series.map(({ unit }) => unit);
    expect(perHead).toEqual(['MtC/yr', '']);
  });

  it('reads title lines above the table', () => {
    const preamble =
      'Invented Land and Ocean Temperature Anomalies, January-December 1990-1992\nUnits: Degrees Celsius\nBase Period: 1901-2000\nMissing: -999\n';
    expect(first('Value', levels.anomaly, preamble)).toMatchObject({
      quantity: 'temperature-anomaly',
      unit: 'K',
      unitFrom: 'file',
      baseline: { start: 1901, end: 2000 },
      baselineFrom: 'file',
    });
    expect(first('Value', levels.anomaly, preamble.replace('Celsius', 'Fahrenheit')).unit).toBe('°F');
  });

  it('does not choose between two units or two base periods', () => {
    const both = '# anomalies in °C; multiply by 1.8 for °F\n# relative to 1961-1990, earlier relative to 1951-1980\n';
    expect(first('value', levels.anomaly, both)).toMatchObject({
      unit: '',
      unitFrom: 'unknown',
      baseline: null,
      baselineFrom: 'unknown',
    });
  });

  it('needs no base period for anything but anomalies', () => {
    expect(first('co2_ppm', levels.ppm).baselineFrom).toBe('not needed');
    expect(first('temp_C', levels.celsius).baselineFrom).toBe('not needed');
  });

  it('names a single series after the file, several after file and column', () => {
    expect(first('level', levels.small, '', 'My Table_2.csv').suggestedName).toBe('my-table-2');
    const two = preview('year,a,b\n1990,1,2\n1991,3,4\n', {}, 'My Table.csv').series;
    expect(two.map(({ suggestedName }) => suggestedName)).toEqual(['my-table-a', 'my-table-b']);
  });

  it('keeps columns of one name apart', () => {
    const found = preview('Year Globe Land Land\n1990 1 2 3\n1991 3 4 5\n').series;
    expect(found.map(({ key, label }) => [key, label])).toEqual([
      ['globe', 'Globe'],
      ['land', 'Land'],
      ['land-column-4', 'Land (column 4)'],
    ]);
  });

  it('shortens long names and still keeps them apart', () => {
    const long = 'invented '.repeat(80).trim();
    const found = preview(`year,${long},${long}\n1990,1,2\n1991,3,4\n`).series;
    expect(new Set(found.map(({ key }) => key)).size).toBe(2);
    expect(found.every(({ label, suggestedName }) => label.length <= 500 && suggestedName.length <= 120)).toBe(true);
  });

  it('takes as main series what claims are about, not an uncertainty', () => {
    const found = preview('year,unc,rain,anomaly (K)\n1990,1,2,0.3\n1991,3,4,-0.5\n').series;
    expect(found.find(({ isMain }) => isMain)?.label).toBe('anomaly (K)');
    expect(preview('year,sd,rain\n1990,1,2\n1991,3,4\n').series.find(({ isMain }) => isMain)?.key).toBe('rain');
  });

  it('hints at the base period that values average to zero over', () => {
    const rows = Array.from(
      { length: 60 },
      (_, place) => `${1940 + place},${place < 11 ? -0.3 : place < 41 ? (place % 2 === 0 ? 0.1 : -0.1) : 0.5}`,
    );
    const found = preview(`year,anomaly\n${rows.join('\n')}\n`);
    expect(found.series[0]?.baseline).toBeNull();
    expect(found.notes.join('\n')).toContain('averages to zero over 1951–1980');
  });
});

describe('statedBasePeriods', () => {
  it.each([
    'base period: 1951-1980',
    'relative to the Jan 1951-Dec 1980 average',
    'anomalies w.r.t. 1951–1980',
    'reference period 1951 to 1980',
    'climatology from 1951 through 1980',
    'baseline=1951-1980; baseline=1951-1980',
  ])('finds the period in “%s”', (text) => {
    expect(statedBasePeriods(text)).toEqual([{ start: 1951, end: 1980 }]);
  });

  it.each([
    'January-December 1880-2016',
    'data from 1951 to 1980',
    'relative to pre-industrial',
    'base period: 1980-1951',
  ])('finds none in “%s”', (text) => {
    expect(statedBasePeriods(text)).toEqual([]);
  });
});
