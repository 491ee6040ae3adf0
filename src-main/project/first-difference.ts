/** Where two plain JSON values first differ, as a path, with both values as JSON; null when they are the same. */
export function firstDifference(
  one: unknown,
  other: unknown,
  path = '$',
): { path: string; one: string; other: string } | null {
  if (Object.is(one, other)) return null;
  if (isObject(one) && isObject(other) && Array.isArray(one) === Array.isArray(other)) {
    for (const key of new Set([...Object.keys(one), ...Object.keys(other)])) {
      const step = Array.isArray(one) ? `[${key}]` : `.${key}`;
      const difference = firstDifference(one[key], other[key], path + step);
      if (difference) return difference;
    }
    return null;
  }
  return { path, one: JSON.stringify(one) ?? 'nothing', other: JSON.stringify(other) ?? 'nothing' };
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
