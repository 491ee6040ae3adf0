import { engineVersion } from '../engine-version.ts';
import type { HandlerContext } from './context.ts';

/** Who a second writer is told about. */
export function holder({ workspace, host }: HandlerContext) {
  return { reviewer: workspace.knownReviewer()?.name ?? 'someone', host, engineVersion };
}
