import { mkdirSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium as playwright, type Browser, type Page } from 'playwright-core';
import { afterAll, expect, onTestFinished } from 'vitest';
import { startLoopback } from './loopback.ts';
import { watchPage, type Stage, type StageOptions } from './stage.ts';

const cache = fileURLToPath(new URL('../../.cache/', import.meta.url));
/** Stands in for the browser from npm: the path of another Chromium, for a cross-check. */
const otherChromium = process.env['FOOTING_TEST_CHROMIUM'];

let started: Promise<Browser> | undefined;
afterAll(async () => {
  await (await started)?.close();
});

/** The browser of this test file, started when it is first needed. */
export function browser(): Promise<Browser> {
  started ??= startBrowser();
  return started;
}

async function startBrowser(): Promise<Browser> {
  return playwright.launch({
    executablePath: otherChromium ?? (await unpackedChromium()),
    // No sandbox: in containers the tests run as root, where it cannot be had. They open nothing but our own pages.
    args: ['--no-sandbox'],
  });
}

/** The browser from npm unpacks itself into TMPDIR and takes whatever version lies there: each version gets a folder. */
async function unpackedChromium(): Promise<string> {
  const before = process.env['TMPDIR'];
  process.env['TMPDIR'] = join(cache, `chromium-${packedVersion()}`);
  mkdirSync(process.env['TMPDIR'], { recursive: true });
  try {
    const { default: chromium } = await import('@sparticuz/chromium');
    return await chromium.executablePath();
  } finally {
    if (before === undefined) delete process.env['TMPDIR'];
    else process.env['TMPDIR'] = before;
  }
}

/** Pinned exactly in our own manifest. */
function packedVersion(): string {
  const manifest = JSON.parse(readFileSync(new URL('../../package.json', import.meta.url), 'utf8')) as {
    devDependencies: Record<string, string>;
  };
  return manifest.devDependencies['@sparticuz/chromium'] ?? '';
}

/**
 * A window of Footing in a fresh browser context, over a loopback host of its own. At the end of the test both are
 * closed, and the test fails if anything went wrong behind its back.
 */
export async function openBrowserStage({
  home = freshFolder('home'),
  isDemo = false,
  projectPath,
  width = 1440,
  height = 900,
}: StageOptions = {}): Promise<Stage> {
  const host = await startLoopback(home, [
    ...(isDemo ? ['--demo'] : []),
    ...(projectPath === undefined ? [] : [`--project=${projectPath}`]),
  ]);
  const context = await (await browser()).newContext({ viewport: { width, height }, reducedMotion: 'reduce' });
  context.setDefaultTimeout(20_000);
  const page = await context.newPage();
  const problems = watchPage(page, (url) => /^(data|blob):/.test(url) || new URL(url).origin === host.origin);

  let isOpen = true;
  const close = async () => {
    if (!isOpen) return;
    isOpen = false;
    await context.close();
    const { exitStatus, errors } = await host.stop();
    if (exitStatus !== 0 || errors !== '') problems.push(`the host ended with ${exitStatus}: ${errors}`);
  };
  onTestFinished(async ({ task }) => {
    if (task.result?.state === 'fail') await keepPicture(page, task.name);
    await close();
    expect(problems).toEqual([]);
  });
  await page.goto(host.firstAddress);
  return { page, home, problems, close };
}

/** A folder that goes away with the test. */
export function freshFolder(name: string): string {
  const folder = mkdtempSync(join(tmpdir(), `footing-${name}-`));
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

/** What the window showed when the test failed, in .cache/journeys. */
async function keepPicture(page: Page, testName: string): Promise<void> {
  if (page.isClosed()) return;
  const name = testName.toLowerCase().replaceAll(/[^a-z0-9]+/g, '-');
  await page.screenshot({ path: join(cache, 'journeys', `${name}.png`) });
}
