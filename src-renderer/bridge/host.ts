import type { ProgressEvent } from '../../src-main/contract/events.ts';
import type { RequestName } from '../../src-main/contract/request-names.ts';
import type { WindowBridge } from '../../src-main/contract/window-bridge.ts';
import { electronHost } from './electron-host.ts';
import { loopbackHost } from './loopback-host.ts';

declare global {
  interface Window {
    /** There in Electron only, put there by the preload script. */
    readonly footing?: WindowBridge;
  }
}

/** Whatever carries requests to the core: the Electron process around this window, or the program behind this page. */
export interface Host {
  /** From the input as JSON text to the answer as JSON text; rejects when the host has gone away. */
  send(name: RequestName, inputJson: string): Promise<string>;
  onProgress(listener: (event: ProgressEvent) => void): () => void;
  /** Calls back with true when the host goes away and with false when it is there again. */
  onAbsence(listener: (isAway: boolean) => void): () => void;
}

let chosen: Host | undefined;

/** The host of this window; the same one on every call. */
export function host(): Host {
  chosen ??= window.footing ? electronHost(window.footing) : loopbackHost();
  return chosen;
}
