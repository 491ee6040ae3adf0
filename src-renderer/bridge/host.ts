import type { WindowBridge } from '../../src-main/contract/window-bridge.ts';
import { electronHost } from './electron-host.ts';
import type { Host } from './host-shape.ts';
import { loopbackHost } from './loopback-host.ts';

declare global {
  interface Window {
    /** There in Electron only, put there by the preload script. */
    readonly footing?: WindowBridge;
  }
}

let chosen: Host | undefined;

/** The host of this window; the same one on every call. */
export function host(): Host {
  chosen ??= window.footing ? electronHost(window.footing) : loopbackHost();
  return chosen;
}
