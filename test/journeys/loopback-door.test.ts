import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { Page } from 'playwright-core';
import { describe, expect, it, onTestFinished } from 'vitest';
import { browser, freshFolder } from '../helpers/browser.ts';
import { startLoopback, type LoopbackProcess } from '../helpers/loopback.ts';

/** A running host and a page that has not been anywhere yet. */
async function setUp(): Promise<{ host: LoopbackProcess; page: Page }> {
  const host = await startLoopback(freshFolder('door'));
  const context = await (await browser()).newContext();
  onTestFinished(async () => {
    await context.close();
    await host.stop();
  });
  return { host, page: await context.newPage() };
}

/** A page of somebody else on this machine: same site for the browser, another origin. */
async function strangersPage(): Promise<string> {
  const server = createServer((_request, response) => {
    response.writeHead(200, { 'content-type': 'text/html' }).end('<!doctype html><title>Somebody else</title>');
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  onTestFinished(() => {
    server.closeAllConnections();
    server.close();
  });
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}/`;
}

describe('the door of the loopback host, seen from a browser', () => {
  it('leads in, leaves no token behind, and stays open for this browser only', async () => {
    const { host, page } = await setUp();
    const response = await page.goto(host.firstAddress);
    expect(response?.status()).toBe(200);
    expect(page.url()).toBe(`${host.origin}/`);
    await page.reload();
    expect(await page.title()).toContain('Footing');
    expect(await page.evaluate(() => document.cookie)).toBe('');

    const stranger = await (await browser()).newContext();
    onTestFinished(() => stranger.close());
    const other = await stranger.newPage();
    expect((await other.goto(host.firstAddress))?.status()).toBe(403);
    expect((await other.goto(host.origin))?.status()).toBe(403);

    // Whoever is in already finds the way on from the used address.
    expect((await page.goto(host.firstAddress))?.status()).toBe(403);
    await page.getByRole('link', { name: 'go on there' }).click();
    await page.waitForURL(`${host.origin}/`);
  });

  it('answers its own page, and no page of somebody else in the same browser', async () => {
    const { host, page } = await setUp();
    await page.goto(host.firstAddress);
    const ask = (origin: string) =>
      page.evaluate(async (address) => {
        const init = { method: 'POST', headers: { 'content-type': 'application/json' }, body: '{}' };
        return fetch(`${address}/request/session.get`, { ...init, credentials: 'include' }).then(
          (response) => response.status,
          () => 'no answer',
        );
      }, origin);
    expect(await ask(host.origin)).toBe(200);

    await page.goto(await strangersPage());
    expect(await ask(host.origin)).toBe('no answer');
    // Even without asking first: a plain form with the cookie, a script, a frame, a stream.
    const seen = await page.evaluate(async (address) => {
      const form = await fetch(`${address}/request/session.get`, {
        method: 'POST',
        body: '{}',
        mode: 'no-cors',
        credentials: 'include',
      }).then(
        ({ type }) => type,
        () => 'no answer',
      );
      const loads = (element: HTMLScriptElement | HTMLImageElement) =>
        new Promise<boolean>((resolve) => {
          element.onload = () => resolve(true);
          element.onerror = () => resolve(false);
          element.src = `${address}/`;
          document.head.append(element);
        });
      const events = new EventSource(`${address}/progress`, { withCredentials: true });
      const stream = await new Promise<string>((resolve) => {
        events.onopen = () => resolve('open');
        events.onerror = () => resolve('refused');
      });
      events.close();
      return { form, script: await loads(document.createElement('script')), stream };
    }, host.origin);
    expect(seen).toEqual({ form: 'no answer', script: false, stream: 'refused' });
  });

  it('says so when the program behind the page has ended, and keeps what it shows', async () => {
    const { host, page } = await setUp();
    await page.goto(host.firstAddress);
    await page.getByRole('main').waitFor();
    expect((await host.stop()).exitStatus).toBe(0);
    await page.getByText('Start Footing again').waitFor();
    expect(await page.getByRole('main').isVisible()).toBe(true);
  });
});
