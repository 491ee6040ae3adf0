import type { TimeStep } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import type { PartialYear } from '../partial-years.ts';
import type { Place } from '../row.ts';
import { recogniseTime } from '../time-form.ts';
import { calendarOf, monthOfDay } from './calendars.ts';
import { type Variable, type VariableFile, textOf } from './variable-file.ts';

/** The calendar steps that a time coordinate states, one for each of its values. */
export interface TimeAxis {
  step: TimeStep;
  places: readonly Place[];
  /** Years of which an annual value covers only a part, by the bounds. */
  partialYears: PartialYear[];
  notes: string[];
}

const since =
  /^\s*(\w+)\s+since\s+(-?\d{1,5})(?:-(\d{1,2}))?(?:-(\d{1,2}))?(?:[T\s]+(\d{1,2})(?::(\d{1,2}))?(?::(\d+(?:\.\d*)?))?)?/i;
const daysPerUnit: readonly [RegExp, number][] = [
  [/^d(ays?)?$/i, 1],
  [/^h(ou)?rs?$|^h$/i, 1 / 24],
  [/^min(ute)?s?$/i, 1 / 1440],
  [/^s(ec(ond)?s?)?$/i, 1 / 86_400],
];
const monthsPerUnit: readonly [RegExp, number][] = [
  [/^mon(th)?s?$/i, 1],
  [/^(common_?)?ye?a?rs?$/i, 12],
];
/** Values at least this far apart are annual; a mean over as many days is. */
const minAnnualDays = 200;
/** A year has 360 days at least, in any calendar. */
const wholeYearDays = 355;
const daysPerYear = 365.25;

/** Whether a variable is a time coordinate: one value for each step of one dimension, in a unit of time or so named. */
export function isTimeCoordinate({ name, dimensions, attributes }: Variable): boolean {
  if (dimensions.length !== 1) return false;
  const isNamed = textOf(attributes, 'standard_name') === 'time' || textOf(attributes, 'axis') === 'T';
  const isOwn = dimensions[0]?.name === name;
  return since.test(textOf(attributes, 'units')) || isNamed || (isOwn && /^(time|years?|dates?)$/i.test(name));
}

/** @throws InputError `unknown-time` when unit or calendar are of no kind that is known here */
export function timeAxis(file: VariableFile, coordinate: Variable): TimeAxis {
  const stamps = Array.from(coordinate.values ?? []);
  const units = textOf(coordinate.attributes, 'units');
  const bounds = boundsOf(file, coordinate);
  const match = since.exec(units);
  if (match === null) return statedTimes(file, coordinate, stamps);
  const [, unit = '', ...parts] = match;
  const [year = 0, month = 1, day = 1, hours = 0, minutes = 0, seconds = 0] = parts.map((part) =>
    part === undefined ? undefined : Number(part),
  );
  const middles = bounds?.map(([start, end]) => (start + end) / 2) ?? stamps;
  const nMonths = monthsPerUnit.find(([pattern]) => pattern.test(unit))?.[1];
  if (nMonths !== undefined) {
    const first = year * 12 + month - 1 + (day - 1) / 31;
    const months = middles.map((stamp) => Math.floor(first + stamp * nMonths + 1e-6));
    const step = nMonths === 12 || spacing(months) >= 6 ? 'year' : 'month';
    const places = months.map((count) => placed(step, Math.floor(count / 12), count - Math.floor(count / 12) * 12 + 1));
    return { step, places, partialYears: [], notes: [`Time is in ${units}, counted in calendar months.`] };
  }
  const calendarName = textOf(coordinate.attributes, 'calendar') || 'standard';
  const calendar = calendarOf(calendarName);
  const nDays = daysPerUnit.find(([pattern]) => pattern.test(unit))?.[1];
  if (calendar === null || nDays === undefined)
    throw unknownTime(file, coordinate, `${units}, calendar ${calendarName}`);
  const origin = calendar(year, month, day) + hours / 24 + minutes / 1440 + seconds / 86_400;
  const days = middles.map((stamp) => origin + stamp * nDays);
  const widths = bounds?.map(([start, end]) => Math.abs(end - start) * nDays) ?? null;
  const width = widths === null ? 0 : median(widths);
  const step = (width > 0 ? width : spacing(days)) >= minAnnualDays ? 'year' : 'month';
  const found = days.map((one) => monthOfDay(calendar, one));
  return {
    step,
    places: found.map((place) => placed(step, place.year, place.month)),
    partialYears: step === 'year' ? partialYears(found, widths) : [],
    notes: [
      `Time is in ${units}, calendar ${calendarName}; ${bounds ? `each value stands for the ${step} in which the middle of its bounds lies` : `there are no bounds, so each value stands for the ${step} into which its stamp falls`}.`,
      ...noteWidth(step, width, spacing(days)),
    ],
  };
}

/** Times without "since": years, YYYYMM, YYYYMMDD or decimal years, as numbers. */
function statedTimes(file: VariableFile, coordinate: Variable, stamps: readonly number[]): TimeAxis {
  const cells = stamps.map((stamp) =>
    /%Y%m%d/i.test(textOf(coordinate.attributes, 'units')) ? Math.floor(stamp) : stamp,
  );
  const form = recogniseTime(cells.map(String), '.');
  const places = form === null ? [] : cells.map((cell) => form.placeOf(String(cell)));
  if (form === null || places.includes(null)) {
    throw unknownTime(file, coordinate, textOf(coordinate.attributes, 'units') || 'no unit');
  }
  const whole = places.filter((place) => place !== null);
  return { step: form.step, places: whole, partialYears: [], notes: form.note === null ? [] : [form.note] };
}

function placed(step: TimeStep, year: number, month: number): Place {
  return { year, month: step === 'year' ? null : month };
}

/** Start and end of each step; null when the file has none. */
function boundsOf(file: VariableFile, { attributes, dimensions }: Variable): [number, number][] | null {
  const name = textOf(attributes, 'bounds');
  const bounds = file.variables.find((variable) => variable.name === name);
  const [own] = dimensions;
  if (!bounds?.values || bounds.dimensions.length !== 2 || bounds.dimensions[1]?.size !== 2) return null;
  if (bounds.dimensions[0]?.size !== own?.size) return null;
  const { values } = bounds;
  const pairs = Array.from({ length: own?.size ?? 0 }, (_, place): [number, number] => [
    values[2 * place] ?? Number.NaN,
    values[2 * place + 1] ?? Number.NaN,
  ]);
  return pairs.every(([start, end]) => Math.abs(start) < 1e15 && Math.abs(end) < 1e15) ? pairs : null;
}

function partialYears(places: readonly { year: number }[], widths: readonly number[] | null): PartialYear[] {
  return places.flatMap(({ year }, place) => {
    const width = widths?.[place] ?? wholeYearDays;
    return width < wholeYearDays ? [{ year, note: `its bounds span ${Math.round(width)} days` }] : [];
  });
}

function noteWidth(step: TimeStep, width: number, apart: number): string[] {
  if (step === 'month') return width > 45 ? [`Each value is a mean over about ${Math.round(width)} days.`] : [];
  if (width < 1.5 * daysPerYear) return [];
  const nYears = Math.round(width / daysPerYear);
  const overlap = apart < 0.9 * width ? ' Windows overlap, so neighbouring values are not independent.' : '';
  return [`Each value is a mean over ${nYears} years.${overlap}`];
}

function spacing(stamps: readonly number[]): number {
  return median(stamps.slice(1).map((stamp, place) => Math.abs(stamp - (stamps[place] ?? stamp))));
}

function median(numbers: readonly number[]): number {
  return numbers.toSorted((a, b) => a - b)[Math.floor(numbers.length / 2)] ?? 0;
}

function unknownTime({ fileName }: VariableFile, { name }: Variable, received: string): InputError {
  return new InputError({
    code: 'unknown-time',
    where: `${fileName}, variable ${name}`,
    expected: 'time in days, hours, months or years since a date in a CF calendar, or as years or YYYYMM',
    received,
    hint: 'Export the time series as text with a column of years or months.',
  });
}
