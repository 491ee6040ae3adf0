import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { runInNewContext } from 'node:vm';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { requestNames } from '../../src-main/contract/request-names.ts';
import type { Answer } from '../../src-main/contract/requests.ts';
import type { WindowBridge } from '../../src-main/contract/window-bridge.ts';
import * as fake from '../helpers/fake-electron.ts';

// Asked for when the main script is first run, and kept by vitest from then on: one fake, restarted for each test.
vi.mock('electron', () => ({ ...fake }));

const at = (path: string) => fileURLToPath(new URL(`../../${path}`, import.meta.url));

/** The worked example is run whole before the window opens. */
const patience = { timeout: 60_000 };

let home: string;

/** Runs the built main script in a fresh fake Electron. */
async function start({
  args = [] as string[],
  ...state
}: { args?: string[]; isPackaged?: boolean; hasLock?: boolean } = {}) {
  process.argv = ['electron', at('.'), ...args];
  vi.resetModules();
  fake.restart();
  Object.assign(fake.state, state);
  await import(/* @vite-ignore */ at('out/main/main.js'));
}

async function openWindow(options?: Parameters<typeof start>[0]) {
  await start(options);
  return vi.waitFor(() => {
    const [window] = fake.BrowserWindow.all;
    if (!window) throw new Error('no window yet');
    return window;
  }, patience);
}
type FakeWindow = Awaited<ReturnType<typeof openWindow>>;

/** What a page of this window gets when it asks. */
async function ask(window: FakeWindow, name: string, payload: unknown, sender: object = {}) {
  const event = { sender: window.webContents, senderFrame: window.webContents.mainFrame, ...sender };
  const handler = fake.channels.get(`footing:request:${name}`);
  if (!handler) throw new Error(`no channel for ${name}`);
  return JSON.parse(String(await handler(event, payload))) as Answer<'session.get'>;
}

async function createProject(window: FakeWindow, path: string) {
  await ask(window, 'reviewer.set', JSON.stringify({ name: 'A. Reviewer', role: 'reviewer' }));
  const answer = await ask(window, 'project.create', JSON.stringify({ title: 'Review', path }));
  expect(answer).toMatchObject({ ok: true });
}

/** Quits as Electron does: asks its listeners first, until none of them objects. */
async function quit() {
  const leave = () => {
    const event = { preventDefault: vi.fn() };
    fake.app.emit('before-quit', event);
    return event.preventDefault.mock.calls.length === 0;
  };
  const before = fake.app.quit.mock.calls.length;
  if (leave()) return;
  await vi.waitFor(() => expect(fake.app.quit.mock.calls.length).toBeGreaterThan(before));
  expect(leave()).toBe(true);
}

const argumentsBefore = process.argv;
beforeEach(() => {
  home = mkdtempSync(join(tmpdir(), 'footing-shell-'));
  vi.stubEnv('FOOTING_HOME', home);
  vi.stubEnv('FOOTING_DEVELOPMENT', '');
});
afterEach(async () => {
  await quit();
  process.argv = argumentsBefore;
  vi.unstubAllEnvs();
  rmSync(home, { recursive: true });
});

describe('the start', () => {
  it('closes the sandbox and the network before Electron is ready, and loads nothing before the rules stand', async () => {
    const window = await openWindow();
    const before = fake.state.calls.slice(0, fake.state.calls.indexOf('ready'));
    expect(before).toEqual([
      'enableSandbox',
      'switch host-resolver-rules',
      'switch no-proxy-server',
      'register scheme',
    ]);
    expect(fake.app.commandLine.appendSwitch).toHaveBeenCalledWith('host-resolver-rules', 'MAP * ~NOTFOUND');
    expect(window.loadURL).toHaveBeenCalledExactlyOnceWith('footing://app/');
    expect(fake.session.defaultSession.handlers.size).toBe(6);
  });

  it('gives its scheme what a page needs and no way round the content policy', async () => {
    await openWindow();
    expect(fake.protocol.registerSchemesAsPrivileged).toHaveBeenCalledExactlyOnceWith([
      { scheme: 'footing', privileges: { standard: true, secure: true, supportFetchAPI: true, codeCache: true } },
    ]);
  });

  it('leaves at once when another instance runs, without opening anything', async () => {
    await start({ hasLock: false });
    expect(fake.app.quit).toHaveBeenCalledOnce();
    await new Promise((resolve) => setTimeout(resolve, 50));
    expect(fake.BrowserWindow.all).toEqual([]);
    expect(fake.channels.size).toBe(0);
  });

  it('says which file cannot be opened and goes on to the start screen', async () => {
    const missing = join(home, 'missing.footing');
    const window = await openWindow({ args: ['--some-switch-of-chromium', '--project', missing] });
    const [[title, sentence] = []] = fake.dialog.showErrorBox.mock.calls;
    expect(title).toBe('Footing could not open the project');
    expect(sentence).toContain('missing.footing');
    await expect(ask(window, 'session.get', '{}')).resolves.toMatchObject({ ok: true, value: { project: null } });
  });
});

describe('the window', () => {
  it('is sandboxed and isolated, without Node, webviews, spell checker or developer tools', async () => {
    const { options } = await openWindow();
    expect(options.webPreferences).toEqual({
      preload: at('out/preload/preload.cjs'),
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
      devTools: false,
    });
    expect(options).toMatchObject({ title: 'Footing', minWidth: 900, minHeight: 600, show: false });
  });

  it('is shown when there is something to see', async () => {
    const window = await openWindow();
    expect(window.show).not.toHaveBeenCalled();
    window.emit('ready-to-show');
    expect(window.show).toHaveBeenCalledOnce();
  });

  it.each(['will-navigate', 'will-redirect', 'will-frame-navigate', 'will-attach-webview'])(
    'refuses %s',
    async (name) => {
      const { webContents } = await openWindow();
      for (const url of ['https://footing.example/', 'file:///etc/passwd', 'footing://app/other']) {
        const event = { url, preventDefault: vi.fn() };
        webContents.emit(name, event, url);
        expect(event.preventDefault, url).toHaveBeenCalledOnce();
      }
    },
  );

  it('opens no other window, whoever asks', async () => {
    const { webContents } = await openWindow();
    const other = new fake.BrowserWindow({ webPreferences: {} });
    for (const contents of [webContents, other.webContents]) {
      expect(contents.windowOpenHandler?.({ url: 'footing://app/' })).toEqual({ action: 'deny' });
      expect(contents.setWebRTCIPHandlingPolicy).toHaveBeenCalledWith('disable_non_proxied_udp');
    }
  });
});

describe('the session', () => {
  const isCancelled = (url: string) => {
    const answer = vi.fn();
    const filter = fake.session.defaultSession.handlers.get('request') as (details: object, answer: unknown) => void;
    filter({ url }, answer);
    const [[{ cancel }] = [{ cancel: undefined }]] = answer.mock.calls as [{ cancel: boolean }][];
    return cancel;
  };

  it('cancels every request that is not to the app itself', async () => {
    await openWindow();
    const foreign = [
      'https://footing.example/',
      'http://127.0.0.1:8080/',
      'http://localhost/',
      'ws://127.0.0.1/',
      'wss://footing.example/',
      'file:///etc/passwd',
      'ftp://footing.example/',
      'footing://other/',
      'footing://app.footing.example/',
      'footing://app@footing.example/',
      'blob:https://footing.example/1',
      'chrome-extension://a/b.js',
      'devtools://devtools/bundled/inspector.html',
      'about:blank',
      '',
    ];
    expect(foreign.filter((url) => isCancelled(url) !== true)).toEqual([]);
    const own = [
      'footing://app/',
      'footing://app/assets/index.js',
      'blob:footing://app/1',
      'data:image/png;base64,AA==',
    ];
    expect(own.filter((url) => isCancelled(url) !== false)).toEqual([]);
  });

  it('grants nothing', async () => {
    await openWindow();
    const { handlers } = fake.session.defaultSession;
    const call = (name: string, ...values: unknown[]) =>
      (handlers.get(name) as (...all: unknown[]) => unknown)(...values);
    for (const permission of [
      'media',
      'geolocation',
      'notifications',
      'clipboard-read',
      'openExternal',
      'fullscreen',
    ]) {
      const answer = vi.fn();
      call('permission request', {}, permission, answer);
      expect(answer, permission).toHaveBeenCalledExactlyOnceWith(false);
      expect(call('permission check', {}, permission)).toBe(false);
    }
    expect(call('device permission', {})).toBe(false);
    const screens = vi.fn();
    call('display media', {}, screens);
    expect(screens).toHaveBeenCalledExactlyOnceWith({});
  });

  it('checks no spelling, because the dictionaries would be fetched', async () => {
    await openWindow();
    expect(fake.session.defaultSession.setSpellCheckerEnabled).toHaveBeenCalledExactlyOnceWith(false);
  });

  it('saves only what our own pages made', async () => {
    await openWindow();
    const isRefused = (url: string) => {
      const event = { preventDefault: vi.fn() };
      fake.session.defaultSession.emit('will-download', event, { getURL: () => url });
      return event.preventDefault.mock.calls.length === 1;
    };
    expect(isRefused('https://footing.example/a.exe')).toBe(true);
    expect(isRefused('blob:footing://app/1')).toBe(false);
  });
});

describe('the pages', () => {
  const load = (url: string, method = 'GET') => {
    const handler = fake.session.defaultSession.handlers.get('protocol') as (request: object) => Promise<Response>;
    return handler({ url, method });
  };

  it('come from the built screens, each with the content policy', async () => {
    await openWindow();
    expect(fake.session.defaultSession.protocol.handle).toHaveBeenCalledExactlyOnceWith(
      'footing',
      expect.any(Function),
    );
    const page = await load('footing://app/#/claims/1');
    expect(page.status).toBe(200);
    expect(page.headers.get('content-type')).toBe('text/html; charset=utf-8');
    const html = await page.text();
    expect(html).toBe(readFileSync(at('out/renderer/index.html'), 'utf8'));
    const [, script = ''] = /src="\.?(\/assets\/[^"]+\.js)"/.exec(html) ?? [];
    const code = await load(`footing://app${script}`);
    expect([code.status, code.headers.get('content-type')]).toEqual([200, 'text/javascript; charset=utf-8']);
    for (const { headers } of [page, code, await load('footing://app/nothing')]) {
      expect(headers.get('content-security-policy')).toMatch(
        /^default-src 'none'; script-src 'self'; style-src 'self'; /,
      );
      expect(headers.get('content-security-policy')).not.toMatch(/unsafe|https?:|\*/);
      expect(headers.get('x-content-type-options')).toBe('nosniff');
    }
  });

  it.each([
    'footing://app/../main/main.js',
    'footing://app/%2e%2e/main/main.js',
    'footing://app/..%2fmain%2fmain.js',
    'footing://app//etc/passwd',
    'footing://app/assets/',
    'footing://other/index.html',
    'footing://app.footing.example/index.html',
    'https://footing.example/index.html',
  ])('are not to be had at %s', async (url) => {
    await openWindow();
    expect((await load(url)).status).toBe(404);
  });

  it('can only be read', async () => {
    await openWindow();
    expect((await load('footing://app/', 'POST')).status).toBe(404);
  });
});

describe('the requests', () => {
  it('have one channel each', async () => {
    await openWindow();
    expect([...fake.channels.keys()]).toEqual(requestNames.map((name) => `footing:request:${name}`));
  });

  it('are answered by the core', async () => {
    const window = await openWindow();
    await expect(ask(window, 'session.get', '{}')).resolves.toMatchObject({
      ok: true,
      value: { project: null, host: 'electron', projectsDirectory: home },
    });
    await expect(ask(window, 'claim.view', '{"claimId":-1}')).resolves.toMatchObject({ ok: false });
  });

  it.each<[string, (window: FakeWindow) => object]>([
    ['another window', () => ({ sender: new fake.BrowserWindow({ webPreferences: {} }).webContents })],
    ['a frame inside the page', ({ webContents }) => ({ senderFrame: { ...webContents.mainFrame } })],
    ['a frame that is gone', () => ({ senderFrame: null })],
  ])('are refused to %s', async (_who, sender) => {
    const window = await openWindow();
    for (const name of requestNames) await expect(ask(window, name, '{}', sender(window))).rejects.toThrow('Refused');
  });

  it('are refused to a page of somebody else, and to a window that is gone', async () => {
    const window = await openWindow();
    for (const url of ['https://footing.example/', 'file:///tmp/a.html', 'footing://other/', 'about:blank', '']) {
      window.webContents.mainFrame.url = url;
      await expect(ask(window, 'session.get', '{}'), url).rejects.toThrow('Refused');
    }
    window.webContents.mainFrame.url = 'footing://app/';
    await expect(ask(window, 'session.get', '{}')).resolves.toMatchObject({ ok: true });
    window.isGone = true;
    await expect(ask(window, 'session.get', '{}')).rejects.toThrow('Refused');
  });

  it('take JSON text within the limit of the request, and nothing else', async () => {
    const window = await openWindow();
    for (const payload of [undefined, null, 1, {}, new ArrayBuffer(8), '', '{']) {
      await expect(ask(window, 'session.get', payload)).resolves.toMatchObject({
        ok: false,
        error: { code: 'request-not-json' },
      });
    }
    const long = JSON.stringify({ title: 'a'.repeat(1_000_000) });
    await expect(ask(window, 'project.create', long)).resolves.toMatchObject({
      ok: false,
      error: { code: 'request-too-large' },
    });
  });

  it('of long work tell the window how far it is', async () => {
    const window = await openWindow({ args: ['--demo'] });
    await ask(window, 'claim.recompute', '{"claimId":1,"jobId":"mine"}');
    const told = window.webContents.send.mock.calls.map(([channel, event]) => ({
      channel: String(channel),
      ...(event as object),
    }));
    expect(told).toContainEqual(
      expect.objectContaining({ channel: 'footing:progress', jobId: 'mine', isFinished: true }),
    );
  });
});

describe('the menu', () => {
  const items = () => {
    const [[menu = []] = []] = fake.Menu.setApplicationMenu.mock.calls;
    return menu.flatMap(({ submenu = [] }) => submenu);
  };

  it('names what it does, and the keys for it', async () => {
    const window = await openWindow();
    expect(items().filter(({ label, role }) => label === undefined && role !== undefined)).toEqual([]);
    const find = items().find(({ accelerator }) => accelerator === 'CmdOrCtrl+K');
    find?.click?.();
    expect(window.webContents.sendInputEvent).toHaveBeenCalledWith(
      expect.objectContaining({ type: 'keyDown', keyCode: 'K' }),
    );
    items()
      .find(({ accelerator }) => accelerator === 'CmdOrCtrl+P')
      ?.click?.();
    expect(window.webContents.print).toHaveBeenCalledOnce();
  });

  it.each([
    { development: '', isPackaged: false, hasTools: false },
    { development: '1', isPackaged: false, hasTools: true },
    { development: '1', isPackaged: true, hasTools: false },
  ])('has developer tools in development only: %o', async ({ development, isPackaged, hasTools }) => {
    vi.stubEnv('FOOTING_DEVELOPMENT', development);
    const { options } = await openWindow({ isPackaged });
    expect(options.webPreferences['devTools']).toBe(hasTools);
    expect(items().some(({ role }) => role === 'toggleDevTools')).toBe(hasTools);
    const filter = fake.session.defaultSession.handlers.get('request') as (details: object, answer: unknown) => void;
    const answer = vi.fn();
    filter({ url: 'devtools://devtools/bundled/inspector.html' }, answer);
    expect(answer).toHaveBeenCalledWith({ cancel: !hasTools });
  });
});

describe('a second start', () => {
  it('brings the window forward', async () => {
    const window = await openWindow();
    fake.app.emit('second-instance', {}, ['electron', at('.')], home);
    await vi.waitFor(() => expect(window.focus).toHaveBeenCalledOnce());
    expect(window.webContents.reload).not.toHaveBeenCalled();
  });

  it('opens the project it was started with in the first instance', async () => {
    const window = await openWindow();
    const path = join(home, 'review.footing');
    await createProject(window, path);
    await ask(window, 'project.close', '{}');
    fake.app.emit('second-instance', {}, ['electron', at('.'), '--project', 'review.footing'], home);
    await vi.waitFor(() => expect(window.webContents.reload).toHaveBeenCalledOnce());
    await expect(ask(window, 'session.get', '{}')).resolves.toMatchObject({ ok: true, value: { project: { path } } });
  });
});

describe('the end', () => {
  it('comes when the window is closed, and waits until the project is', async () => {
    const window = await openWindow();
    const path = join(home, 'review.footing');
    await createProject(window, path);
    fake.app.emit('window-all-closed');
    expect(fake.app.quit).toHaveBeenCalledOnce();
    await quit();
    // Somebody else can write to it now.
    const second = await openWindow();
    await expect(ask(second, 'project.open', JSON.stringify({ path }))).resolves.toMatchObject({
      ok: true,
      value: { isReadOnly: false },
    });
  });

  it('is asked for once, however often it is asked', async () => {
    await openWindow();
    const events = [1, 2, 3].map(() => ({ preventDefault: vi.fn() }));
    for (const event of events) fake.app.emit('before-quit', event);
    for (const event of events) expect(event.preventDefault).toHaveBeenCalledOnce();
    await vi.waitFor(() => expect(fake.app.quit).toHaveBeenCalledOnce());
  });
});

describe('the preload script', () => {
  /** Runs it as a sandbox does: one script, with nothing to require but Electron. */
  function preload() {
    const exposed: Record<string, WindowBridge> = {};
    const listeners = new Map<string, (event: unknown, value: unknown) => void>();
    const ipcRenderer = {
      invoke: vi.fn((channel: string, _payload: unknown) => Promise.resolve(`answer to ${channel}`)),
      on: (channel: string, listener: (event: unknown, value: unknown) => void) =>
        void listeners.set(channel, listener),
      off: (channel: string) => void listeners.delete(channel),
    };
    const contextBridge = { exposeInMainWorld: (name: string, value: WindowBridge) => void (exposed[name] = value) };
    const require = (name: string) => {
      if (name !== 'electron') throw new Error(`a sandboxed preload cannot require ${name}`);
      return { ipcRenderer, contextBridge };
    };
    runInNewContext(readFileSync(at('out/preload/preload.cjs'), 'utf8'), {
      require,
      exports: {},
      module: { exports: {} },
    });
    const { footing, ...others } = exposed;
    if (!footing) throw new Error('nothing was exposed');
    return { footing, others, ipcRenderer, listeners };
  }

  it('exposes one verb for each request, and no way to name another', async () => {
    const { footing, others, ipcRenderer } = preload();
    expect(others).toEqual({});
    expect(Object.keys(footing).sort()).toEqual(['onProgress', 'verbs']);
    expect(Object.keys(footing.verbs)).toEqual([...requestNames]);
    for (const name of requestNames) {
      await expect(footing.verbs[name]('{}')).resolves.toBe(`answer to footing:request:${name}`);
      expect(ipcRenderer.invoke).toHaveBeenLastCalledWith(`footing:request:${name}`, '{}');
    }
  });

  it('tells progress without the event that carried it', () => {
    const { footing, listeners } = preload();
    const listener = vi.fn();
    const stop = footing.onProgress(listener);
    listeners.get('footing:progress')?.({ sender: 'secret' }, { jobId: 'a' });
    expect(listener).toHaveBeenCalledExactlyOnceWith({ jobId: 'a' });
    stop();
    expect(listeners.size).toBe(0);
  });
});

describe('the package', () => {
  it('is to be made with the fuses that close Electron for everything but the app', () => {
    const fuses: unknown = JSON.parse(readFileSync(at('packaging/fuses.json'), 'utf8'));
    expect(fuses).toMatchObject({
      runAsNode: false,
      enableNodeOptionsEnvironmentVariable: false,
      enableNodeCliInspectArguments: false,
      onlyLoadAppFromAsar: true,
      enableEmbeddedAsarIntegrityValidation: true,
      grantFileProtocolExtraPrivileges: false,
    });
  });
});
