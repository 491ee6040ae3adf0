/** Number of a day, counted from any day of the calendar's own. */
type DayNumber = (year: number, month: number, day: number) => number;

const maxDays = 10_000 * 366;
const monthLengths = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/** Days since 1970-01-01 of the Gregorian calendar, also before it was in use. */
const gregorian: DayNumber = (year, month, day) => {
  const shifted = month <= 2 ? year - 1 : year;
  const yearOfEra = shifted - Math.floor(shifted / 400) * 400;
  const dayOfEra = yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayFromMarch(month, day);
  return Math.floor(shifted / 400) * 146_097 + dayOfEra - 719_468;
};

/** Days since 1970-01-01 of the Gregorian calendar, for dates of the Julian one. */
const julian: DayNumber = (year, month, day) => {
  const shifted = month <= 2 ? year - 1 : year;
  const yearOfEra = shifted - Math.floor(shifted / 4) * 4;
  return Math.floor(shifted / 4) * 1461 + yearOfEra * 365 + dayFromMarch(month, day) - 719_470;
};

/** The civil calendar: Julian up to 1582-10-04, Gregorian from the day after, 1582-10-15. */
const standard: DayNumber = (year, month, day) =>
  year * 10_000 + month * 100 + day >= 15_821_015 ? gregorian(year, month, day) : julian(year, month, day);

/** Calendars by the names of the CF conventions (section 4.4.1). */
const calendars: Readonly<Record<string, DayNumber>> = {
  standard,
  gregorian: standard,
  proleptic_gregorian: gregorian,
  julian,
  noleap: fixed(monthLengths),
  '365_day': fixed(monthLengths),
  all_leap: fixed(monthLengths.map((days, month) => (month === 1 ? 29 : days))),
  '366_day': fixed(monthLengths.map((days, month) => (month === 1 ? 29 : days))),
  '360_day': fixed(monthLengths.map(() => 30)),
};

/** The calendar of that name; null when there is none. */
export function calendarOf(name: string): DayNumber | null {
  const plain = name.toLowerCase();
  return Object.hasOwn(calendars, plain) ? (calendars[plain] ?? null) : null;
}

/** The month of a calendar in which a day, with a fraction of it, lies; NaN beyond ten thousand years. */
export function monthOfDay(calendar: DayNumber, day: number): { year: number; month: number } {
  const fromYearZero = day - calendar(0, 1, 1);
  if (!(Math.abs(fromYearZero) <= maxDays)) return { year: Number.NaN, month: Number.NaN };
  let year = Math.floor(fromYearZero / 365.25);
  while (calendar(year + 1, 1, 1) <= day) year += 1;
  while (calendar(year, 1, 1) > day) year -= 1;
  let month = 12;
  while (month > 1 && calendar(year, month, 1) > day) month -= 1;
  return { year, month };
}

function dayFromMarch(month: number, day: number): number {
  return Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + day - 1;
}

function fixed(lengths: readonly number[]): DayNumber {
  const nDays = lengths.reduce((sum, days) => sum + days, 0);
  return (year, month, day) =>
    year * nDays + lengths.slice(0, month - 1).reduce((sum, days) => sum + days, 0) + day - 1;
}
