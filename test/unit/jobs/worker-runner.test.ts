import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { ProgressEvent } from '../../../src-main/contract/events.ts';
import type { JobRunner } from '../../../src-main/jobs/job.ts';
import { workerRunner } from '../../../src-main/jobs/worker-runner.ts';

const budget = (draws: number) => ({
  warmingK: { mean: 1, sd: 0.1 },
  forcingWm2: { mean: 2.2, sd: 0.4 },
  uptakeWm2: { mean: 0.6, sd: 0.2 },
  doublingWm2: { mean: 3.9, sd: 0.3 },
  draws,
  seed: 1,
});
const longDraws = 10_000_000;

describe('jobs in a worker', () => {
  let runner: JobRunner;
  let events: ProgressEvent[];
  beforeEach(() => {
    runner = workerRunner(fileURLToPath(new URL('../../../src-main/worker.ts', import.meta.url)));
    events = [];
    runner.onProgress((event) => events.push(event));
  });
  afterEach(() => runner.close());

  const firstShare = () =>
    new Promise<void>((resolve) => {
      const stop = runner.onProgress(({ shareDone }) => {
        if (shareDone === 0) return;
        stop();
        resolve();
      });
    });

  it('answers what the pure function answers', async () => {
    const { methods } = await import('../../../src-main/jobs/methods.ts');
    const answer = await runner.run('energy-budget', budget(100_000), { label: 'Budget' });
    expect(answer).toEqual(methods['energy-budget'](budget(100_000), () => undefined));
  });

  it('tells how far it is, and that it has finished', async () => {
    await runner.run('energy-budget', budget(2_000_000), { jobId: 'a', label: 'Budget' });
    expect(events[0]).toMatchObject({ jobId: 'a', label: 'Budget', shareDone: 0, isFinished: false });
    expect(events.at(-1)).toMatchObject({ shareDone: 1, isFinished: true, secondsLeft: null });
    expect(events.filter(({ shareDone }) => shareDone > 0 && shareDone < 1).length).toBeGreaterThan(0);
  });

  it('carries errors over with their fields', async () => {
    const columns = [
      [1, 2, 3, 4],
      [2, 4, 6, 8],
    ];
    const job = runner.run(
      'regression',
      { x: columns, y: [1, 2, 3, 5], intercept: true, covariance: { kind: 'classical' } },
      { label: 'Fit' },
    );
    await expect(job).rejects.toMatchObject({ name: 'NumericError', fields: { code: 'rank-deficient' } });
  });

  it('stops at once when it is cancelled, and works on afterwards', async () => {
    const job = runner.run('energy-budget', budget(longDraws), { jobId: 'long', label: 'Long' });
    const outcome = expect(job).rejects.toMatchObject({ name: 'JobCancelled' });
    await firstShare();
    expect(runner.cancel('long')).toBe(true);
    await outcome;
    expect(events.at(-1)?.isFinished).toBe(true);
    expect((await runner.run('energy-budget', budget(1000), { label: 'Short' })).random.nDraws).toBe(1000);
  });

  it('cancels a job that is still waiting, without touching the one that runs', async () => {
    const first = runner.run('energy-budget', budget(1_000_000), { jobId: 'first', label: 'First' });
    const second = expect(
      runner.run('energy-budget', budget(longDraws), { jobId: 'second', label: 'Second' }),
    ).rejects.toThrow('Second was cancelled');
    expect(runner.cancel('second')).toBe(true);
    await second;
    expect((await first).random.nDraws).toBe(1_000_000);
    expect(runner.cancel('first')).toBe(false);
  });

  it('starts nothing more once it is closed', async () => {
    const long = expect(runner.run('energy-budget', budget(longDraws), { label: 'Long' })).rejects.toThrow('cancelled');
    const closing = runner.close();
    await expect(runner.run('energy-budget', budget(longDraws), { label: 'Late' })).rejects.toThrow(
      'Late was cancelled',
    );
    await Promise.all([long, closing]);
  });
});
