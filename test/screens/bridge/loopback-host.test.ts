import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { ProgressEvent } from '../../../src-main/contract/events.ts';
import { loopbackHost } from '../../../src-renderer/bridge/loopback-host.ts';

/** Stands in for the browser's event source, which happy-dom lacks. */
class FakeEventSource extends EventTarget {
  static last: FakeEventSource;
  readonly url: string;
  constructor(url: string) {
    super();
    this.url = url;
    FakeEventSource.last = this;
  }
}

const answers = (body: string, type = 'application/json') =>
  vi.fn(async (_url: string, _init?: RequestInit) => new Response(body, { headers: { 'content-type': type } }));

describe('loopbackHost', () => {
  beforeEach(() => vi.stubGlobal('EventSource', FakeEventSource));
  afterEach(() => vi.unstubAllGlobals());

  it('posts the input to the address of the request and gives back the answer', async () => {
    const fetch = answers('{"ok":true,"value":{}}');
    vi.stubGlobal('fetch', fetch);
    await expect(loopbackHost().send('project.close', '{"a":1}')).resolves.toBe('{"ok":true,"value":{}}');
    expect(fetch).toHaveBeenCalledExactlyOnceWith('/request/project.close', {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: '{"a":1}',
    });
  });

  it('rejects when the program behind the page is gone, and says so once', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('fetch failed')));
    const host = loopbackHost();
    const heard: boolean[] = [];
    host.onAbsence((isAway) => heard.push(isAway));
    await expect(host.send('session.get', '{}')).rejects.toThrow('fetch failed');
    await expect(host.send('session.get', '{}')).rejects.toThrow('fetch failed');
    expect(heard).toEqual([true]);
    FakeEventSource.last.dispatchEvent(new Event('open'));
    expect(heard).toEqual([true, false]);
  });

  it('takes a page of words for the end of the session, not for an answer', async () => {
    vi.stubGlobal('fetch', answers('<p>no</p>', 'text/html; charset=utf-8'));
    await expect(loopbackHost().send('session.get', '{}')).rejects.toThrow('no answer');
  });

  it('hands progress to every listener until it stops listening', () => {
    const host = loopbackHost();
    const event: ProgressEvent = { jobId: 'a', label: 'Sweep', shareDone: 0.5, secondsLeft: 2, isFinished: false };
    const heard: ProgressEvent[] = [];
    const stop = host.onProgress((one) => heard.push(one));
    expect(FakeEventSource.last.url).toBe('/progress');
    const send = () => FakeEventSource.last.dispatchEvent(new MessageEvent('message', { data: JSON.stringify(event) }));
    send();
    stop();
    send();
    expect(heard).toEqual([event]);
  });
});
