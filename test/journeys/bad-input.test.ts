import { createHash } from 'node:crypto';
import { copyFileSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { freshFolder, openBrowserStage } from '../helpers/browser.ts';
import { footingCommand } from '../helpers/footing-command.ts';
import { chooseFiles, createProject, goTo, introduceReviewer, openClaim, section, stored } from './flows/steps.ts';

const nEntries = (page: Page) =>
  page
    .getByRole('navigation', { name: 'Project' })
    .getByRole('link', { name: /^Trail/ })
    .innerText();

async function beginProject(page: Page): Promise<void> {
  await introduceReviewer(page, 'Ada Brandvold', 'reviewer');
  await createProject(page, 'Lantern Point talk');
  await goTo(page, 'Series');
}

/** Twenty invented years, one of them in words, one given twice with different values, and a line that is no row. */
function damagedTable(): string {
  const rows = Array.from({ length: 20 }, (_, place) => `${1961 + place},${(place * 0.02 - 0.1).toFixed(2)}`);
  rows[2] = '1963,about 0.1';
  rows.splice(5, 0, '1965,0.30');
  return ['# Invented data: no measurement.', 'Year,Anomaly (K)', ...rows, 'Mean of all years: 0.09', ''].join('\n');
}

describe('Data that cannot be used as it stands', () => {
  it('is shown line by line, and waits for the reviewer’s decision', async () => {
    const { page, home } = await openBrowserStage();
    await beginProject(page);
    const before = await nEntries(page);
    const table = { name: 'harbour-air.csv', mimeType: 'text/csv', buffer: Buffer.from(damagedTable()) };
    await chooseFiles(page, page.getByRole('button', { name: 'Import files' }), [table]);
    await page.getByRole('heading', { name: '3 rows that cannot be used' }).waitFor();

    const rows = page.getByRole('group', { name: 'Rows that cannot be used' }).getByRole('row');
    const [, words, twice, footer] = await rows.allInnerTexts();
    expect(words).toMatch(/^5\s+1963,about 0\.1\s+.*“about 0\.1” is not a number/);
    expect(twice).toMatch(/^8\s+1965,0\.30\s+.*other values than line 7/);
    expect(footer).toMatch(/^24\s+Mean of all years: 0\.09\s+text, not a row/);

    await page.getByLabel('Unit').fill('K');
    await page.getByLabel('not known').check();
    const bring = page.getByRole('button', { name: /^Import this series/ });
    await page.getByText('Decide about the rows that cannot be used.').waitFor();
    await expect(bring.isDisabled()).resolves.toBe(true);
    await page.getByRole('radio', { name: /^Stop here/ }).check();
    await expect(bring.isDisabled()).resolves.toBe(true);
    expect(await nEntries(page)).toBe(before);

    await page.getByRole('radio', { name: /^Leave these rows out/ }).check();
    await stored(page, () => bring.click());
    await page.getByRole('link', { name: 'harbour-air' }).click();
    for (const line of [5, 8, 24]) await page.getByText(new RegExp(`line ${line}: `)).waitFor();
    const { json } = footingCommand(home, 'verify', join(home, 'lantern-point-talk.footing'));
    expect(json).toMatchObject({ isSound: true });
  });

  it.each([
    {
      what: 'a broken workbook',
      name: 'readings.xlsx',
      bytes: Buffer.from('PK\u0003\u0004\u0014\u0000\u0006\u0000[Content_Types].xml', 'latin1'),
    },
    { what: 'bytes of no text', name: 'readings.bin', bytes: Buffer.from([0, 159, 146, 150, 255, 0, 1, 2, 3, 250]) },
    { what: 'an empty file', name: 'nothing.csv', bytes: Buffer.alloc(0) },
    { what: 'prose', name: 'letter.txt', bytes: Buffer.from('Dear colleague,\nhere is no table at all.\n') },
  ])('names the file when it is $what, and imports nothing', async ({ name, bytes }) => {
    const { page } = await openBrowserStage();
    await beginProject(page);
    const before = await nEntries(page);
    await chooseFiles(page, page.getByRole('button', { name: 'Import files' }), [
      { name, mimeType: 'application/octet-stream', buffer: bytes },
    ]);
    const said = page.getByRole('alert');
    await expect.poll(() => said.innerText()).toMatch(new RegExp(`${name}[\\s\\S]*Expected .*, but found .*\\.`));
    expect(await said.innerText()).not.toMatch(/undefined|NaN|\[object|went wrong/i);
    await expect(page.getByRole('button', { name: /^Import this series/ }).count()).resolves.toBe(0);
    await page.getByRole('button', { name: 'Leave it' }).click();
    await page.getByText('No series yet').waitFor();
    expect(await nEntries(page)).toBe(before);
  });
});

describe('A wrong passphrase', () => {
  it('signs nothing, says so, and leaves what was written', async () => {
    const home = freshFolder('home');
    const { page } = await openBrowserStage({ home });
    await introduceReviewer(page, 'Ada Brandvold', 'reviewer');
    await page.getByRole('button', { name: 'Open the worked example' }).click();
    await openClaim(page, '0.19 °C in ten years since 1970');
    const finding = section(page, 'Finding');
    const signFinding = finding.getByRole('button', { name: 'Sign the finding' });
    await finding.getByLabel('Passphrase for your new signing key').fill('seventeen wet herons');
    await finding.getByLabel('The same again').fill('seventeen wet heron');
    await finding.getByText('The two are not the same.').waitFor();
    await expect(signFinding.isDisabled()).resolves.toBe(true);
    await finding.getByLabel('The same again').fill('seventeen wet herons');
    await stored(page, () => signFinding.click());
    await finding.getByText('The signature holds.').waitFor();

    await openClaim(page, 'At most 1.9 °C per doubling');
    const passphrase = finding.getByLabel('Passphrase of your signing key');
    await finding.getByLabel('Remark, signed with it').fill('Read twice.');
    await passphrase.fill('not the right one');
    await signFinding.click();
    await expect
      .poll(() => finding.getByRole('alert').innerText())
      .toMatch(/Expected the passphrase that the signing key was locked with, but found another one/);
    await expect(finding.getByText('The signature holds.').count()).resolves.toBe(0);
    await expect(finding.getByLabel('Remark, signed with it').inputValue()).resolves.toBe('Read twice.');

    await passphrase.fill('seventeen wet herons');
    await stored(page, () => signFinding.click());
    await finding.getByText('The signature holds.').waitFor();
    await finding.getByText('Read twice.').waitFor();
  });
});

describe('A file that is no project of this version', () => {
  it('is refused in plain words, and not touched', async () => {
    const folder = freshFolder('files');
    const home = freshFolder('home');
    const good = join(folder, 'good.footing');
    expect(footingCommand(home, 'new', good, '--title', 'Good', '--reviewer', 'Ada Brandvold').exitStatus).toBe(0);
    const files = {
      letter: { path: join(folder, 'letter.footing'), says: 'a file of another kind' },
      foreign: { path: join(folder, 'foreign.footing'), says: 'It was made by another program.' },
      newer: { path: join(folder, 'newer.footing'), says: 'It was written by a newer Footing.' },
      missing: { path: join(folder, 'missing.footing'), says: 'a project file that can be read' },
    };
    writeFileSync(files.letter.path, 'Dear colleague,\n'.repeat(40));
    new Database(files.foreign.path).exec('CREATE TABLE shopping (item TEXT)').close();
    copyFileSync(good, files.newer.path);
    const newer = new Database(files.newer.path);
    newer.pragma(`user_version = ${Number(newer.pragma('user_version', { simple: true })) + 1}`);
    newer.close();

    const { page } = await openBrowserStage({ home });
    for (const { path, says } of Object.values(files)) {
      const before = digestOf(path);
      await page.getByLabel('Or the path of a project file').fill(path);
      await page.getByRole('button', { name: 'Open', exact: true }).click();
      await expect.poll(() => page.getByRole('alert').innerText()).toContain(says);
      expect(await page.getByRole('alert').innerText()).toContain(path);
      expect(digestOf(path)).toBe(before);
    }
    await page.getByLabel('Or the path of a project file').fill(good);
    await page.getByRole('button', { name: 'Open', exact: true }).click();
    await page.getByRole('heading', { name: 'Claims', level: 1 }).waitFor();
  });

  it('names who has it open, offers to read it, and lets only one write', async () => {
    const first = await openBrowserStage();
    await introduceReviewer(first.page, 'Ada Brandvold', 'reviewer');
    await createProject(first.page, 'Lantern Point talk');
    const path = join(first.home, 'lantern-point-talk.footing');

    const second = await openBrowserStage();
    await introduceReviewer(second.page, 'Tove Marchetti', 'second reviewer');
    await second.page.getByLabel('Or the path of a project file').fill(path);
    await second.page.getByRole('button', { name: 'Open', exact: true }).click();
    await expect
      .poll(() => second.page.getByRole('alert').innerText())
      .toMatch(/one that Ada Brandvold has open since .*Open it read-only/s);

    await second.page.getByLabel('Only to read').check();
    await second.page.getByRole('button', { name: 'Open', exact: true }).click();
    await second.page.getByRole('heading', { name: 'Claims', level: 1 }).waitFor();
    await second.page.getByText('Read only').waitFor();
    await expect(second.page.getByRole('link', { name: 'New claim' }).count()).resolves.toBe(0);

    await goTo(first.page, 'Sources');
    await first.page.getByRole('button', { name: 'Add a source' }).click();
    await first.page.getByLabel('Title').fill('Still writing here');
    await stored(first.page, () => first.page.getByRole('button', { name: 'Add', exact: true }).click());
    await first.page.getByRole('heading', { name: /Still writing here/ }).waitFor();
  });
});

/** SHA-256 of a file; null when there is none. */
function digestOf(path: string): string | null {
  try {
    return createHash('sha256').update(readFileSync(path)).digest('hex');
  } catch {
    return null;
  }
}
