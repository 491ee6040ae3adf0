import type { TextFile } from './decode-text.ts';
import { isMissingText, numericMarksOf } from './missing-marks.ts';
import { otherFormat } from './other-format.ts';
import { parseNumber } from './parse-number.ts';
import { partialYears } from './partial-years.ts';
import { readRows } from './read-rows.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { seriesValues } from './series-values.ts';
import { type Table, splitTable } from './split-table.ts';
import { type TimeForm, recogniseTime } from './time-form.ts';

type Meaning = Omit<ReadSeries, 'values' | 'step' | 'partialYears' | 'agent' | 'unitFrom'>;

interface KnownTable {
  header: string;
  origin: string;
  columns: readonly Meaning[];
  /** Whether the rows are those of the known table and not only its header. */
  fits: (rows: readonly { year: number; value: number | null }[]) => boolean;
}

const co2 = { quantity: 'co2', unit: 'ppm', baseline: null, baselineFrom: 'not needed' } as const;
const baseline = { start: 1951, end: 1980 };
/** Anomalies printed to two decimals average to zero over their base period within this, in K. */
const zeroMeanK = 0.005;

const knownTables: readonly KnownTable[] = [
  {
    header: 'Date,CO2,adjusted CO2',
    origin: 'monthly CO2 at Mauna Loa of the Scripps programme, in ppm on its scale of 2012',
    columns: [
      {
        ...co2,
        key: 'co2',
        suggestedName: 'co2-mauna-loa-monthly',
        label: 'CO2, Mauna Loa, monthly mean',
        isMain: true,
      },
      {
        ...co2,
        key: 'adjusted-co2',
        suggestedName: 'co2-mauna-loa-monthly-deseasonalised',
        label: 'CO2, Mauna Loa, monthly mean, seasonal cycle removed',
        isMain: false,
      },
    ],
    fits: (rows) => rows[0]?.year === 1958 && rows.every(({ value }) => value === null || (value > 250 && value < 700)),
  },
  {
    header: 'year,temp',
    origin: 'annual GISTEMP anomalies in °C against 1951–1980',
    columns: [
      {
        key: 'temp',
        suggestedName: 'gistemp-annual',
        label: 'GISTEMP, land and ocean, global mean, annual mean',
        quantity: 'temperature-anomaly',
        unit: 'K',
        baseline,
        baselineFrom: 'provider',
        isMain: true,
      },
    ],
    fits(rows) {
      const base = rows.filter(({ year }) => year >= baseline.start && year <= baseline.end);
      const mean = base.reduce((sum, { value }) => sum + (value ?? Number.NaN), 0) / base.length;
      return rows[0]?.year === 1880 && base.length === 30 && Math.abs(mean) <= zeroMeanK;
    },
  },
];

interface Layout {
  known: KnownTable;
  table: Table;
  time: TimeForm;
}

/** The tables of CO2 and of global temperature that the open collection vega-datasets carries. */
export const vegaTables: Reader = {
  id: 'vega-tables',
  title: 'vega-datasets: CO2 and global temperature',
  version: '1',

  recognise(file): Recognition | null {
    const layout = layoutOf(file);
    if (layout === null) return null;
    const { known } = layout;
    return {
      certainty: 0.7,
      why: `The header ${known.header} and the values are those of the vega-datasets table: ${known.origin}`,
    };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null)
      throw otherFormat(
        file,
        0,
        'the header and values of a vega-datasets table: Date,CO2,adjusted CO2 from 1958, or year,temp from 1880',
      );
    const { known, table, time } = layout;
    const read = readRows(table, {
      nCells: table.header.length,
      decimalMark: '.',
      timeColumn: 0,
      placeOf: (cells) => time.placeOf(cells[0] ?? ''),
      columns: known.columns.map((_, place) => {
        const numbers = table.lines.map(({ cells }) => parseNumber(cells?.[place + 1] ?? '', '.'));
        return { index: place + 1, name: table.header[place + 1] ?? '', isMissing: numericMarksOf(numbers) };
      }),
    });
    return {
      series: known.columns.map((meaning, place) => {
        const values = seriesValues(read.rows, place);
        return {
          ...meaning,
          agent: null,
          unitFrom: 'provider',
          step: time.step,
          partialYears: partialYears(values),
          values,
        };
      }),
      nRows: read.rows.length,
      badRows: read.badRows,
      notes: [
        ...(time.note === null ? [] : [time.note]),
        ...read.notes,
        `The file states no unit. Header, first year and values agree with the vega-datasets table, which holds ${known.origin}; correct it if this file is another.`,
      ],
      columns: table.header,
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  const known = knownTables.find(({ header }) => header === (file.lines[0] ?? '').trim());
  if (known === undefined) return null;
  const table = splitTable(file, { delimiter: ',', commentMarks: ['#'], headerLine: 1 });
  const time = recogniseTime(
    table.lines.map(({ cells }) => cells?.[0] ?? ''),
    '.',
  );
  if (time === null) return null;
  const rows = table.lines.flatMap(({ cells }) => {
    const year = time.placeOf(cells?.[0] ?? '')?.year;
    const value = cells?.[1] ?? '';
    return year === undefined ? [] : [{ year, value: isMissingText(value) ? null : parseNumber(value, '.') }];
  });
  return known.fits(rows) ? { known, table, time } : null;
}
