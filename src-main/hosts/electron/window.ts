import { BrowserWindow, nativeTheme } from 'electron';
import { appOrigin } from './app-address.ts';

/** The paper of the screens, so that nothing flashes before the first page is drawn. */
const paper = { light: '#fbfaf6', dark: '#14181b' };

/** The one window, closed in on itself: sandboxed, isolated, without Node. */
export function createWindow(preload: string, isDevelopment: boolean): BrowserWindow {
  const window = new BrowserWindow({
    title: 'Footing',
    width: 1360,
    height: 880,
    minWidth: 900,
    minHeight: 600,
    show: false,
    backgroundColor: nativeTheme.shouldUseDarkColors ? paper.dark : paper.light,
    webPreferences: {
      preload,
      sandbox: true,
      contextIsolation: true,
      nodeIntegration: false,
      nodeIntegrationInWorker: false,
      nodeIntegrationInSubFrames: false,
      webSecurity: true,
      allowRunningInsecureContent: false,
      experimentalFeatures: false,
      navigateOnDragDrop: false,
      webviewTag: false,
      spellcheck: false,
      devTools: isDevelopment,
    },
  });
  window.once('ready-to-show', () => window.show());
  void window.loadURL(`${appOrigin}/`);
  return window;
}
