import { Menu, type BrowserWindow, type MenuItemConstructorOptions } from 'electron';

/** The menu: what the window itself can do. Everything about a review is done on its pages. */
export function installMenu(ownWindow: () => BrowserWindow | null, isDevelopment: boolean): void {
  const footing: MenuItemConstructorOptions[] = [
    { role: 'about', label: 'About Footing' },
    { type: 'separator' },
    {
      label: 'Find a command…',
      accelerator: 'CmdOrCtrl+K',
      registerAccelerator: false,
      click: () => pressCommandKey(ownWindow()),
    },
    { label: 'Print this page…', accelerator: 'CmdOrCtrl+P', click: () => ownWindow()?.webContents.print() },
    { type: 'separator' },
    { role: 'quit', label: 'Close Footing', accelerator: 'CmdOrCtrl+Q' },
  ];
  const text: MenuItemConstructorOptions[] = [
    { role: 'undo', label: 'Take back typing' },
    { role: 'redo', label: 'Type again' },
    { type: 'separator' },
    { role: 'cut', label: 'Cut' },
    { role: 'copy', label: 'Copy' },
    { role: 'paste', label: 'Paste' },
    { role: 'selectAll', label: 'Select all' },
  ];
  const window: MenuItemConstructorOptions[] = [
    { role: 'zoomIn', label: 'Larger' },
    { role: 'zoomOut', label: 'Smaller' },
    { role: 'resetZoom', label: 'Usual size' },
    { type: 'separator' },
    { role: 'togglefullscreen', label: 'Fill the screen' },
    { role: 'minimize', label: 'Put aside' },
  ];
  if (isDevelopment) window.push({ type: 'separator' }, { role: 'toggleDevTools', label: 'Developer tools' });

  Menu.setApplicationMenu(
    Menu.buildFromTemplate([
      { label: 'Footing', submenu: footing },
      { label: 'Text', submenu: text },
      { label: 'Window', submenu: window },
    ]),
  );
}

/** The command list belongs to the page, which listens for its key. */
function pressCommandKey(window: BrowserWindow | null): void {
  const modifiers: ('meta' | 'control')[] = [process.platform === 'darwin' ? 'meta' : 'control'];
  window?.webContents.sendInputEvent({ type: 'keyDown', keyCode: 'K', modifiers });
  window?.webContents.sendInputEvent({ type: 'keyUp', keyCode: 'K', modifiers });
}
