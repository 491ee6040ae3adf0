import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { effectScope, type EffectScope } from 'vue';
import { requestNames } from '../../../src-main/contract/request-names.ts';
import type { WindowBridge } from '../../../src-main/contract/window-bridge.ts';

/** A window bridge whose answers are given by hand, in any order. */
function bridgeByHand() {
  const asked: { name: string; inputJson: string; answer(json: string): void; fail(): void }[] = [];
  const ask = (name: string) => (inputJson: string) =>
    new Promise<string>((resolve, reject) => {
      asked.push({ name, inputJson, answer: resolve, fail: () => reject(new Error('refused')) });
    });
  const verbs = Object.fromEntries(requestNames.map((name) => [name, ask(name)])) as WindowBridge['verbs'];
  return { asked, bridge: { verbs, onProgress: () => () => undefined } satisfies WindowBridge };
}

const problem = { kind: 'InputError', code: 'c', where: 'w', expected: 'e', received: 'r', hint: 'h' } as const;
const good = (value: unknown) => JSON.stringify({ ok: true, value });

describe('the bridge', () => {
  let scope: EffectScope;
  beforeEach(() => {
    // The host of a window is chosen once; each test is a new window.
    vi.resetModules();
    scope = effectScope();
  });
  afterEach(() => {
    scope.stop();
    vi.unstubAllGlobals();
  });

  const open = async () => {
    const { asked, bridge } = bridgeByHand();
    vi.stubGlobal('footing', bridge);
    const { request, hostGone } = await import('../../../src-renderer/bridge/request.ts');
    const { useRequest } = await import('../../../src-renderer/bridge/use-request.ts');
    return { asked, request, hostGone, useRequest };
  };

  it('asks through the verb of the request, with plain JSON', async () => {
    const { asked, request } = await open();
    const answer = request('trail.list', { limit: 5, before: undefined });
    expect(asked[0]).toMatchObject({ name: 'trail.list', inputJson: '{"limit":5}' });
    asked[0]?.answer(good({ lines: [], hasMore: false }));
    await expect(answer).resolves.toEqual({ ok: true, value: { lines: [], hasMore: false } });
  });

  it('answers with a clear error when nobody answers', async () => {
    const { asked, request, hostGone } = await open();
    const answer = request('project.close', {});
    asked[0]?.fail();
    await expect(answer).resolves.toEqual({ ok: false, error: hostGone });
  });

  it('never lets a late answer overwrite a newer one', async () => {
    const { asked, useRequest } = await open();
    const trail = scope.run(() => useRequest('trail.list'));
    if (!trail) throw new Error('the scope has ended');
    const first = trail.run({ limit: 1 });
    const second = trail.run({ limit: 2 });
    asked[1]?.answer(good({ lines: [], hasMore: true }));
    await second;
    expect(trail.value.value).toEqual({ lines: [], hasMore: true });
    expect(trail.isRunning.value).toBe(false);
    asked[0]?.answer(good({ lines: [], hasMore: false }));
    await expect(first).resolves.toMatchObject({ ok: true, value: { hasMore: false } });
    expect(trail.value.value).toEqual({ lines: [], hasMore: true });
  });

  it('keeps the last good value beside an error and clears the error when it passes', async () => {
    const { asked, useRequest } = await open();
    const trail = scope.run(() => useRequest('trail.list'));
    if (!trail) throw new Error('the scope has ended');
    const answered = async (index: number, json: string) => {
      const run = trail.run({ limit: 1 });
      asked[index]?.answer(json);
      await run;
    };
    await answered(0, good({ lines: [], hasMore: false }));
    await answered(1, JSON.stringify({ ok: false, error: problem }));
    expect(trail.error.value).toEqual(problem);
    expect(trail.value.value).toEqual({ lines: [], hasMore: false });
    await answered(2, good({ lines: [], hasMore: true }));
    expect(trail.error.value).toBeNull();
  });

  it('leaves the state of a screen alone that is gone', async () => {
    const { asked, useRequest } = await open();
    const trail = scope.run(() => useRequest('trail.list'));
    if (!trail) throw new Error('the scope has ended');
    const run = trail.run({ limit: 1 });
    scope.stop();
    asked[0]?.answer(good({ lines: [], hasMore: false }));
    await run;
    expect(trail.value.value).toBeNull();
  });
});
