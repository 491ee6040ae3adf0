import type { TextFile } from './decode-text.ts';
import { numericMarksOf } from './missing-marks.ts';
import { otherFormat } from './other-format.ts';
import { parseNumber } from './parse-number.ts';
import { readRows } from './read-rows.ts';
import type { Reader, Reading, Recognition } from './reader.ts';
import { seriesValues } from './series-values.ts';
import { type Table, splitTable } from './split-table.ts';
import { type TimeForm, recogniseTime } from './time-form.ts';

interface Layout {
  table: Table;
  timeColumn: number;
  time: TimeForm;
  valueColumn: number;
}

const timeNames = ['year', 'timebound_lower', 'time'];
const baseline = { start: 1850, end: 1900 };
/** The provider's mean of several records averages to zero over the base period but for rounding. */
const zeroMeanK = 0.005;

/** Global mean surface temperature of the Indicators of Global Climate Change (IGCC), annual. */
export const igccGmst: Reader = {
  id: 'igcc-gmst',
  title: 'IGCC global mean surface temperature',
  version: '1',

  recognise(file): Recognition | null {
    const layout = layoutOf(file);
    if (layout === null || !isZeroOverBaseline(layout)) return null;
    return {
      certainty: 0.8,
      why: 'A column gmst with mid-year stamps whose values average to zero over 1850–1900, as in IGCC’s file',
    };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null) throw otherFormat(file, 0, 'a header with year and gmst, and a row for each year');
    const { table, timeColumn, time, valueColumn } = layout;
    const numbers = table.lines.map(({ cells }) => parseNumber(cells?.[valueColumn] ?? '', '.'));
    const { rows, badRows, notes } = readRows(table, {
      nCells: table.header.length,
      decimalMark: '.',
      timeColumn,
      placeOf: (cells) => time.placeOf(cells[timeColumn] ?? ''),
      columns: [{ index: valueColumn, name: 'gmst', isMissing: numericMarksOf(numbers) }],
    });
    const isProviders = isZeroOverBaseline(layout);
    return {
      series: [
        {
          key: 'gmst',
          suggestedName: 'igcc-gmst-annual',
          label: 'Global mean surface temperature, IGCC, annual mean',
          quantity: 'temperature-anomaly',
          agent: null,
          unit: 'K',
          unitFrom: 'provider',
          step: 'year',
          baseline: isProviders ? baseline : null,
          baselineFrom: isProviders ? 'provider' : 'unknown',
          partialYears: [],
          isMain: true,
          values: seriesValues(rows, 0),
        },
      ],
      nRows: rows.length,
      badRows,
      notes: [
        ...(time.note === null ? [] : [time.note]),
        ...notes,
        'The file states neither unit nor base period. The provider gives °C, of which differences are the same in K.',
        isProviders
          ? 'The values average to zero over 1850–1900, which is the provider’s base period.'
          : 'The values do not average to zero over 1850–1900, the provider’s base period: state the base period.',
      ],
      columns: table.header,
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  if (!/\bgmst\b/i.test(file.lines[0] ?? '')) return null;
  const table = splitTable(file, { delimiter: ',', commentMarks: ['#'], headerLine: 1 });
  const names = table.header.map((name) => name.toLowerCase());
  const valueColumn = names.indexOf('gmst');
  const timeColumn = timeNames.map((name) => names.indexOf(name)).find((column) => column !== -1) ?? -1;
  if (valueColumn === -1 || timeColumn === -1) return null;
  const time = recogniseTime(
    table.lines.map(({ cells }) => cells?.[timeColumn] ?? ''),
    '.',
  );
  return time?.step === 'year' ? { table, timeColumn, time, valueColumn } : null;
}

function isZeroOverBaseline({ table, timeColumn, time, valueColumn }: Layout): boolean {
  const values = table.lines.flatMap(({ cells }) => {
    const year = time.placeOf(cells?.[timeColumn] ?? '')?.year ?? 0;
    return year >= baseline.start && year <= baseline.end
      ? [parseNumber(cells?.[valueColumn] ?? '', '.') ?? Number.NaN]
      : [];
  });
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  return values.length === baseline.end - baseline.start + 1 && Math.abs(mean) <= zeroMeanK;
}
