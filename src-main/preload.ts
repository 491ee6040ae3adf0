import { contextBridge, ipcRenderer } from 'electron';
import type { ProgressEvent } from './contract/events.ts';
import { requestNames } from './contract/request-names.ts';
import type { WindowBridge } from './contract/window-bridge.ts';
import { progressChannel, requestChannel } from './hosts/electron/channels.ts';

const verbs = Object.fromEntries(
  requestNames.map((name) => [name, (inputJson: string) => ipcRenderer.invoke(requestChannel(name), inputJson)]),
) as WindowBridge['verbs'];

const bridge: WindowBridge = {
  verbs,
  onProgress(listener) {
    // The page gets what was sent, never the event that carried it: that would hand it the sender.
    const heard = (_event: unknown, progress: ProgressEvent) => listener(progress);
    ipcRenderer.on(progressChannel, heard);
    return () => ipcRenderer.off(progressChannel, heard);
  },
};

contextBridge.exposeInMainWorld('footing', bridge);
