import type { BrowserWindow, IpcMainInvokeEvent } from 'electron';
import { isAppAddress } from './app-address.ts';

/** Whether a message comes from our window, from its main frame, and from one of our pages. */
export function isOwnSender({ sender, senderFrame }: IpcMainInvokeEvent, window: BrowserWindow | null): boolean {
  if (!window || window.isDestroyed() || sender !== window.webContents) return false;
  return senderFrame !== null && senderFrame === window.webContents.mainFrame && isAppAddress(senderFrame.url);
}
