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
  if (isObject(before ?? {}) && isObject(after ?? {}) && (isObject(before) || isObject(after))) {
    const [earlier, later] = [isObject(before) ? before : {}, isObject(after) ? after : {}];
    const keys = new Set([...Object.keys(later), ...Object.keys(earlier)]);
    return [...keys].flatMap((key) => recordDifferences(earlier[key], later[key], path ? `${path} › ${key}` : key));
  }
  return [{ path, before: shown(before), after: shown(after) }];
}

function isObject(value: Json | undefined): value is { [key: string]: Json } {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

const sameJson = (one: Json | undefined, other: Json | undefined) => JSON.stringify(one) === JSON.stringify(other);

function shown(value: Json | undefined): string | null {
  if (value === undefined) return null;
  if (typeof value === 'string') return value === '' ? '(empty)' : value;
  return value === null ? '(none)' : JSON.stringify(value);
}
