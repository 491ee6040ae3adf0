/** One place in a record that an entry of the trail changed; null where there was or is nothing. */
export interface Difference {
  path: string;
  before: string | null;
  after: string | null;
}

type Json = null | boolean | number | string | Json[] | { [key: string]: Json };

/** Every place in which two states of a record differ, in the order of the later one's fields. */
export function recordDifferences(before: Json | undefined, after: Json | undefined, path = ''): Difference[] {
  if (sameJson(before, after)) return [];
  const [earlier, later] = [parts(before), parts(after)];
  if (earlier && later && (isWhole(before) || isWhole(after))) {
    const keys = new Set([...Object.keys(later), ...Object.keys(earlier)]);
    return [...keys].flatMap((key) =>
      recordDifferences(earlier[key], later[key], path ? `${path} › ${inWords(key)}` : inWords(key)),
    );
  }
  return [{ path, before: shown(before), after: shown(after) }];
}

/** What a value is made of, by name; a list of records by number. Nothing is made of nothing; null: cannot be taken apart. */
function parts(value: Json | undefined): { [key: string]: Json } | null {
  if (value === undefined || value === null) return {};
  if (Array.isArray(value)) {
    return value.some(isWhole) ? Object.fromEntries(value.map((part, index) => [String(index + 1), part])) : null;
  }
  return typeof value === 'object' ? value : null;
}

/** Made of further records, not of plain values. */
function isWhole(value: Json | undefined): boolean {
  if (Array.isArray(value)) return value.some(isWhole);
  return typeof value === 'object' && value !== null;
}

/** "contentDigest" → "content digest". */
const inWords = (key: string) => key.replaceAll(/(?<=[a-z])(?=[A-Z])/g, ' ').toLowerCase();

const sameJson = (one: Json | undefined, other: Json | undefined) => JSON.stringify(one) === JSON.stringify(other);

function shown(value: Json | undefined): string | null {
  if (value === undefined) return null;
  if (typeof value === 'string') return value === '' ? '(empty)' : value;
  return value === null ? '(none)' : JSON.stringify(value);
}
