import type { YearSpan } from '../contract/primitives.ts';
import type { SeriesValues } from '../contract/series.ts';
import { meanOver } from './base-period.ts';
import type { TextFile } from './decode-text.ts';
import { otherFormat } from './other-format.ts';
import { parseNumber } from './parse-number.ts';
import { type PartialYear, partialYears } from './partial-years.ts';
import { readRows } from './read-rows.ts';
import type { Row } from './row.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { seriesValues, varianceLimits } from './series-values.ts';
import { splitLine } from './split-line.ts';
import { type Table, firstTextLine, splitTable } from './split-table.ts';
import { yearPlace } from './time-form.ts';

interface Layout {
  table: Table;
  step: 'year' | 'month';
  nCells: number;
}

/** Year, anomaly and four variances; monthly with a month before and three diagnostics behind. */
const nCellsAnnual = 6;
const nCellsMonthly = 10;
/** Total variance and the sum of its three parts, all printed to six decimals, differ by no more than this. */
const roundingK2 = 3e-6;
const largestAnomalyK = 12;
const notableMeanK = 0.01;
const missing = -999;
/** Base period by version, as the provider's notes on the files give it. */
const baselines: Record<string, YearSpan> = {
  '4': { start: 1971, end: 2000 },
  '5': { start: 1971, end: 2000 },
  '6': { start: 1991, end: 2020 },
};

/** NOAAGlobalTemp area averages (aravg.*.asc), annual and monthly. */
export const noaaGlobalTemp: Reader = {
  id: 'noaa-global-temp',
  title: 'NOAAGlobalTemp',
  version: '1',

  recognise(file): Recognition | null {
    const layout = layoutOf(file);
    if (layout === null) return null;
    const isNamed = /^aravg\./i.test(file.fileName);
    if (!isNamed && !hasSummedVariances(layout)) return null;
    const why = `No header; ${layout.step === 'year' ? 'year' : 'year, month'}, anomaly, and a total variance that is the sum of three more columns`;
    return isNamed ? { certainty: 0.9, why: `${why}, as the file name says` } : { certainty: 0.7, why };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null) {
      throw otherFormat(file, 0, 'rows of year, (month,) anomaly and variances, without a header, as in aravg.*.asc');
    }
    const { table, step, nCells } = layout;
    const first = step === 'year' ? 1 : 2;
    const names = ['anomaly', 'total variance', 'high-frequency variance', 'low-frequency variance', 'bias variance'];
    const read = readRows(table, {
      nCells,
      decimalMark: '.',
      timeColumn: 0,
      placeOf: (cells) => yearPlace(cells[0] ?? '', step === 'year' ? null : (cells[1] ?? '')),
      columns: names.map((name, place) => ({
        index: first + place,
        name,
        isMissing: (value) => value <= missing || (place > 0 && value < 0),
      })),
    });
    const { series, notes } = offeredSeries(file, layout, read.rows);
    return {
      series: [series],
      nRows: read.rows.length,
      badRows: read.badRows,
      notes: [...read.notes, ...notes],
      columns: [
        ...(step === 'year' ? ['year'] : ['year', 'month']),
        ...names,
        'diagnostic',
        'diagnostic',
        'diagnostic',
      ].slice(0, nCells),
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  const nCells = splitLine(file.lines[firstTextLine(file)] ?? '', 'blanks')?.length;
  if (nCells !== nCellsAnnual && nCells !== nCellsMonthly) return null;
  const table = splitTable(file, { delimiter: 'blanks', commentMarks: [], headerLine: 0 });
  const step = nCells === nCellsAnnual ? 'year' : 'month';
  const rows = numbersOf(table, nCells);
  const fits = rows.filter(([year = 0, second = 0, third = 0, fourth = 0]) => {
    const [month, anomaly, variance] = step === 'year' ? [1, second, third] : [second, third, fourth];
    const isTime = Number.isInteger(year) && year > 1700 && year < 2200 && month >= 1 && month <= 12;
    return (
      isTime && (Math.abs(anomaly) <= largestAnomalyK || anomaly <= missing) && (variance >= 0 || variance <= missing)
    );
  });
  return rows.length > 0 && fits.length * 2 > table.lines.length ? { table, step, nCells } : null;
}

function numbersOf(table: Table, nCells: number): number[][] {
  return table.lines.flatMap(({ cells }) =>
    cells?.length === nCells ? [cells.map((cell) => parseNumber(cell, '.') ?? Number.NaN)] : [],
  );
}

function hasSummedVariances({ table, step, nCells }: Layout): boolean {
  const total = step === 'year' ? 2 : 3;
  const rows = numbersOf(table, nCells);
  const summed = rows.filter((row) => {
    const parts = row.slice(total + 1, total + 4).reduce((sum, part) => sum + part, 0);
    return (row[total] ?? 0) > 0 && Math.abs((row[total] ?? 0) - parts) <= roundingK2;
  });
  return summed.length * 2 > rows.length;
}

function offeredSeries(
  file: TextFile,
  { step }: Layout,
  rows: readonly Row[],
): { series: ReadSeries; notes: string[] } {
  const version = /\.v(\d+)/i.exec(file.fileName)?.[1];
  const baseline = baselines[version ?? ''] ?? null;
  const area = areaOf(file.fileName);
  const values = seriesValues(rows, 0, varianceLimits(1));
  const part = step === 'year' ? partialLastYear(file.fileName, rows) : null;
  const notes = [
    'The unit K is the provider’s. The column after the anomaly is a variance: limits are its root, one standard deviation (68.27 %).',
    baseline === null
      ? 'The file name states no version, so the base period is open: 1971–2000 up to version 5, 1991–2020 in version 6.'
      : `The base period ${baseline.start}–${baseline.end} is the provider’s for version ${version}.`,
    ...noteMean(values, baseline),
    ...(part === null ? [] : [`${part.year}, the last year, is a part year: ${part.note}.`]),
  ];
  const series: ReadSeries = {
    key: 'anomaly',
    suggestedName: `noaaglobaltemp${area.id}-${step === 'year' ? 'annual' : 'monthly'}`,
    label: `NOAAGlobalTemp, ${area.name}, ${step === 'year' ? 'annual' : 'monthly'} mean`,
    quantity: 'temperature-anomaly',
    agent: null,
    unit: 'K',
    unitFrom: 'provider',
    step,
    baseline,
    baselineFrom: baseline === null ? 'unknown' : 'provider',
    partialYears: step === 'month' ? partialYears(values) : part === null ? [] : [part],
    isMain: true,
    values,
  };
  return { series, notes };
}

/** The provider's climatology is taken place by place, so the area average need not be zero over the base period. */
function noteMean(values: SeriesValues, baseline: YearSpan | null): string[] {
  const mean = baseline && meanOver(values, baseline);
  if (mean === null || Math.abs(mean) < notableMeanK) return [];
  return [`Over the base period the values average to ${mean.toFixed(3)} K, not to zero.`];
}

/** A last year that ends before December: by the month in the file name, or by a total variance beyond its parts. */
function partialLastYear(fileName: string, rows: readonly Row[]): PartialYear | null {
  const last = rows.at(-1);
  if (last === undefined) return null;
  const [, year, month] = /\.(\d{4})(\d{2})\.asc/i.exec(fileName) ?? [];
  const [, total, ...parts] = last.values;
  const sum = parts.reduce<number>((before, part) => before + (part ?? Number.NaN), 0);
  const isWidened = total !== undefined && total !== null && total > sum + roundingK2;
  const reasons = [
    ...(Number(year) === last.year && Number(month) < 12
      ? [`by its name the file ends in month ${Number(month)}`]
      : []),
    ...(isWidened ? ['its total variance is more than the sum of its parts'] : []),
  ];
  return reasons.length === 0 ? null : { year: last.year, note: reasons.join('; ') };
}

function areaOf(fileName: string): { name: string; id: string } {
  const [, surface = 'land_ocean', south = '90S', north = '90N'] =
    /\.(land_ocean|land|ocean)\.(\d+[SN])\.(\d+[SN])\./i.exec(fileName) ?? [];
  const isGlobal = south === '90S' && north === '90N';
  return {
    name: `${surface.replace('_', ' and ')}, ${isGlobal ? 'global mean' : `${south} to ${north}`}`,
    id: `${surface === 'land_ocean' ? '' : `-${surface}`}${isGlobal ? '' : `-${south}-${north}`.toLowerCase()}`,
  };
}
