import { ipcMain, type BrowserWindow } from 'electron';
import { requestNames } from '../../contract/request-names.ts';
import type { Core } from '../../handlers/handle.ts';
import { carryRequest } from '../carry-request.ts';
import { progressChannel, requestChannel } from './channels.ts';
import { isOwnSender } from './sender-check.ts';

/** Carries the requests of our window to the core, and progress back; refuses every other sender. */
export function openRequestChannels(core: Core, ownWindow: () => BrowserWindow | null): void {
  for (const name of requestNames) {
    ipcMain.handle(requestChannel(name), (event, payload: unknown) => {
      if (!isOwnSender(event, ownWindow())) throw new Error('Refused: the sender is not the window of Footing.');
      return carryRequest(core, name, payload);
    });
  }
  core.onProgress((event) => {
    const window = ownWindow();
    if (window && !window.isDestroyed()) window.webContents.send(progressChannel, event);
  });
}
