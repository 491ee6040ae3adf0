import type { BadRow, SeriesValues } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import { arrangeRows } from '../arrange-rows.ts';
import { isUncertaintyName } from '../delimited/recognise-value-columns.ts';
import { isNegative, numericMarksOf } from '../missing-marks.ts';
import { partialYears } from '../partial-years.ts';
import type { ReadSeries, Reading } from '../reader.ts';
import { type Row, type RowsRead, placeName } from '../row.ts';
import { seriesValues } from '../series-values.ts';
import { findLimits } from './find-limits.ts';
import { selectValues } from './select-values.ts';
import { type TimeAxis, isTimeCoordinate, timeAxis } from './time-axis.ts';
import { type Variable, type VariableFile, textOf } from './variable-file.ts';
import { describeVariable } from './variable-meaning.ts';

interface Column {
  variable: Variable;
  values: (number | null)[];
  /** A field in space, of which the values are area means. */
  isField: boolean;
}

/** Columns on one time axis, in order of time. */
interface Arranged {
  axis: TimeAxis;
  columns: Column[];
  read: RowsRead;
}

const maxYear = 10_000;
const maxLicenceLength = 300;

/** NetCDF-3 and NetCDF-4 time series by the CF conventions: each variable in time is a series. */
export const netCdf = {
  id: 'net-cdf',
  title: 'NetCDF time series',
  version: '1',

  why({ format, variables }: VariableFile): string {
    const times = variables.filter(isTimeCoordinate).map(({ name }) => name);
    return `The first bytes are those of ${format}; time is in ${times.join(', ') || 'no variable'}`;
  },

  /** @throws InputError `no-series` when no variable is a series in time, and what the time axis throws */
  read(file: VariableFile): Reading {
    const refusals: string[] = [];
    const notes: string[] = [];
    const arranged = file.variables
      .filter(isTimeCoordinate)
      .filter(
        ({ dimensions }, place, all) =>
          all.findIndex((one) => one.dimensions[0]?.name === dimensions[0]?.name) === place,
      )
      .map((coordinate) => arrange(file, coordinate, { refusals, notes }))
      .filter((one) => one !== null);
    const [first] = arranged;
    if (first === undefined) throw noSeries(file, refusals);
    const series = withOwnKeys(arranged.flatMap((one) => offered(file, one, notes)));
    const main =
      series.find(({ quantity }) => quantity !== 'other') ??
      series.find(({ label }) => !/uncertainty|standard.?error|variance/i.test(label)) ??
      series[0];
    const columns = ['time', ...first.columns.map(({ variable }) => variable.name)];
    return {
      series: series.map((one) => ({ ...one, isMain: one === main })),
      nRows: arranged.reduce((n, { read }) => n + read.rows.length, 0),
      badRows: arranged.flatMap(({ read }) => read.badRows),
      notes: [
        ...arranged.flatMap(({ axis, read }) => [...axis.notes, ...read.notes]),
        ...notes,
        ...refusals.map((refusal) => `Not offered: ${refusal}.`),
        ...licenceOf(file),
      ],
      columns,
      table: {
        fileName: file.fileName,
        headerLine: 0,
        header: columns,
        lines: first.read.rows.map((row) => {
          const cells = [placeName(row), ...row.values.map((value) => (value === null ? '' : String(value)))];
          return { line: row.line, text: cells.join(' '), cells };
        }),
      },
      options: null,
    };
  },
};

/** Puts the variables on one time axis in order of time; null when there is none that can be read. */
function arrange(
  file: VariableFile,
  coordinate: Variable,
  { refusals, notes }: { refusals: string[]; notes: string[] },
): Arranged | null {
  const dimension = coordinate.dimensions[0]?.name ?? '';
  const bounds = file.variables.flatMap(({ attributes }) => [
    textOf(attributes, 'bounds'),
    textOf(attributes, 'climatology'),
  ]);
  const candidates = file.variables.filter(
    (variable) =>
      variable.dimensions.some(({ name }) => name === dimension) &&
      !isTimeCoordinate(variable) &&
      !bounds.includes(variable.name),
  );
  if (candidates.length === 0) return null;
  const axis = timeAxis(file, coordinate);
  const columns: Column[] = [];
  for (const variable of candidates) {
    const selected = selectValues(file, variable, dimension, axis);
    if ('refusal' in selected) refusals.push(`${variable.name} ${selected.refusal}`);
    else if (selected.values.every((value) => value === null)) refusals.push(`${variable.name} holds no value`);
    else {
      const isField = selected.notes.length > 0;
      columns.push({ variable, values: withoutMarks(variable, selected.values, notes), isField });
      notes.push(...selected.notes);
    }
  }
  if (columns.length === 0) return null;
  // What the file itself gives as a series comes before what is made of a field.
  const inOrder = columns.toSorted((a, b) => Number(a.isField) - Number(b.isField));
  return { axis, columns: inOrder, read: rowsOf(file, axis, inOrder) };
}

/** Undeclared marks such as -999 are as missing as declared ones; so are negative uncertainties. */
function withoutMarks({ name }: Variable, values: readonly (number | null)[], notes: string[]): (number | null)[] {
  const isMark = numericMarksOf(values);
  const isImpossible = isUncertaintyName(name.replaceAll('_', ' ')) ? isNegative : (): boolean => false;
  const marks = new Set(values.filter((value) => value !== null && (isMark(value) || isImpossible(value))));
  if (marks.size > 0) {
    notes.push(
      `Read as missing in ${name}, though the file does not declare it: ${[...marks].slice(0, 5).join(', ')}.`,
    );
  }
  return values.map((value) => (marks.has(value) ? null : value));
}

function rowsOf(file: VariableFile, axis: TimeAxis, columns: readonly Column[]): RowsRead {
  const rows: Row[] = [];
  const badRows: BadRow[] = [];
  axis.places.forEach((place, time) => {
    const values = columns.map((column) => column.values[time] ?? null);
    const text = values.join(' ');
    if (Math.abs(place.year) <= maxYear) rows.push({ ...place, line: time + 1, text, values });
    else badRows.push({ line: time + 1, text, reason: 'its time is missing or out of range' });
  });
  if (rows.length === 0) throw noSeries(file, ['no time is in range']);
  const names = columns.map(({ variable }, index) => ({ index, name: variable.name, isMissing: () => false }));
  const read = arrangeRows(file.fileName, rows, names);
  return { ...read, badRows: [...badRows, ...read.badRows] };
}

function offered(file: VariableFile, { axis, columns, read }: Arranged, notes: string[]): ReadSeries[] {
  const limits = findLimits(columns.map(({ variable }) => variable));
  if (limits !== null) {
    notes.push(`Limits are those of the file, at ${limits.levelPercent} %: ${limits.names.join(' and ')}.`);
  }
  return columns.flatMap(({ variable }, place): ReadSeries[] => {
    if (limits?.names.includes(variable.name)) return [];
    const values: SeriesValues = seriesValues(read.rows, place, limits?.base === variable.name ? limits.limits : null);
    const described = describeVariable(file, variable, values);
    notes.push(...described.notes);
    return [
      {
        ...described.series,
        step: axis.step,
        partialYears: axis.step === 'year' ? axis.partialYears : partialYears(values),
        isMain: false,
        values,
      },
    ];
  });
}

/** Names that differ only in case or signs, such as T and t, make the same key. */
function withOwnKeys(series: readonly ReadSeries[]): ReadSeries[] {
  return series.map((one, place) => {
    const nBefore = series.slice(0, place).filter(({ key }) => key === one.key).length;
    if (nBefore === 0) return one;
    return { ...one, key: `${one.key}-${nBefore + 1}`, suggestedName: `${one.suggestedName}-${nBefore + 1}` };
  });
}

function licenceOf({ attributes }: VariableFile): string[] {
  const licence = textOf(attributes, 'license') || textOf(attributes, 'licence');
  const text = licence.replaceAll(/\s+/g, ' ').trim();
  if (text === '') return [];
  return [
    `Licence, in the file’s words: ${text.slice(0, maxLicenceLength)}${text.length > maxLicenceLength ? ' …' : ''}`,
  ];
}

function noSeries({ fileName, variables }: VariableFile, refusals: readonly string[]): InputError {
  const names = variables.map(({ name }) => name);
  return new InputError({
    code: 'no-series',
    where: fileName,
    expected: 'a variable that depends on time, and on nothing else but latitude and longitude',
    received:
      refusals.length > 0
        ? refusals.slice(0, 5).join('; ')
        : names.length > 0
          ? `the variables ${names.slice(0, 8).join(', ')}`
          : 'no variable at all',
    hint: 'Reduce the file to a time series (select a level or member, average over area), or export it as text.',
  });
}
