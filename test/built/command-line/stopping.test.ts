import { readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { uniformInt } from 'pure-rand/distribution/uniformInt';
import { beforeAll, describe, expect, it } from 'vitest';
import { footing, footingHere, jsonOf, type ChildOptions } from '../../helpers/command-line.ts';
import { maunaLoaFile } from '../../helpers/invented-files.ts';
import { copyOf, prepareReview, project, workingFolder } from '../../helpers/review-folder.ts';

const guess = (mean: number, sd: number) => ({ mean, sd });
/** Many seconds of work. */
const longRequest = {
  method: 'energy-budget',
  warmingK: guess(1, 0.1),
  forcingWm2: guess(2.2, 0.4),
  uptakeWm2: guess(0.6, 0.2),
  doublingWm2: guess(3.9, 0.3),
  draws: 10_000_000,
  seed: 1,
};
const sentence = 'expected to come to its end, but found that it was stopped. What it had stored before is kept';

describe('a command that is stopped', () => {
  const prepared = workingFolder();
  beforeAll(() => prepareReview(prepared));

  /** Runs a command and presses Ctrl-C after a while; with how long it went on after that. */
  async function interrupted(folder: string, args: string[], afterMs: number, input: string | null = '') {
    let pressedAt = NaN;
    const hold: ChildOptions['hold'] = (child) => {
      if (input !== null) child.stdin.end(input);
      setTimeout(() => {
        pressedAt = performance.now();
        child.kill('SIGINT');
      }, afterMs);
    };
    const ran = await footing(folder, args, { hold });
    return { ...ran, wentOnMs: performance.now() - pressedAt };
  }

  it('by Ctrl-C in the middle of a computation ends at once, in a sentence', async () => {
    const folder = copyOf(prepared);
    const request = JSON.stringify([longRequest, longRequest, longRequest]);
    const ran = await interrupted(folder, ['compute', '-'], 1500, request);
    expect(ran.status).toBe(130);
    expect(ran.errors).toBe(`footing compute: ${sentence}; nothing is half-written.\n`);
    expect(JSON.parse(ran.out)).toMatchObject({ ok: false, error: { kind: 'Cancelled', code: 'interrupted' } });
    expect(ran.wentOnMs).toBeLessThan(1000);
  });

  it('by Ctrl-C while it waits for standard input ends at once too', async () => {
    const ran = await interrupted(copyOf(prepared), ['compute', '-'], 1500, null);
    expect(ran.status).toBe(130);
    expect(ran.errors).toContain(sentence);
    expect(ran.wentOnMs).toBeLessThan(1000);
  });

  it('by Ctrl-C in the middle of a review keeps the project whole and lets go of it', async () => {
    const folder = copyOf(prepared);
    const before = readdirSync(folder).sort();
    // Many claims, so that there is something to stop.
    for (let claim = 0; claim < 30; claim++) await jsonOf(footingHere, folder, ['claim', project, 'claim.json']);
    const ran = await interrupted(folder, ['recompute', project], 700);
    expect(ran.status).toBe(130);
    expect(ran).toMatchObject({ out: '', errors: expect.stringContaining(`footing recompute: ${sentence}`) as string });
    expect(readdirSync(folder).sort()).toEqual(before);
    expect(await jsonOf(footingHere, folder, ['verify', project])).toMatchObject({ isSound: true });
    await jsonOf(footingHere, folder, ['note', project, 'On it goes.', '--claim', '1']);
  });

  it('by force at any moment of an import leaves a project that verifies', async () => {
    const folder = copyOf(prepared);
    const files = ['1', '2', '3', '4', '5', '6', '7', '8'].map((name) => `co2-${name}.txt`);
    for (const name of files) writeFileSync(join(folder, name), maunaLoaFile().replace('USE', name));
    const random = xoroshiro128plus(20260102);
    const start = performance.now();
    await footing(folder, ['series', project]);
    const startUpMs = performance.now() - start;
    let nKilled = 0;
    for (let attempt = 0; attempt < 5; attempt++) {
      const killAfterMs = Math.round(startUpMs * (uniformInt(random, 60, 140) / 100));
      const { status } = await footing(folder, ['import', project, ...files], {
        hold: (child) => void setTimeout(() => child.kill('SIGKILL'), killAfterMs),
      });
      if (status === null) nKilled += 1;
      const verified = await footingHere(folder, ['verify', project]);
      expect(verified, `killed after ${killAfterMs} ms`).toMatchObject({ status: 0 });
    }
    expect(nKilled).toBeGreaterThan(0);
    await jsonOf(footingHere, folder, ['note', project, 'On it goes.']);
  });
});
