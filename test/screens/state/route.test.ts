import { describe, expect, it } from 'vitest';
import { hashOfRoute, placeOfRoute, routeOfHash, type Route } from '../../../src-renderer/state/route.ts';

const places: [string, Route, string][] = [
  ['#/', { page: 'start' }, 'Start'],
  ['#/sources', { page: 'sources' }, 'Sources'],
  ['#/series', { page: 'series' }, 'Series'],
  ['#/series/5', { page: 'one-series', seriesId: 5 }, 'Series › 5'],
  ['#/series/import', { page: 'import' }, 'Series › Import'],
  ['#/claims', { page: 'claims' }, 'Claims'],
  ['#/claims/new', { page: 'new-claim' }, 'Claims › New'],
  ['#/claims/2', { page: 'claim', claimId: 2, section: null }, 'Claims › 2'],
  ['#/claims/2/assumptions', { page: 'claim', claimId: 2, section: 'assumptions' }, 'Claims › 2'],
  ['#/published', { page: 'published', claimId: null }, 'Published values'],
  ['#/published/2', { page: 'published', claimId: 2 }, 'Published values'],
  ['#/trail', { page: 'trail', sequence: null }, 'Trail'],
  ['#/trail/217', { page: 'trail', sequence: 217 }, 'Trail › 217'],
  ['#/report', { page: 'report' }, 'Report'],
];

describe('an address', () => {
  it.each(places)('%s names one place, and the place that address', (hash, route, words) => {
    expect(routeOfHash(hash)).toEqual(route);
    expect(hashOfRoute(route)).toBe(hash);
    expect(placeOfRoute(route)).toBe(words);
  });

  it('that is not known leads to the start, or to the list of its kind', () => {
    expect(routeOfHash('')).toEqual({ page: 'start' });
    expect(routeOfHash('#/elsewhere/1')).toEqual({ page: 'start' });
    expect(routeOfHash('#/series/0')).toEqual({ page: 'series' });
    expect(routeOfHash('#/claims/-1')).toEqual({ page: 'claims' });
    expect(routeOfHash('#/claims/2/roof')).toEqual({ page: 'claim', claimId: 2, section: null });
  });
});
