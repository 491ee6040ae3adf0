const english = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];
const full = [
  'january',
  'february',
  'march',
  'april',
  'may',
  'june',
  'july',
  'august',
  'september',
  'october',
  'november',
  'december',
];

/** 1–12 for an English month name or its first three letters ("Sept" too); null for any other word. */
export function monthOfName(word: string): number | null {
  const bare = word.toLowerCase().replace(/\.$/, '');
  const place = bare === 'sept' ? 8 : Math.max(english.indexOf(bare), full.indexOf(bare));
  return place === -1 ? null : place + 1;
}
