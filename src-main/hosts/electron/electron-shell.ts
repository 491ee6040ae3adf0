import { app, dialog, session, type BrowserWindow } from 'electron';
import { errorSentence } from '../../errors.ts';
import type { Core } from '../../handlers/handle.ts';
import { registerAppScheme, serveApp } from './app-protocol.ts';
import { applyContentsRules } from './contents-rules.ts';
import { readLaunchOptions, type LaunchOptions } from '../launch-options.ts';
import { installMenu } from './menu.ts';
import { openFirstProject } from '../open-first-project.ts';
import { openRequestChannels } from './request-channels.ts';
import { applySessionRules } from './session-rules.ts';
import { createWindow } from './window.ts';

export interface ElectronShellOptions {
  createCore: () => Core;
  rendererDirectory: string;
  preload: string;
}

/** Footing in a window of its own. */
export function startElectronShell(options: ElectronShellOptions): void {
  app.enableSandbox();
  // Nothing here needs the network: no name is looked up and no proxy asked for, whatever a page might try.
  app.commandLine.appendSwitch('host-resolver-rules', 'MAP * ~NOTFOUND');
  app.commandLine.appendSwitch('no-proxy-server');
  registerAppScheme();
  app.on('web-contents-created', (_event, contents) => applyContentsRules(contents));

  // A second instance would be refused the project file anyway; it hands its wish to the first and leaves.
  if (!app.requestSingleInstanceLock()) return app.quit();
  // Not awaited by the entry: Electron is not ready before its main module has run to the end.
  app
    .whenReady()
    .then(() => showFooting(options))
    .catch((error: unknown) => {
      dialog.showErrorBox('Footing could not start', error instanceof Error ? error.message : String(error));
      app.exit(1);
    });
}

async function showFooting({ createCore, rendererDirectory, preload }: ElectronShellOptions): Promise<void> {
  const isDevelopment = !app.isPackaged && process.env['FOOTING_DEVELOPMENT'] === '1';
  const core = createCore();
  let window: BrowserWindow | null = null;
  const ownWindow = () => window;
  closeCoreBeforeQuitting(core);
  app.on('window-all-closed', () => app.quit());
  app.on('second-instance', (_event, args, directory) => {
    void showFirstProject(core, readLaunchOptions(args.slice(1), directory, true)).then((hasOpened) => {
      if (hasOpened) window?.webContents.reload();
      if (window?.isMinimized()) window.restore();
      window?.focus();
    });
  });

  applySessionRules(session.defaultSession, isDevelopment);
  serveApp(session.defaultSession, rendererDirectory);
  openRequestChannels(core, ownWindow);
  installMenu(ownWindow, isDevelopment);
  await showFirstProject(core, readLaunchOptions(process.argv.slice(1), process.cwd(), true));
  window = createWindow(preload, isDevelopment);
}

/** True when the project that was asked for is open; a failure is shown, and the start screen is there to go on from. */
async function showFirstProject(core: Core, options: LaunchOptions): Promise<boolean> {
  const problem = await openFirstProject(core, options);
  if (problem) dialog.showErrorBox('Footing could not open the project', errorSentence(problem));
  return problem === null && (options.isDemo || options.projectPath !== null);
}

/** The project is closed, and the file whole, before the process ends. */
function closeCoreBeforeQuitting(core: Core): void {
  let closing: Promise<void> | null = null;
  let isClosed = false;
  app.on('before-quit', (event) => {
    if (isClosed) return;
    event.preventDefault();
    closing ??= core.close().finally(() => {
      isClosed = true;
      app.quit();
    });
  });
}
