import type { WindowBridge } from '../../src-main/contract/window-bridge.ts';
import type { Host } from './host-shape.ts';

/** Requests through the verbs of the preload script. The process around a window cannot leave before the window does. */
export function electronHost(bridge: WindowBridge): Host {
  return {
    send: (name, inputJson) => bridge.verbs[name](inputJson),
    onProgress: (listener) => bridge.onProgress(listener),
    onAbsence: () => () => undefined,
  };
}
