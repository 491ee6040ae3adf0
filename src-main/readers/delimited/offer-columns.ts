import type { SeriesValues } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import { monthOfName } from '../month-names.ts';
import { nameOf, stemOf } from '../name-of.ts';
import { partialYears } from '../partial-years.ts';
import type { RowsRead, ValueColumn } from '../row.ts';
import type { ReadSeries } from '../reader.ts';
import { monthsAcross, seriesValues } from '../series-values.ts';
import { type Meaning, recogniseMeaning } from '../recognise-meaning.ts';
import type { TimeColumns } from './recognise-time-columns.ts';
import { isUncertaintyName, type ValueColumns } from './recognise-value-columns.ts';

interface Columns {
  fileName: string;
  time: TimeColumns;
  values: ValueColumns;
  /** Titles and comments. */
  preamble: string;
}

interface Found {
  name: string;
  /** Where it stands in the table, to tell columns of one name apart. */
  position: string;
  values: SeriesValues;
}

type Offer = { series: ReadSeries } & Pick<Meaning, 'isCelsiusDifference' | 'notes'>;

const maxKeyLength = 80;
const maxLabelLength = 200;

/**
 * The columns of a table as series with keys, names and what their words say; twelve columns of months as one series.
 *
 * @throws InputError `no-numbers` when every cell stands for "no value"
 */
export function offerColumns(columns: Columns, read: RowsRead): { series: ReadSeries[]; notes: string[] } {
  const all = findSeries(columns, read);
  const found = all.filter(({ values }) => values.values.some((value) => value !== null));
  if (found.length === 0) throw noValues(columns.fileName, read);
  const keys = new Set<string>();
  const offers = found.map((one) => offer(one, columns, { keys, isOnly: found.length === 1 }));
  const series = offers.map((one) => one.series);
  const main = mainOf(series);
  const celsius = offers.filter(({ isCelsiusDifference }) => isCelsiusDifference).map((one) => one.series.label);
  const withoutUnit = series.filter(({ unitFrom }) => unitFrom === 'unknown').map(({ label }) => label);
  return {
    series: series.map((one) => ({ ...one, isMain: one === main })),
    notes: [
      ...all.filter((one) => !found.includes(one)).map(({ name }) => `“${name}” holds no value and is not offered.`),
      ...offers.flatMap(({ notes }) => notes),
      ...note(celsius, (names) => `In °C in the file: ${names}. Differences are the same in K, so the unit is K.`),
      ...note(withoutUnit, (names) => `The file does not say in which unit these are: ${names}.`),
    ],
  };
}

function findSeries({ time, values: { columns } }: Columns, { rows }: RowsRead): Found[] {
  const across = time.step === 'year' ? monthColumns(columns) : null;
  const single = columns.flatMap(({ name, index }, place) =>
    across?.includes(place) ? [] : [{ name, position: `column ${index + 1}`, values: seriesValues(rows, place) }],
  );
  return across === null
    ? single
    : [{ name: 'monthly', position: 'months', values: monthsAcross(rows, across) }, ...single];
}

/** Places of twelve columns named January to December, or 1 to 12, in a table with a row for each year. */
function monthColumns(columns: readonly ValueColumn[]): number[] | null {
  const months = columns.map(
    ({ name }) => monthOfName(name) ?? (/^(0?[1-9]|1[0-2])$/.test(name) ? Number(name) : null),
  );
  const places = Array.from({ length: 12 }, (_, month) => months.indexOf(month + 1));
  return places.includes(-1) ? null : places;
}

function offer(
  { name, position, values }: Found,
  { fileName, preamble }: Columns,
  { keys, isOnly }: { keys: Set<string>; isOnly: boolean },
): Offer {
  const { notes, isCelsiusDifference, ...meaning } = recogniseMeaning({ column: name, preamble, fileName }, values);
  const plain = nameOf(name).slice(0, maxKeyLength) || 'column';
  const key = keys.has(plain) ? nameOf(`${plain} ${position}`) : plain;
  keys.add(key);
  const stem = stemOf(fileName);
  const series: ReadSeries = {
    key,
    suggestedName: nameOf(isOnly ? stem : `${stem.slice(0, maxKeyLength)} ${key}`) || key,
    label: key === plain ? name.slice(0, maxLabelLength) : `${name.slice(0, maxLabelLength)} (${position})`,
    ...meaning,
    step: values.months ? 'month' : 'year',
    partialYears: partialYears(values),
    isMain: false,
    values,
  };
  return { series, isCelsiusDifference, notes };
}

/** The first series of a quantity that claims are about; else the first that does not describe another one. */
function mainOf(series: readonly ReadSeries[]): ReadSeries | undefined {
  const candidates = series.filter(({ label }) => !isUncertaintyName(label));
  return candidates.find(({ quantity }) => quantity !== 'other') ?? candidates[0] ?? series[0];
}

function note(names: readonly string[], sentence: (listed: string) => string): string[] {
  return names.length === 0 ? [] : [sentence(names.join(', '))];
}

function noValues(fileName: string, { rows }: RowsRead): InputError {
  return new InputError({
    code: 'no-numbers',
    where: `${fileName}, line ${rows[0]?.line ?? 1}`,
    expected: 'at least one value',
    received: 'cells that all stand for “no value”',
    hint: 'Say in the preview what stands for a missing value, or which columns hold the values.',
  });
}
