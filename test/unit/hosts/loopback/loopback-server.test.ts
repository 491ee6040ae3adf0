import { mkdtempSync, mkdirSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { get, type IncomingMessage } from 'node:http';
import { connect } from 'node:net';
import { networkInterfaces, tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { requestNames } from '../../../../src-main/contract/request-names.ts';
import { startLoopbackServer, type LoopbackServer } from '../../../../src-main/hosts/loopback/loopback-server.ts';
import { payloadLimitBytes } from '../../../../src-main/hosts/payload-limit.ts';
import { fakeCore, type FakeCore } from '../../../helpers/fake-core.ts';
import { enter, send } from '../../../helpers/http-client.ts';

let folder: string;
let rendererDirectory: string;
let core: FakeCore;
let server: LoopbackServer;

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'footing-loopback-'));
  rendererDirectory = join(folder, 'renderer');
  mkdirSync(join(rendererDirectory, 'assets'), { recursive: true });
  writeFileSync(join(rendererDirectory, 'index.html'), '<!doctype html><title>Screens</title>');
  writeFileSync(join(rendererDirectory, 'assets', 'index-1a.js'), 'export {};');
  writeFileSync(join(rendererDirectory, 'assets', 'paper.css'), 'body {}');
  writeFileSync(join(rendererDirectory, 'assets', 'serif.woff2'), 'font');
  writeFileSync(join(rendererDirectory, 'assets', 'build.log'), 'not for serving');
  writeFileSync(join(folder, 'secret.html'), 'secret');
  symlinkSync(join(folder, 'secret.html'), join(rendererDirectory, 'link.html'));
});
afterAll(() => rmSync(folder, { recursive: true }));

beforeEach(async () => {
  core = fakeCore();
  server = await startLoopbackServer({ core, rendererDirectory });
});
afterEach(() => server.close());

/** A browser that has been let in: knows its cookie and tells its origin. */
async function insider() {
  const cookie = await enter(server.firstAddress);
  const headers = { cookie, origin: server.origin, 'content-type': 'application/json' };
  return {
    cookie,
    headers,
    get: (path: string, more = {}) => send(server.origin, { path, headers: { cookie, ...more } }),
    post: (path: string, body: string | Buffer, more = {}) =>
      send(server.origin, { path, method: 'POST', headers: { ...headers, ...more }, body }),
  };
}

describe('the door', () => {
  it('lets the first browser in once, with a cookie that scripts and other sites do not get', async () => {
    const token = new URL(server.firstAddress).searchParams.get('token') ?? '';
    expect(Buffer.from(token, 'base64url')).toHaveLength(32);
    const first = await send(server.firstAddress);
    expect(first.status).toBe(303);
    expect(first.headers.location).toBe('/');
    const [cookie, ...others] = first.headers['set-cookie'] ?? [];
    expect(others).toEqual([]);
    expect(cookie?.split('; ').slice(1)).toEqual(['Path=/', 'HttpOnly', 'SameSite=Strict']);
    expect(cookie).not.toContain(token);

    const second = await send(server.firstAddress);
    expect(second.status).toBe(403);
    expect(second.headers['set-cookie']).toBeUndefined();
    expect(second.body).toContain('has been used already');
  });

  it.each(['/enter', '/enter?token=', '/enter?token=AAAA', `/enter?token=${'A'.repeat(43)}`])(
    'refuses %s',
    async (path) => {
      const answer = await send(server.origin, { path });
      expect(answer.status).toBe(403);
      expect(answer.headers['set-cookie']).toBeUndefined();
      // A wrong try does not use up the right token.
      expect((await send(server.firstAddress)).status).toBe(303);
    },
  );

  it.each(['/', '/index.html', '/assets/index-1a.js', '/progress', '/request/session.get'])(
    'shows %s to nobody without the cookie',
    async (path) => {
      for (const cookie of ['', 'footing=1', `footing-${new URL(server.origin).port}=wrong`]) {
        const answer = await send(server.origin, { path, headers: { cookie } });
        expect(answer.status).toBe(403);
        expect(answer.body).toContain('has not been let in');
      }
    },
  );

  it.each(['footing.example', 'localhost', '127.0.0.1', '127.0.0.1:1', '[::1]'])(
    'refuses the Host %s',
    async (host) => {
      const { cookie } = await insider();
      const { port } = new URL(server.origin);
      for (const foreign of [host, `${host}:${port}`].filter((one) => `http://${one}` !== server.origin)) {
        const answer = await send(server.origin, { path: '/', headers: { host: foreign, cookie } });
        expect(answer.status, foreign).toBe(403);
      }
    },
  );

  it('refuses what another page makes the browser ask for, even with the cookie', async () => {
    const { get } = await insider();
    expect((await get('/', { 'sec-fetch-site': 'cross-site' })).status).toBe(403);
    // Pages of other ports of this machine are of the same site, but not of the same origin.
    expect((await get('/progress', { 'sec-fetch-site': 'same-site' })).status).toBe(403);
    expect((await get('/', { 'sec-fetch-site': 'none' })).status).toBe(200);
    expect((await get('/', { 'sec-fetch-site': 'same-origin' })).status).toBe(200);
  });

  it('listens on 127.0.0.1 only', async () => {
    const { port } = new URL(server.origin);
    const own = Object.values(networkInterfaces()).flatMap((list) => list ?? []);
    const others = ['::1', '127.0.0.2', ...own.map(({ address }) => address)].filter(
      (address) => address !== '127.0.0.1',
    );
    for (const host of others) {
      const reached = await new Promise<boolean>((resolve) => {
        const socket = connect({ host, port: Number(port), timeout: 2000 });
        const end = (isReached: boolean) => {
          socket.destroy();
          resolve(isReached);
        };
        socket.on('connect', () => end(true));
        socket.on('error', () => end(false));
        socket.on('timeout', () => end(false));
      });
      expect(reached, host).toBe(false);
    }
  });
});

describe('the pages', () => {
  it.each([
    ['/', 'text/html; charset=utf-8'],
    ['/index.html', 'text/html; charset=utf-8'],
    ['/assets/index-1a.js', 'text/javascript; charset=utf-8'],
    ['/assets/paper.css', 'text/css; charset=utf-8'],
    ['/assets/serif.woff2', 'font/woff2'],
  ])('serves %s as %s', async (path, contentType) => {
    const { get } = await insider();
    const answer = await get(path);
    expect(answer.status).toBe(200);
    expect(answer.headers['content-type']).toBe(contentType);
  });

  it('closes every page in on itself', async () => {
    const { get } = await insider();
    for (const answer of [await get('/'), await get('/nothing'), await send(server.origin)]) {
      const { headers } = answer;
      expect(String(headers['content-security-policy']).split('; ')).toEqual([
        "default-src 'none'",
        "script-src 'self'",
        "style-src 'self'",
        "img-src 'self' data: blob:",
        "font-src 'self'",
        "connect-src 'self'",
        "form-action 'none'",
        "frame-ancestors 'none'",
        "base-uri 'none'",
      ]);
      expect(headers['x-content-type-options']).toBe('nosniff');
      expect(headers['cache-control']).toBe('no-store');
      expect(headers['referrer-policy']).toBe('no-referrer');
      expect(headers['cross-origin-opener-policy']).toBe('same-origin');
      expect(headers['cross-origin-resource-policy']).toBe('same-origin');
      expect(Object.keys(headers).filter((name) => name.startsWith('access-control-'))).toEqual([]);
    }
  });

  it.each([
    '/../secret.html',
    '/assets/../../secret.html',
    '/%2e%2e/secret.html',
    '/..%2fsecret.html',
    '/assets/..\\..\\secret.html',
    '//secret.html',
    '/link.html',
    '/assets',
    '/assets/',
    '/assets/build.log',
    '/index.html%00.js',
  ])('has nothing at %s', async (path) => {
    const { get } = await insider();
    const answer = await get(path);
    expect(answer.status).toBe(404);
    expect(answer.body).not.toContain('secret');
  });

  it('answers HEAD without a body and refuses every other way to ask', async () => {
    const { headers } = await insider();
    const head = await send(server.origin, { path: '/', method: 'HEAD', headers });
    expect([head.status, head.body]).toEqual([200, '']);
    for (const method of ['PUT', 'DELETE', 'OPTIONS', 'POST']) {
      expect((await send(server.origin, { path: '/', method, headers })).status, method).toBe(405);
    }
  });
});

describe('the requests', () => {
  it('carries every request of the contract to the core and its answer back', async () => {
    const { post } = await insider();
    for (const name of requestNames) {
      const answer = await post(`/request/${name}`, '{"title":"Δ"}');
      expect(answer.status).toBe(200);
      expect(answer.headers['content-type']).toBe('application/json; charset=utf-8');
      expect(JSON.parse(answer.body)).toEqual({ ok: true, value: { name, input: { title: 'Δ' } } });
    }
    expect(core.handled.map(({ name }) => name)).toEqual([...requestNames]);
  });

  it('refuses a request that does not come from its own page', async () => {
    const { post, cookie } = await insider();
    const { port } = new URL(server.origin);
    for (const origin of ['https://footing.example', `http://localhost:${port}`, 'http://127.0.0.1:1', 'null', '']) {
      expect((await post('/request/session.get', '{}', { origin })).status, origin).toBe(403);
    }
    const headers = { cookie, 'content-type': 'application/json' };
    expect(
      (await send(server.origin, { path: '/request/session.get', method: 'POST', headers, body: '{}' })).status,
    ).toBe(403);
    expect(core.handled).toEqual([]);
  });

  it.each(['/request/session', '/request/constructor', '/request/', '/request/session.get/', '/request/__proto__'])(
    'knows no request at %s',
    async (path) => {
      const { post } = await insider();
      expect((await post(path, '{}')).status).toBe(404);
      expect(core.handled).toEqual([]);
    },
  );

  it('wants a POST of JSON', async () => {
    const { get, post } = await insider();
    expect((await get('/request/session.get')).status).toBe(405);
    for (const type of ['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data']) {
      expect((await post('/request/session.get', '{}', { 'content-type': type })).status).toBe(415);
    }
    for (const body of ['', '{', 'undefined', Buffer.from([0x22, 0xff, 0x22])]) {
      const answer = await post('/request/session.get', body);
      expect(JSON.parse(answer.body)).toMatchObject({
        ok: false,
        error: { code: 'request-not-json', where: 'session.get' },
      });
    }
    expect(core.handled).toEqual([]);
  });

  it('takes an input up to the limit of its request and not a byte more', async () => {
    const { post } = await insider();
    const limit = payloadLimitBytes('note.add');
    const text = (bytes: number) => JSON.stringify('a'.repeat(bytes - 2));
    expect((await post('/request/note.add', text(limit))).status).toBe(200);
    const refused = await post('/request/note.add', text(limit + 1));
    expect(refused.status).toBe(413);
    expect(JSON.parse(refused.body)).toMatchObject({
      ok: false,
      error: { code: 'request-too-large', where: 'note.add' },
    });
    expect(core.handled).toHaveLength(1);
  });

  it('lets files of 64 MiB through, and only with the requests that carry files', async () => {
    const carriers = requestNames.filter((name) => payloadLimitBytes(name) > 90_000_000);
    expect(carriers).toEqual(['source.save', 'data.preview', 'data.import']);
    const { post } = await insider();
    const file = JSON.stringify({ bytes: 'A'.repeat(90_000_000) });
    expect((await post('/request/data.import', file)).status).toBe(200);
    expect((await post('/request/project.create', file)).status).toBe(413);
  });

  it('says that something is wrong when the core breaks its promise, and goes on', async () => {
    const complaint = vi.spyOn(console, 'error').mockImplementation(() => undefined);
    core.handle = () => Promise.reject(new Error('a path of this machine'));
    const { post, get } = await insider();
    const answer = await post('/request/session.get', '{}');
    expect(answer.status).toBe(500);
    expect(answer.body).not.toContain('a path of this machine');
    expect(complaint).toHaveBeenCalledOnce();
    complaint.mockRestore();
    expect((await get('/')).status).toBe(200);
  });
});

describe('progress', () => {
  const step = { jobId: 'a', label: 'Sweep of claim 1', shareDone: 0.5, secondsLeft: 3, isFinished: false };

  it('reaches every open page as server-sent events', async () => {
    const { cookie } = await insider();
    const open = () =>
      new Promise<IncomingMessage>((resolve) => get(`${server.origin}/progress`, { headers: { cookie } }, resolve));
    const pages = [await open(), await open()];
    const heard = pages.map((page) => {
      let text = '';
      page.on('data', (chunk: Buffer) => (text += chunk.toString()));
      return () => text;
    });
    expect(pages[0]?.headers['content-type']).toBe('text/event-stream');
    core.tell(step);
    for (const text of heard) await vi.waitFor(() => expect(text()).toContain(`data: ${JSON.stringify(step)}\n\n`));

    const ended = pages.map((page) => new Promise((resolve) => page.on('end', resolve)));
    await server.close();
    await Promise.all(ended);
  });
});

describe('the end', () => {
  it('finishes what is under way and takes nothing new', async () => {
    let finish: (value: string) => void = () => undefined;
    core = fakeCore((name) =>
      name === 'claim.recompute' ? new Promise<string>((resolve) => (finish = resolve)) : 'quick',
    );
    const slow = await startLoopbackServer({ core, rendererDirectory });
    const cookie = await enter(slow.firstAddress);
    const headers = { cookie, origin: slow.origin, 'content-type': 'application/json', connection: 'keep-alive' };
    const answer = send(slow.origin, { path: '/request/claim.recompute', method: 'POST', headers, body: '{}' });
    await vi.waitFor(() => expect(core.handled).toHaveLength(1));

    let isClosed = false;
    const closed = slow.close().then(() => (isClosed = true));
    await expect(send(slow.origin, { headers })).rejects.toThrow('ECONNREFUSED');
    expect(isClosed).toBe(false);
    finish('done');
    expect(JSON.parse((await answer).body)).toEqual({ ok: true, value: 'done' });
    await closed;
  });

  it('does not wait for ever', async () => {
    core = fakeCore(() => new Promise(() => undefined));
    const stuck = await startLoopbackServer({ core, rendererDirectory, graceMs: 50 });
    const cookie = await enter(stuck.firstAddress);
    const headers = { cookie, origin: stuck.origin, 'content-type': 'application/json' };
    const answer = send(stuck.origin, { path: '/request/claim.sweep', method: 'POST', headers, body: '{}' });
    const refused = expect(answer).rejects.toThrow();
    await vi.waitFor(() => expect(core.handled).toHaveLength(1));
    await stuck.close();
    await refused;
  });
});
