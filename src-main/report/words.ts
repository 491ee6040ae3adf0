import { thinSpace } from '../quantities/notation.ts';

const months = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];

/** "3 March 2031", of a time in UTC. */
export function dayText(isoTime: string): string {
  const [, year = '', month = '', day = ''] = /^(\d{4})-(\d{2})-(\d{2})/.exec(isoTime) ?? [];
  return `${Number(day)} ${months[Number(month) - 1] ?? month} ${year}`;
}

/** "3 March 2031, 14:06 UTC". */
export function timeText(isoTime: string): string {
  return `${dayText(isoTime)}, ${isoTime.slice(11, 16)} UTC`;
}

/** Small counts in words. */
export function countWord(count: number): string {
  return ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine'][count] ?? String(count);
}

export function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** Bytes with groups of three digits. */
export function bytesText(bytes: number): string {
  return `${String(bytes).replace(/\B(?=(\d{3})+$)/g, thinSpace)}${thinSpace}bytes`;
}

/** The unit of a number in running text; plain numbers have none. */
export function unitText(unit: string): string {
  return unit === '1' ? 'no unit' : unit;
}
