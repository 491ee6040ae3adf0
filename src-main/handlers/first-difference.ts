/** Where two plain JSON values first differ, as a path, with both values; null when they are the same. */
export function firstDifference(
  stored: unknown,
  recomputed: unknown,
  path = '$',
): { path: string; stored: string; recomputed: string } | null {
  if (Object.is(stored, recomputed)) return null;
  if (isObject(stored) && isObject(recomputed) && Array.isArray(stored) === Array.isArray(recomputed)) {
    for (const key of new Set([...Object.keys(stored), ...Object.keys(recomputed)])) {
      const step = Array.isArray(stored) ? `[${key}]` : `.${key}`;
      const difference = firstDifference(stored[key], recomputed[key], path + step);
      if (difference) return difference;
    }
    return null;
  }
  return { path, stored: JSON.stringify(stored) ?? 'nothing', recomputed: JSON.stringify(recomputed) ?? 'nothing' };
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
