import { onScopeDispose } from 'vue';
import type { ProgressEvent } from '../../src-main/contract/events.ts';
import { currentHost } from './current-host.ts';

/** Follows what running jobs tell, for as long as the calling screen lives. */
export function useProgress(listener: (event: ProgressEvent) => void): void {
  onScopeDispose(currentHost().onProgress(listener), true);
}
