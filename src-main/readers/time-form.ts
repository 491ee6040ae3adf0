import type { TimeStep } from '../contract/series.ts';
import { monthOfName } from './month-names.ts';
import { type DecimalMark, parseNumber } from './parse-number.ts';
import { type Place, placeName } from './row.ts';

/** How a column states the time. */
export interface TimeForm {
  step: TimeStep;
  /** In words, for the preview; null where nothing had to be decided. */
  note: string | null;
  placeOf: (cell: string) => Place | null;
}

type PlaceOf = (cell: string) => Place | null;

/** Stamps of one year, such as 1750.5 and 1751.5, differ by no more than this in their fraction. */
const sameFraction = 0.02;
/** Mid-month stamps lie this close to the middle of a month, in months: mid-March is 0.2027 · 12 = 2.43. */
const midMonthTolerance = 0.15;
/** Start-of-month stamps lie this close to a whole month: 1 March is 59/365 · 12 = 1.94. */
const monthStartTolerance = 0.1;

/** Ways of writing a month in one cell. */
const monthForms: readonly PlaceOf[] = [
  matching(/^(\d{4})[-/](\d{1,2})$/, ([year, month]) => monthPlace(year, month)),
  matching(/^(\d{4})(\d{2})$/, ([year, month]) => monthPlace(year, month)),
  matching(/^(\d{1,2})[-/](\d{4})$/, ([month, year]) => monthPlace(year, month)),
  matching(/^([a-z]{3,9})\.?[-/ ]?(\d{4})$/i, ([name, year]) => monthPlace(year, monthOfName(name ?? ''))),
  matching(/^(\d{4})[-/ ]?([a-z]{3,9})\.?$/i, ([year, name]) => monthPlace(year, monthOfName(name ?? ''))),
];

/** Ways of writing a day in one cell, with the order of its parts. */
const dayForms: readonly { pattern: RegExp; order: readonly ('year' | 'month' | 'day')[] }[] = [
  { pattern: /^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})(?:[T ]\d{1,2}:.*)?$/, order: ['year', 'month', 'day'] },
  { pattern: /^(\d{4})(\d{2})(\d{2})$/, order: ['year', 'month', 'day'] },
  { pattern: /^(\d{1,2})\.(\d{1,2})\.(\d{4})$/, order: ['day', 'month', 'year'] },
  { pattern: /^(\d{1,2})[-/](\d{1,2})[-/](\d{4})$/, order: ['day', 'month', 'year'] },
  { pattern: /^(\d{1,2})[-/](\d{1,2})[-/](\d{4})$/, order: ['month', 'day', 'year'] },
];

/**
 * Recognises how the cells of a column state years or months: 1959, 1750.5, 1958-03, 195803, 1958-03-01, Mar 1958,
 * 1958.2027. The form that most cells have is taken. Null when fewer than half have any one form.
 */
export function recogniseTime(cells: readonly string[], decimalMark: DecimalMark): TimeForm | null {
  const stated = cells.filter((cell) => cell !== '');
  return yearForm(stated) ?? decimalForm(stated, decimalMark) ?? monthForm(stated) ?? dayForm(stated);
}

/** A year and, where there is one, the number or name of a month in a column of its own. */
export function yearPlace(year: string, month: string | null): Place | null {
  if (!/^-?\d{1,5}(\.0*)?$/.test(year)) return null;
  return month === null ? { year: Number(year), month: null } : monthPlace(year, monthOfName(month) ?? month);
}

function yearForm(cells: readonly string[]): TimeForm | null {
  const placeOf: PlaceOf = (cell) => (/^-?\d{1,4}$/.test(cell) ? { year: Number(cell), month: null } : null);
  return fitsMost(placeOf, cells) ? { step: 'year', note: null, placeOf } : null;
}

function monthForm(cells: readonly string[]): TimeForm | null {
  const placeOf = monthForms.find((form) => fitsMost(form, cells));
  return placeOf ? { step: 'month', note: null, placeOf } : null;
}

/** Dates stand for months; for years when all fall into one month of the year. */
function dayForm(cells: readonly string[]): TimeForm | null {
  const fitting = dayForms
    .map(({ pattern, order }) => matching(pattern, (parts) => dayPlace(parts, order)))
    .filter((form) => fitsMost(form, cells));
  // Day and month may be exchanged (03/01/1958): in monthly data the month runs through the year and the day does not.
  const [placeOf] = fitting.toSorted((a, b) => nMonths(b, cells) - nMonths(a, cells));
  if (placeOf === undefined) return null;
  const example = cells.find((cell) => placeOf(cell) !== null) ?? '';
  if (nMonths(placeOf, cells) === 1 && nYears(placeOf, cells) > 1) {
    const annual: PlaceOf = (cell) => {
      const place = placeOf(cell);
      return place && { ...place, month: null };
    };
    return {
      step: 'year',
      note: `All dates fall into one month of the year, such as ${example}; each stands for its year.`,
      placeOf: annual,
    };
  }
  const place = placeOf(example);
  return {
    step: 'month',
    note: `Dates stand for their months: ${example} for ${place ? placeName(place) : ''}.`,
    placeOf,
  };
}

/** Decimal years: one stamp a year (1750.5), mid-month (1958.208, 1958.2027), start of month (1958.1667), or 1958.03. */
function decimalForm(cells: readonly string[], decimalMark: DecimalMark): TimeForm | null {
  if (!mostly(cells, (cell) => /[.,]/.test(cell))) return null;
  const yearOf = (cell: string): number | null =>
    /^-?\d{1,4}([.,]\d*)?$/.test(cell) ? parseNumber(cell, decimalMark) : null;
  const stamps = cells.map(yearOf).filter((stamp) => stamp !== null);
  if (stamps.length * 2 <= cells.length) return null;
  const fractions = stamps.map((stamp) => stamp - Math.floor(stamp)).toSorted((a, b) => a - b);
  const middle = fractions[Math.floor(fractions.length / 2)] ?? 0;
  const readAs = (step: TimeStep, described: string, placeOf: (stamp: number) => Place | null): TimeForm => ({
    step,
    note: `${described}, as in ${cells[0]}.`,
    placeOf(cell) {
      const stamp = yearOf(cell);
      return stamp === null ? null : placeOf(stamp);
    },
  });
  if (mostly(fractions, (fraction) => Math.abs(fraction - middle) <= sameFraction)) {
    return readAs('year', 'Decimal years with one and the same fraction stand for whole years', (stamp) =>
      Math.abs(stamp - Math.floor(stamp) - middle) <= sameFraction ? { year: Math.floor(stamp), month: null } : null,
    );
  }
  if (mostly(cells, (cell) => /[.,](0[1-9]|1[0-2])$/.test(cell))) {
    return readAs('month', 'The two digits after the point are months', (stamp) => {
      const year = Math.floor(stamp);
      return monthPlace(String(year), Math.round((stamp - year) * 100));
    });
  }
  if (mostly(fractions, (fraction) => isNear((fraction * 12) % 1, 0.5, midMonthTolerance))) {
    return readAs('month', 'Decimal years lie in the middle of months', (stamp) => {
      const months = stamp * 12;
      return isNear(months - Math.floor(months), 0.5, midMonthTolerance) ? placeOfMonths(Math.floor(months)) : null;
    });
  }
  if (mostly(fractions, (fraction) => isNear(fraction * 12, Math.round(fraction * 12), monthStartTolerance))) {
    return readAs('month', 'Decimal years are taken as the beginnings of months', (stamp) => {
      const months = Math.round(stamp * 12);
      return isNear(stamp * 12, months, monthStartTolerance) ? placeOfMonths(months) : null;
    });
  }
  return null;
}

function placeOfMonths(months: number): Place {
  const year = Math.floor(months / 12);
  return { year, month: months - year * 12 + 1 };
}

function monthPlace(year: string | undefined, month: string | number | null | undefined): Place | null {
  const place = { year: Number(year), month: Number(month ?? Number.NaN) };
  return Number.isInteger(place.month) && place.month >= 1 && place.month <= 12 ? place : null;
}

function dayPlace(parts: readonly (string | undefined)[], order: readonly string[]): Place | null {
  const part = (name: string): string | undefined => parts[order.indexOf(name)];
  const day = Number(part('day'));
  return day >= 1 && day <= 31 ? monthPlace(part('year'), part('month')) : null;
}

function matching(pattern: RegExp, toPlace: (parts: readonly (string | undefined)[]) => Place | null): PlaceOf {
  return (cell) => {
    const match = pattern.exec(cell);
    return match ? toPlace(match.slice(1)) : null;
  };
}

function nMonths(placeOf: PlaceOf, cells: readonly string[]): number {
  return new Set(cells.map((cell) => placeOf(cell)?.month).filter((month) => month !== undefined)).size;
}

function nYears(placeOf: PlaceOf, cells: readonly string[]): number {
  return new Set(cells.map((cell) => placeOf(cell)?.year).filter((year) => year !== undefined)).size;
}

function fitsMost(placeOf: PlaceOf, cells: readonly string[]): boolean {
  return mostly(cells, (cell) => placeOf(cell) !== null);
}

function mostly<T>(items: readonly T[], has: (item: T) => boolean): boolean {
  return items.filter(has).length * 2 > items.length;
}

function isNear(value: number, target: number, tolerance: number): boolean {
  return Math.abs(value - target) <= tolerance;
}
