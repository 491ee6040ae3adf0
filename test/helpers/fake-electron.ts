import { EventEmitter } from 'node:events';
import { vi, type Mock } from 'vitest';

/**
 * Stands in for the module `electron`: has what the shell is meant to use and records how it is used. What it lacks
 * (updater, crash reporter, shell) cannot be used without a test failing.
 */

export const state = { isPackaged: false, hasLock: true, calls: [] as string[] };

/** A new Electron: forgets everything that was set and called. */
export function restart(): void {
  Object.assign(state, { isPackaged: false, hasLock: true, calls: [] });
  app.removeAllListeners();
  session.defaultSession.removeAllListeners();
  session.defaultSession.handlers.clear();
  channels.clear();
  BrowserWindow.all = [];
  vi.clearAllMocks();
}

const note = (call: string) => void state.calls.push(call);

class FakeApp extends EventEmitter {
  get isPackaged() {
    return state.isPackaged;
  }
  enableSandbox = vi.fn(() => note('enableSandbox'));
  commandLine = { appendSwitch: vi.fn((name: string) => note(`switch ${name}`)) };
  requestSingleInstanceLock = vi.fn(() => state.hasLock);
  quit = vi.fn(() => note('quit'));
  exit: Mock = vi.fn();
  whenReady = vi.fn(async () => {
    await new Promise((resolve) => setTimeout(resolve));
    note('ready');
  });
}
export const app = new FakeApp();

class FakeContents extends EventEmitter {
  mainFrame = { url: '' };
  windowOpenHandler: ((details: { url: string }) => unknown) | undefined;
  setWindowOpenHandler = (handler: (details: { url: string }) => unknown) => (this.windowOpenHandler = handler);
  setWebRTCIPHandlingPolicy: Mock = vi.fn();
  send: Mock = vi.fn();
  reload: Mock = vi.fn();
  print: Mock = vi.fn();
  sendInputEvent: Mock = vi.fn();
}

export class BrowserWindow extends EventEmitter {
  static all: BrowserWindow[] = [];
  webContents = new FakeContents();
  options: { webPreferences: Record<string, unknown>; [name: string]: unknown };
  isGone = false;
  isMinimized = () => false;
  isDestroyed = () => this.isGone;
  show: Mock = vi.fn();
  focus: Mock = vi.fn();
  restore: Mock = vi.fn();

  constructor(options: BrowserWindow['options']) {
    super();
    this.options = options;
    BrowserWindow.all.push(this);
    app.emit('web-contents-created', {}, this.webContents);
  }

  loadURL = vi.fn((url: string) => {
    note(`load ${url}`);
    this.webContents.mainFrame.url = url;
    return Promise.resolve();
  });
}

type Listener = (...values: never[]) => unknown;

class FakeSession extends EventEmitter {
  handlers = new Map<string, Listener>();
  keep = (name: string) => (handler: Listener) => void this.handlers.set(name, handler);
  webRequest = { onBeforeRequest: this.keep('request') };
  setPermissionRequestHandler = this.keep('permission request');
  setPermissionCheckHandler = this.keep('permission check');
  setDevicePermissionHandler = this.keep('device permission');
  setDisplayMediaRequestHandler = this.keep('display media');
  setSpellCheckerEnabled: Mock = vi.fn();
  protocol = { handle: vi.fn((_scheme: string, handler: Listener) => void this.handlers.set('protocol', handler)) };
}
export const session = { defaultSession: new FakeSession() };

export const protocol = { registerSchemesAsPrivileged: vi.fn((_schemes: unknown[]) => note('register scheme')) };

export const channels = new Map<string, (event: unknown, ...payload: unknown[]) => unknown>();
export const ipcMain = {
  handle: (channel: string, handler: (event: unknown, ...payload: unknown[]) => unknown) =>
    void channels.set(channel, handler),
};

export interface MenuItem {
  label?: string;
  role?: string;
  accelerator?: string;
  submenu?: MenuItem[];
  click?: () => void;
}
export const Menu = {
  buildFromTemplate: (template: MenuItem[]) => template,
  setApplicationMenu: vi.fn((_menu: MenuItem[]) => undefined),
};

export const dialog: { showErrorBox: Mock } = { showErrorBox: vi.fn() };
export const nativeTheme = { shouldUseDarkColors: false };
