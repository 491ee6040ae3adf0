import type { SectionId } from '../../src-main/contract/project.ts';

/** Every place that an address can name. */
export type Route =
  | { page: 'start' }
  | { page: 'sources' }
  | { page: 'series' }
  | { page: 'one-series'; seriesId: number }
  | { page: 'import' }
  | { page: 'claims' }
  | { page: 'new-claim' }
  | { page: 'claim'; claimId: number; section: SectionId | null }
  | { page: 'published'; claimId: number | null }
  | { page: 'trail'; sequence: number | null }
  | { page: 'report' };

const sections = new Set<string>([
  'statement',
  'arithmetic',
  'data',
  'recomputation',
  'assumptions',
  'robustness',
  'finding',
] satisfies SectionId[]);

const isSection = (word: string | undefined): word is SectionId => word !== undefined && sections.has(word);

/** The place that a hash such as `#/claims/2/assumptions` names; an unknown one is the start. */
export function routeOfHash(hash: string): Route {
  const [page, first, second] = hash.replace(/^#?\/?/, '').split('/');
  const id = first && /^[1-9]\d*$/.test(first) ? Number(first) : null;
  switch (page) {
    case 'sources':
      return { page };
    case 'series':
      if (first === 'import') return { page: 'import' };
      return id ? { page: 'one-series', seriesId: id } : { page };
    case 'claims':
      if (first === 'new') return { page: 'new-claim' };
      return id ? { page: 'claim', claimId: id, section: isSection(second) ? second : null } : { page };
    case 'published':
      return { page, claimId: id };
    case 'trail':
      return { page, sequence: id };
    case 'report':
      return { page };
    default:
      return { page: 'start' };
  }
}

/** The address of a place: what a link points to. */
export function hashOfRoute(route: Route): string {
  switch (route.page) {
    case 'start':
      return '#/';
    case 'one-series':
      return `#/series/${route.seriesId}`;
    case 'import':
      return '#/series/import';
    case 'new-claim':
      return '#/claims/new';
    case 'claim':
      return `#/claims/${route.claimId}${route.section ? `/${route.section}` : ''}`;
    case 'published':
      return route.claimId ? `#/published/${route.claimId}` : '#/published';
    case 'trail':
      return route.sequence ? `#/trail/${route.sequence}` : '#/trail';
    default:
      return `#/${route.page}`;
  }
}

/** Where am I, in words. */
export function placeOfRoute(route: Route): string {
  switch (route.page) {
    case 'start':
      return 'Start';
    case 'sources':
      return 'Sources';
    case 'series':
      return 'Series';
    case 'one-series':
      return `Series › ${route.seriesId}`;
    case 'import':
      return 'Series › Import';
    case 'claims':
      return 'Claims';
    case 'new-claim':
      return 'Claims › New';
    case 'claim':
      return `Claims › ${route.claimId}`;
    case 'published':
      return 'Published values';
    case 'trail':
      return route.sequence ? `Trail › ${route.sequence}` : 'Trail';
    case 'report':
      return 'Report';
  }
}
