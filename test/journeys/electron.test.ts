import { describe, expect, it } from 'vitest';
import { requestNames } from '../../src-main/contract/request-names.ts';
import { needsElectron, openElectronStage } from '../helpers/electron.ts';
import { recordToSignedFinding } from './flows/record-to-signed-finding.ts';

describe('Footing in a window of its own', () => {
  it('leads from two published files to a signed finding', async (context) => {
    needsElectron(context);
    await recordToSignedFinding(openElectronStage);
  });

  it('opens the worked example', async (context) => {
    needsElectron(context);
    const { page } = await openElectronStage({ isDemo: true });
    await expect.poll(() => page.evaluate(() => document.body.innerText), { timeout: 30_000 }).toMatch(/invented/i);
  });

  it('gives its page the verbs of the contract and nothing of Node', async (context) => {
    needsElectron(context);
    const { page } = await openElectronStage();
    const seen = await page.evaluate(() => ({
      address: location.href,
      verbs: Object.keys((window as unknown as { footing: { verbs: object } }).footing.verbs),
      node: ['require', 'process', 'module', 'Buffer', 'ipcRenderer'].filter((name) => name in window),
    }));
    expect(seen).toEqual({
      address: expect.stringMatching(/^footing:\/\/app\//) as string,
      verbs: [...requestNames],
      node: [],
    });
  });

  it('goes nowhere, opens nothing and fetches nothing', async (context) => {
    needsElectron(context);
    const { page, app, problems } = await openElectronStage();
    const before = page.url();
    const outcomes = await page.evaluate(async () => {
      const fetched = await fetch('https://footing.example/').then(
        () => 'answered',
        () => 'refused',
      );
      const opened = window.open('https://footing.example/');
      location.href = 'https://footing.example/';
      await new Promise((resolve) => setTimeout(resolve, 500));
      return { fetched, opened };
    });
    expect(outcomes).toEqual({ fetched: 'refused', opened: null });
    expect(page.url()).toBe(before);
    expect(app.windows()).toHaveLength(1);
    // What was refused was said on the console, which is what this test is about.
    problems.length = 0;
  });

  it('keeps to its rules in the running program', async (context) => {
    needsElectron(context);
    const { app } = await openElectronStage();
    const rules = await app.evaluate(({ BrowserWindow, session }) => {
      const [window] = BrowserWindow.getAllWindows();
      return {
        isSpellChecked: session.defaultSession.isSpellCheckerEnabled(),
        hasDeveloperTools: window?.webContents.isDevToolsOpened(),
        title: window?.getTitle(),
      };
    });
    expect(rules).toEqual({
      isSpellChecked: false,
      hasDeveloperTools: false,
      title: expect.stringMatching(/Footing$/) as string,
    });
  });
});
