import type { RequestName } from '../../contract/request-names.ts';

/** The channel of a request between a window and the main process; one each, none that takes a name. */
export function requestChannel(name: RequestName): string {
  return `footing:request:${name}`;
}

export const progressChannel = 'footing:progress';
