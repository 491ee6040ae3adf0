import type { Series } from '../../contract/series.ts';

export function baselineText({ baseline }: Series): string {
  return baseline ? `vs ${baseline.start}–${baseline.end}` : 'no baseline';
}
