import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { freshFolder, openBrowserStage } from '../helpers/browser.ts';
import { footingCommand } from '../helpers/footing-command.ts';
import { openClaim, section, stored } from './flows/steps.ts';

/** From the click to the sheet that says so, on a machine with other work to do. The core itself stops within 200 ms. */
const cancelledWithinMs = 3000;

/** Fifteen hundred invented years: over a million windows, each with an error that looks thirty years around. */
function longRecord(): string {
  const rows = Array.from({ length: 1500 }, (_, place) => {
    const anomalyK = 0.0004 * place + 0.2 * Math.sin(place / 60) + 0.05 * Math.sin(place * 1.7);
    return `${501 + place},${anomalyK.toFixed(3)}`;
  });
  return ['# Invented data: no measurement.', 'Year,Temperature anomaly (K)', ...rows, ''].join('\n');
}

function projectWithLongRecord(home: string): string {
  const folder = freshFolder('files');
  const project = join(folder, 'long.footing');
  const record = join(folder, 'long-record.csv');
  const claim = join(folder, 'claim.json');
  writeFileSync(record, longRecord());
  writeFileSync(
    claim,
    JSON.stringify({
      title: 'A slow rise',
      statement: { words: 'It has risen ever since.', quantity: 'trend', value: '0.004', unit: 'K per decade' },
      procedure: {
        kind: 'trend',
        seriesId: 'long-record',
        covariance: { kind: 'newey-west', lag: 30, smallSample: false },
      },
    }),
  );
  for (const command of [
    ['new', project, '--title', 'Long record', '--reviewer', 'Ada Brandvold'],
    ['import', project, record, '--quantity', 'temperature-anomaly', '--unit', 'K', '--as', 'long-record'],
    ['claim', project, claim],
  ]) {
    const { exitStatus, errors } = footingCommand(home, ...command);
    expect(exitStatus, errors).toBe(0);
  }
  return project;
}

describe('Long work', () => {
  it('says how far it is, can be cancelled, and leaves nothing behind', async () => {
    const home = freshFolder('home');
    const { page } = await openBrowserStage({ home, projectPath: projectWithLongRecord(home) });
    await openClaim(page, 'A slow rise');
    const robustness = section(page, 'Robustness');
    const trail = page.getByRole('navigation', { name: 'Project' }).getByRole('link', { name: /^Trail/ });
    const before = await trail.innerText();

    const sweep = robustness.getByRole('button', { name: 'Sweep the windows' });
    await robustness.getByText('It must be longer than the lag of the errors, 30 years.').waitFor();
    await expect(sweep.isDisabled()).resolves.toBe(true);
    await robustness.getByLabel('Shortest window (years)').fill('40');
    await sweep.click();
    const progress = page.getByRole('progressbar', { name: 'Sweeping the windows: claim 1' });
    const shareDone = async () => Number(await progress.getAttribute('value'));
    await expect.poll(shareDone).toBeGreaterThan(0.005);
    const early = await shareDone();
    await expect.poll(shareDone).toBeGreaterThan(early);
    await page.getByText(/^\d+ % · (about \d+ (s|min) left|almost done)$/).waitFor();

    // Nothing else waits for it.
    await page.getByLabel('Write a note').fill('Written meanwhile.');
    await stored(page, () => page.getByRole('button', { name: 'Add note' }).click());
    await expect(progress.isVisible()).resolves.toBe(true);

    const cancelledAt = Date.now();
    await page.getByRole('button', { name: 'Cancel' }).click();
    await robustness.getByText('Cancelled. Nothing was changed.').waitFor();
    expect(Date.now() - cancelledAt).toBeLessThan(cancelledWithinMs);
    await expect.poll(() => progress.isVisible()).toBe(false);
    await robustness.getByText('not swept yet').waitFor();
    expect(Number.parseInt((await trail.innerText()).replace(/\D+/, ''), 10)).toBe(
      Number.parseInt(before.replace(/\D+/, ''), 10) + 1,
    );

    await stored(page, () =>
      section(page, 'Recomputation').getByRole('button', { name: 'Recompute', exact: true }).click(),
    );
    await section(page, 'Recomputation').getByText('reproduced', { exact: false }).first().waitFor();
  });
});
