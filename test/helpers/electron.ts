import { fileURLToPath } from 'node:url';
import { _electron, type ElectronApplication } from 'playwright-core';
import { expect, onTestFinished, type TestContext } from 'vitest';
import { usableElectron } from '../../src-main/hosts/launch/usable-electron.ts';
import { freshFolder } from './browser.ts';
import { watchPage, type Stage, type StageOptions } from './stage.ts';

export interface ElectronStage extends Stage {
  app: ElectronApplication;
}

const application = fileURLToPath(new URL('../..', import.meta.url));

/** Skips a test, and says why, where there is no Electron to run it in. */
export function needsElectron({ skip, task }: TestContext): void {
  const electron = usableElectron();
  if (electron.isUsable) return;
  console.log(`skipped in Electron: ${task.name}, because ${electron.problem}`);
  skip(`no Electron to run it in: ${electron.problem}`);
}

/** Footing in a real window of its own. At the end of the test it is closed, and the test fails if anything went wrong. */
export async function openElectronStage({
  home = freshFolder('home'),
  isDemo = false,
  projectPath,
}: StageOptions = {}): Promise<ElectronStage> {
  const electron = usableElectron();
  if (!electron.isUsable) throw new Error(`no Electron: ${electron.problem}`);
  const app = await _electron.launch({
    executablePath: electron.program,
    args: [
      application,
      ...(isDemo ? ['--demo'] : []),
      ...(projectPath === undefined ? [] : [`--project=${projectPath}`]),
    ],
    env: { ...process.env, FOOTING_HOME: home },
  });
  const page = await app.firstWindow();
  const problems = watchPage(page, (url) => /^(data|blob):/.test(url) || url.startsWith('footing://app/'));

  let isOpen = true;
  const close = async () => {
    if (isOpen) await app.close();
    isOpen = false;
  };
  onTestFinished(async () => {
    await close();
    expect(problems).toEqual([]);
  });
  return { app, page, home, problems, close };
}
