import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { importPreview } from '../../../../src-main/contract/series.ts';
import { InputError } from '../../../../src-main/errors.ts';
import { type Written, type WrittenVariable, monthlyFile } from '../fixtures/net-cdf.ts';
import { netCdf3 } from '../fixtures/net-cdf-3.ts';
import { netCdf4 } from '../fixtures/net-cdf-4.ts';
import { fileError, offered, previewFile, steps, valuesInFile } from '../fixtures/preview.ts';

const formats: [string, (file: Written) => Promise<Uint8Array>][] = [
  ['NetCDF-3', async (file) => netCdf3(file)],
  ['NetCDF-3 with an unlimited time', async (file) => netCdf3({ ...file, unlimited: 'time' })],
  ['NetCDF-4', netCdf4],
];

const annualTime: WrittenVariable = {
  name: 'time',
  type: 'double',
  dimensions: ['time'],
  attributes: { units: 'days since 2000-01-01', calendar: 'noleap', bounds: 'time_bnds' },
  values: [365, 730, 1095],
};

/** Three years, stamped at their ends, with bounds. */
function annualFile(variables: readonly WrittenVariable[], attributes: Written['attributes'] = {}): Written {
  const bounds = [0, 365, 365, 730, 730, 1000];
  return {
    dimensions: { time: 3, bnds: 2, member: 2, lat: 2, lon: 3 },
    attributes,
    variables: [
      annualTime,
      { name: 'time_bnds', type: 'double', dimensions: ['time', 'bnds'], values: bounds },
      { name: 'lat', type: 'double', dimensions: ['lat'], attributes: { units: 'degrees_north' }, values: [0, 60] },
      {
        name: 'lon',
        type: 'double',
        dimensions: ['lon'],
        attributes: { units: 'degrees_east' },
        values: [0, 120, 240],
      },
      ...variables,
    ],
  };
}

function series(overrides: Partial<WrittenVariable> = {}): WrittenVariable {
  return { name: 'index', type: 'double', dimensions: ['time'], values: [1, 2, 3], ...overrides };
}

describe.each(formats)('%s', (_, write) => {
  it('reads a variable in time, whatever lone latitude and longitude it has', async () => {
    const bytes = await write(monthlyFile());
    const found = await previewFile(bytes, 'tas_Invented.nc');
    expect(importPreview.parse({ ...found, digest: '0'.repeat(64), alreadyImportedAs: null })).toBeTruthy();
    expect(found.reader).toMatchObject({ id: 'net-cdf', version: '1' });
    expect(offered(found, 'tas')).toMatchObject({
      suggestedName: 'tas-invented-tas',
      quantity: 'temperature',
      unit: 'K',
      unitFrom: 'file',
      step: 'month',
      baselineFrom: 'not needed',
      isMain: true,
      nPresent: 14,
      nMissing: 1,
      partialYears: [
        { year: 1850, note: '11 of 12 months have a value' },
        { year: 1851, note: '3 of 12 months have a value' },
      ],
    });
    const values = await valuesInFile(bytes, 'tas');
    expect(steps(values).slice(2, 5)).toEqual(['1850-03: 287.25', '1850-04: null', '1850-05: 287.5']);
    const notes = found.notes.join('\n');
    expect(notes).toContain('calendar 360_day');
    expect(notes).toContain('absolute temperatures, not anomalies');
    expect(notes).toContain('Invented, free for all');
    expect(found.head.rows[0]).toEqual(['1850-01', '287']);
    expect(found.head.lines.join('\n')).toContain('tas(time = 15, lat = 1, lon = 1)');
  });

  it('unpacks packed values, and takes out-of-range ones as missing', async () => {
    const packed: Partial<WrittenVariable> = {
      type: 'short',
      attributes: { units: 'degC', scale_factor: 0.01, add_offset: 10, _FillValue: -32_768, valid_max: 1000 },
      values: Array.from({ length: 15 }, (_, place) => [-32_768, 1001, 100, -100][place] ?? 400),
    };
    const bytes = await write(monthlyFile(packed));
    expect((await valuesInFile(bytes, 'tas')).values.slice(0, 5)).toEqual([null, null, 11, 9, 14]);
    expect(offered(await previewFile(bytes, 'f.nc'), 'tas')).toMatchObject({ unit: '°C', quantity: 'temperature' });
  });

  it('places annual means by the middle of their bounds, and marks a year that they do not fill', async () => {
    const bytes = await write(annualFile([series()]));
    const found = await previewFile(bytes, 'f.nc');
    expect(steps(await valuesInFile(bytes, 'index'))).toEqual(['2000: 1', '2001: 2', '2002: 3']);
    expect(offered(found, 'index').partialYears).toEqual([{ year: 2002, note: 'its bounds span 270 days' }]);
  });

  it('averages a field over area with weights cos(latitude): (1·1 + ½·4)/1.5 = 2', async () => {
    const field = series({ name: 'field', dimensions: ['time', 'lat', 'lon'], attributes: { _FillValue: -1 } });
    const values = [1, 1, 1, 4, 4, 4, 1, 2, 3, -1, -1, -1, -1, -1, -1, -1, -1, -1];
    const bytes = await write(annualFile([{ ...field, values }]));
    const [first, second, third] = (await valuesInFile(bytes, 'field')).values;
    expect(first).toBeCloseTo(2, 12);
    expect(second).toBeCloseTo(2, 12);
    expect(third).toBeNull();
    const notes = (await previewFile(bytes, 'f.nc')).notes.join('\n');
    expect(notes).toContain('area mean over latitudes -30.0° to 90.0°');
    expect(notes).toContain('weights cos(latitude)');
    expect(notes).toContain('at least 0.0 % of its area');
  });

  it('offers what it can and says why it leaves the rest', async () => {
    const members = series({ name: 'spread', dimensions: ['time', 'member'], values: [1, 2, 3, 4, 5, 6] });
    const empty = series({ name: 'void', attributes: { _FillValue: 9 }, values: [9, 9, 9] });
    const found = await previewFile(await write(annualFile([members, empty, series()])), 'f.nc');
    expect(found.series.map(({ key, isMain }) => [key, isMain])).toEqual([['index', true]]);
    expect(found.notes.join('\n')).toContain('spread depends on member (2) beside time: select one');
    expect(found.notes.join('\n')).toContain('void holds no value');
  });

  it('keeps a unit that it does not know, prefers a series to a field, and takes no uncertainty for a forcing', async () => {
    const bytes = await write(
      annualFile([
        series({
          name: 'hc',
          dimensions: ['time', 'lat', 'lon'],
          attributes: { long_name: 'heat content anomaly', units: '10^18_joules' },
          values: Array.from({ length: 18 }, () => 3),
        }),
        series({ name: 'total', attributes: { long_name: 'heat content', units: '10^22_joules' } }),
        series({ name: 'sun', attributes: { long_name: 'irradiance', units: 'W m-2' }, values: [1360, 1361, 1362] }),
        series({ name: 'sun_unc', attributes: { long_name: 'Uncertainty in irradiance', units: 'W m-2' } }),
      ]),
    );
    const found = await previewFile(bytes, 'f.nc');
    const told = found.series.map(({ key, quantity, unit }) => `${key}: ${quantity}, ${unit}`);
    expect(told.toSorted()).toEqual([
      'hc: other, 10^18_joules',
      'sun-unc: other, W/m²',
      'sun: other, W/m²',
      'total: other, 10²² J',
    ]);
    // Variables have an order in NetCDF-3 and their names' in HDF5; the field comes last in both.
    expect(['total', 'sun']).toContain(found.series.find(({ isMain }) => isMain)?.key);
    expect(found.series.at(-1)?.key).toBe('hc');
  });

  it('takes two variables that say so as the limits of a third, and the base period from comments', async () => {
    const limit = (name: string, percent: number, shift: number): WrittenVariable =>
      series({
        name,
        attributes: { long_name: `${percent}% confidence limit for it`, units: 'K' },
        values: [0.25 + shift, 0.5 + shift, 0.75 + shift],
      });
    const bytes = await write(
      annualFile(
        [
          series({
            name: 'tas',
            attributes: { long_name: 'temperature anomaly', units: 'K' },
            values: [0.25, 0.5, 0.75],
          }),
          limit('high', 97.5, 0.125),
          limit('low', 2.5, -0.125),
        ],
        { comment: 'anomalies relative to 1961-1990 climatology' },
      ),
    );
    const found = await previewFile(bytes, 'f.nc');
    expect(found.series.map(({ key }) => key)).toEqual(['tas']);
    expect(offered(found, 'tas')).toMatchObject({
      quantity: 'temperature-anomaly',
      unit: 'K',
      baseline: { start: 1961, end: 1990 },
      baselineFrom: 'file',
    });
    expect(await valuesInFile(bytes, 'tas')).toMatchObject({
      lower: [0.125, 0.375, 0.625],
      upper: [0.375, 0.625, 0.875],
      boundsLevelPercent: 95,
    });
  });

  it('keeps one of two values of a month, and names both', async () => {
    const file = monthlyFile();
    const [time, ...others] = file.variables;
    if (time === undefined) throw new Error('no time');
    const stamps = time.values.map((stamp, place) => (place === 6 ? 165 : stamp));
    const found = await previewFile(
      await write({ ...file, variables: [{ ...time, values: stamps }, ...others] }),
      'f.nc',
    );
    expect(found.badRows).toMatchObject([
      { line: 7, reason: expect.stringContaining('gives 1850-06 again') as string },
    ]);
    expect(offered(found, 'tas').nAbsent).toBe(1);
  });

  it('refuses daily values, a field of levels alone, and a time of no known kind', async () => {
    const daily = monthlyFile({ time: { units: 'hours since 1850-01-01', calendar: 'standard' } });
    expect((await fileError(await write(daily), 'd.nc')).fields).toMatchObject({
      code: 'repeated-times',
      hint: expect.stringContaining('averaged to months first') as string,
    });
    const levels = annualFile([series({ name: 'spread', dimensions: ['time', 'member'], values: [1, 2, 3, 4, 5, 6] })]);
    const refused = (await fileError(await write(levels), 'levels.nc')).fields;
    expect(refused).toMatchObject({ code: 'no-series', where: 'levels.nc' });
    expect(refused.received).toContain('member (2)');
    expect(refused.hint).toContain('average over area');
    const odd = monthlyFile({ time: { units: 'fortnights since 1850-01-01' } });
    expect((await fileError(await write(odd), 'odd.nc')).fields).toMatchObject({
      code: 'unknown-time',
      where: 'odd.nc, variable time',
    });
    const lunar = monthlyFile({ time: { units: 'days since 1850-01-01', calendar: 'lunar' } });
    expect((await fileError(await write(lunar), 'odd.nc')).fields.received).toContain('lunar');
  });

  it.each([
    ['months since 1850-01-01', Array.from({ length: 15 }, (_, place) => place), '1850-04'],
    ['months since 1849-12-15', Array.from({ length: 15 }, (_, place) => place + 1), '1850-04'],
    [
      'day as %Y%m%d.%f',
      Array.from({ length: 15 }, (_, place) => 18_500_116.5 + (place % 12) * 100 + Math.floor(place / 12) * 10_000),
      '1850-04',
    ],
    [
      'hours since 1850-01-01 00:00:0.0',
      Array.from({ length: 15 }, (_, place) => (place * 30.44 + 10) * 24),
      '1850-04',
    ],
  ])('reads time in %s', async (units, values, fourth) => {
    const file = monthlyFile({ time: { units, calendar: 'standard' } });
    const variables = file.variables.map((variable) => (variable.name === 'time' ? { ...variable, values } : variable));
    const bytes = await write({ ...file, variables });
    expect(steps(await valuesInFile(bytes, 'tas'))[3]).toBe(`${fourth}: null`);
  });

  it.each([
    ['years since 1850-01-01', [0, 1, 2], ['1850: 1', '1851: 2', '1852: 3']],
    ['year', [1990, 1991, 1992], ['1990: 1', '1991: 2', '1992: 3']],
    ['days since 0000-01-01', [730_000, 730_366, 730_731], ['1998: 1', '1999: 2', '2000: 3']],
  ])('reads years in %s', async (units, values, read) => {
    const time = { ...annualTime, attributes: { units, calendar: 'standard' }, values };
    const bytes = await write({ dimensions: { time: 3 }, variables: [time, series()] });
    expect(steps(await valuesInFile(bytes, 'index'))).toEqual(read);
  });

  it('is refused with a clear sentence when it is cut short', async () => {
    const whole = await write(monthlyFile());
    for (const share of [0.1, 0.5, 0.9]) {
      const { fields } = await fileError(whole.slice(0, Math.floor(whole.length * share)), 'cut.nc');
      expect(fields).toMatchObject({ code: 'damaged-file', where: 'cut.nc' });
      expect(fields.hint).toContain('download broke off');
    }
  });

  it('gives values or a clear error when bytes are exchanged, and never hangs', async () => {
    const whole = await write(monthlyFile());
    const damage = fc.array(fc.record({ at: fc.nat(whole.length - 1), byte: fc.nat(255) }), {
      minLength: 1,
      maxLength: 8,
    });
    let nRead = 0;
    await fc.assert(
      fc.asyncProperty(damage, async (changes) => {
        const bytes = Uint8Array.from(whole);
        for (const { at, byte } of changes) bytes[at] = byte;
        try {
          await previewFile(bytes, 'file.nc');
          nRead += 1;
        } catch (error) {
          if (!(error instanceof InputError)) throw error;
          expect(error.fields.where).toContain('file.nc');
        }
      }),
      { numRuns: 150 },
    );
    expect(nRead).toBeGreaterThan(0);
  });
});

describe('net-cdf', () => {
  it('reads with no other reader, and no text as NetCDF', async () => {
    const bytes = netCdf3(monthlyFile());
    expect((await previewFile(bytes, 'f.nc')).readers).toEqual([{ id: 'net-cdf', title: 'NetCDF time series' }]);
    expect((await fileError(bytes, 'f.nc', { readerId: 'delimited' })).fields.code).toBe('unknown-reader');
    const text = new TextEncoder().encode('year,a\n1990,1\n1991,2\n');
    expect((await fileError(text, 'f.nc', { readerId: 'net-cdf' })).fields.code).toBe('unknown-reader');
  });

  it.each(['time', undefined])('reads an odd number of short integers, unlimited: %s', async (unlimited) => {
    const time = { ...annualTime, type: 'short' as const, attributes: { units: 'year' }, values: [1990, 1991, 1992] };
    const file = { dimensions: { time: 3 }, variables: [time, series({ type: 'short', values: [5, -6, 7] })] };
    const bytes = netCdf3(unlimited === undefined ? file : { ...file, unlimited });
    expect(steps(await valuesInFile(bytes, 'index'))).toEqual(['1990: 5', '1991: -6', '1992: 7']);
  });

  it('refuses a header that promises more values than the file holds', async () => {
    const bytes = netCdf3({ ...monthlyFile(), unlimited: 'time' });
    bytes.set([0x7f, 0xff, 0xff, 0xff], 4);
    expect((await fileError(bytes, 'f.nc')).fields.code).toBe('damaged-file');
  });
});
