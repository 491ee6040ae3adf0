import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import type { Page } from 'playwright-core';
import { expect } from 'vitest';
import { cautions } from '../../../src-main/contract/cautions.ts';
import type { RecheckReport, VerifyReport } from '../../../src-main/contract/trail.ts';
import { browser, freshFolder } from '../../helpers/browser.ts';
import { footingCommand } from '../../helpers/footing-command.ts';
import { watchPage, type OpenStage } from '../../helpers/stage.ts';
import { inventedForcingTable, lineThroughFirstYear } from './record.ts';
import { chooseFiles, createProject, goTo, introduceReviewer, openClaim, section, stored } from './steps.ts';

const real = (name: string) =>
  fileURLToPath(new URL(`../../../node_modules/vega-datasets/data/${name}`, import.meta.url));
const records = { co2: real('co2-concentration.csv'), temperature: real('global-temp.csv') };
const window = { start: 1959, end: 2019 };
const passphrase = 'seventeen wet herons';
const secondPassphrase = 'a ladder against the barn';
const title = 'At most 2.1 °C per doubling';
const words = 'Sixty years of readings, one straight line: doubling the gas gives 2.1 degrees, and not a tenth more.';

/** Two published files and a sentence go in; a signed finding comes out, and holds wherever it is looked at again. */
export async function recordToSignedFinding(open: OpenStage): Promise<void> {
  const stage = await open();
  const { page } = stage;
  const expected = lineThroughFirstYear(
    readFileSync(records.co2, 'utf8'),
    readFileSync(records.temperature, 'utf8'),
    window,
  );
  expect((expected.slope * Math.LN2).toFixed(1), 'the number that the invented talk states').toBe('2.1');

  await introduceReviewer(page, 'Ada Brandvold', 'reviewer');
  await createProject(page, 'Lantern Point talk');
  await addSource(page);
  await importRecords(page);
  await takeUpTheNumber(page);
  await answerQuestions(page);
  await checkArithmetic(page);
  await chooseSeries(page);
  await recompute(page, expected);
  await supplyEvidence(page);
  await testAssumptions(page);
  await sweepWindows(page);
  await writeFinding(page);
  await sign(page);
  await expectFrozen(page);
  await checkTheTrail(page);
  const files = await writeReport(page, freshFolder('report'));
  await stage.close();

  const project = join(stage.home, 'lantern-point-talk.footing');
  expectSound(stage.home, project, ['sign-off']);
  await readReport(files.html);

  await counterSign(open, project);
  expectSound(stage.home, project, ['sign-off', 'counter-signature']);
  await revise(open, stage.home, project);
}

async function addSource(page: Page): Promise<void> {
  await goTo(page, 'Sources');
  await page.getByRole('button', { name: 'Add a source' }).click();
  const form = page.getByRole('form', { name: 'New source' });
  await form.getByLabel('Title').fill('The long view from Lantern Point');
  await form.getByLabel('Details').fill('An invented talk, held for nobody, in no town.');
  await chooseFiles(page, form.getByRole('button', { name: 'Attach the file' }), [
    { name: 'lantern-point.txt', mimeType: 'text/plain', buffer: Buffer.from(`${words}\n`) },
  ]);
  await form.getByText('lantern-point.txt').waitFor();
  await stored(page, () => form.getByRole('button', { name: 'Add', exact: true }).click());
  await page.getByText('as received').waitFor();
}

async function importRecords(page: Page): Promise<void> {
  await goTo(page, 'Series');
  const forcing = {
    name: 'invented-forcing.csv',
    mimeType: 'text/csv',
    buffer: Buffer.from(inventedForcingTable(1880, 2020)),
  };
  await chooseFiles(page, page.getByRole('button', { name: 'Import files' }), [records.co2, records.temperature]);
  await page.getByText('Importing 1 of 2 files').waitFor();
  await page.getByLabel('Origin and licence').fill('npm package vega-datasets');
  await stored(page, () => page.getByRole('button', { name: /^Import (this|\d+) series/ }).click());
  await page.getByRole('heading', { name: 'global-temp.csv', level: 1 }).waitFor();
  await stored(page, () => page.getByRole('button', { name: /^Import (this|\d+) series/ }).click());
  await page.getByRole('heading', { name: 'Series', level: 1 }).waitFor();

  await chooseFiles(page, page.getByRole('button', { name: 'Import files' }), [forcing]);
  await page.getByRole('heading', { name: /Recognised as Forcing by agent/ }).waitFor();
  await stored(page, () => page.getByRole('button', { name: /^Import (this|\d+) series/ }).click());
  await page.getByRole('link', { name: 'erf-total' }).waitFor();
}

async function takeUpTheNumber(page: Page): Promise<void> {
  await goTo(page, 'Claims');
  await page.getByRole('link', { name: 'New claim' }).click();
  await page.getByLabel('The words of the source').fill(words);
  await page.getByLabel('Where in it').fill('slide 9');
  await page.getByRole('radio', { name: /^apparent sensitivity/ }).check();
  await page.getByLabel('Value, as printed').fill('2.1');
  await page.getByRole('radio', { name: /^at most/ }).check();
  await page.getByLabel('Short title').fill(title);
  await stored(page, () => page.getByRole('button', { name: 'Take it up' }).click());
  await page.getByRole('heading', { name: words, level: 1 }).waitFor();
}

async function answerQuestions(page: Page): Promise<void> {
  const statement = section(page, 'Statement');
  await statement.getByRole('button', { name: 'Edit the statement' }).click();
  await statement.getByLabel('Presented as').selectOption({ label: 'equilibrium climate sensitivity' });
  await statement.getByLabel('R² stated beside it').fill('0.90');
  await statement
    .getByLabel('Definition, as the source states it')
    .fill('The slope of one straight line, for twice the gas.');
  await stored(page, () => statement.getByRole('button', { name: 'Keep' }).click());
  await statement.getByText('The slope of one straight line').waitFor();

  const questions = statement.getByRole('group');
  const nQuestions = await questions.count();
  expect(nQuestions).toBeGreaterThanOrEqual(5);
  for (let place = 0; place < nQuestions; place += 1) {
    await stored(page, () => questions.nth(place).getByRole('radio').nth(1).check());
  }
  await statement.getByText('every question answered').waitFor();
}

async function checkArithmetic(page: Page): Promise<void> {
  const arithmetic = section(page, 'Arithmetic');
  await arithmetic.getByRole('textbox').fill('3.03 * ln(2) = 2.1\n3.03 * 0.693 = 2.2');
  await stored(page, () => arithmetic.getByRole('button', { name: 'Check the arithmetic' }).click());
  await arithmetic.getByText('1 line does not agree', { exact: true }).waitFor();
  const table = arithmetic.getByRole('table');
  await expect(table.getByRole('row').nth(1).innerText()).resolves.toMatch(/2\.1002.*agrees within rounding/s);
  await expect(table.getByRole('row').nth(2).innerText()).resolves.toMatch(/2\.0998.*does not agree/s);
}

async function chooseSeries(page: Page): Promise<void> {
  const data = section(page, 'Data');
  await stored(page, () =>
    data
      .getByLabel('How the source gets the number')
      .selectOption({ label: 'line of temperature on the logarithm of CO₂' }),
  );
  await expect(selectedText(data.getByLabel('Temperature'))).resolves.toBe('gistemp-annual');
  await expect(selectedText(data.getByLabel('CO₂', { exact: true }))).resolves.toBe('co2-mauna-loa-monthly');
  await expect(selectedText(data.getByLabel('A year counts with'))).resolves.toBe('all twelve months');
}

const selectedText = (select: ReturnType<Page['getByLabel']>) =>
  select.evaluate(
    (element) => (element as unknown as { selectedOptions: { text: string }[] }).selectedOptions[0]?.text,
  );

async function recompute(page: Page, expected: ReturnType<typeof lineThroughFirstYear>): Promise<void> {
  const recomputation = section(page, 'Recomputation');
  await recomputation.getByLabel('First year').fill(String(window.start));
  await recomputation.getByLabel('Last year').fill(String(window.end));
  await stored(page, () => recomputation.getByLabel('Last year').press('Tab'));
  await stored(page, () =>
    recomputation.getByLabel('Standard errors').selectOption({ label: 'Newey–West: allows for neighbouring years' }),
  );
  await stored(page, () => recomputation.getByRole('button', { name: 'Recompute', exact: true }).click());
  await recomputation.getByText('reproduced within rounding', { exact: true }).waitFor();

  const shown = await recomputation.locator('dd').first().getAttribute('title');
  expect(Math.abs(Number(shown) - expected.slope * Math.LN2)).toBeLessThan(1e-9);
  await section(page, 'Data').getByText(`${expected.nYears} years in common`).waitFor();
  await expect(section(page, 'Data').getByText('Years left out').textContent()).resolves.not.toBe('Years left out: 0');
  await expect(recomputation.getByRole('img').count()).resolves.toBe(2);
}

async function supplyEvidence(page: Page): Promise<void> {
  const assumptions = section(page, 'Assumptions');
  await assumptions.getByText('What the tests can draw on').click();
  await stored(page, () =>
    assumptions.getByLabel('Total effective radiative forcing').selectOption({ label: 'erf-total' }),
  );
  await stored(page, () => assumptions.getByLabel('CO₂ forcing').selectOption({ label: 'erf-co2' }));
  await assumptions.getByRole('button', { name: 'Fill in the values of AR6 §7.5.2.1' }).click();
  await expect(assumptions.getByLabel('Forcing of a CO₂ doubling, F2x, best value').inputValue()).resolves.toBe('3.93');
  await stored(page, () => assumptions.getByRole('button', { name: 'Keep these values' }).click());
}

async function testAssumptions(page: Page): Promise<void> {
  const assumptions = section(page, 'Assumptions');
  await stored(page, () => assumptions.getByRole('button', { name: 'Test the assumptions' }).click());
  await assumptions.getByText(/\d+ apply · \d+ tested$/).waitFor();
  await assumptions.getByText('The ladder: each rung').waitFor();

  const rows = assumptions.locator('tbody').filter({ has: page.getByRole('combobox', { name: /^Your mark/ }) });
  let nMarked = 0;
  for (let place = 0; place < (await rows.count()); place += 1) {
    const row = rows.nth(place);
    const weight = await row.getByRole('cell').nth(2).innerText();
    if (weight !== 'decisive' && weight !== 'notable') continue;
    nMarked += 1;
    await stored(page, () => row.getByRole('combobox').selectOption('not met'));
    await row.getByRole('button').first().click();
    await row.getByLabel('Your note on this mark').fill('Seen, and weighed against the figures of this row.');
    await stored(page, () => row.getByLabel('Your note on this mark').press('Tab'));
    await row.getByRole('button').first().click();
  }
  expect(nMarked, 'assumptions that move this number').toBeGreaterThanOrEqual(3);
}

async function sweepWindows(page: Page): Promise<void> {
  const robustness = section(page, 'Robustness');
  await robustness.getByLabel('Shortest window (years)').fill('25');
  await stored(page, () => robustness.getByRole('button', { name: 'Sweep the windows' }).click());
  await robustness.getByText(/^\d+ windows$/).waitFor();
  await robustness.getByText('The stated window 1959–2019').waitFor();
}

async function writeFinding(page: Page): Promise<void> {
  const finding = section(page, 'Finding');
  for (const label of ['Quote AR6 assessed ECS', 'Quote AR6 assessed TCR'])
    await stored(page, () => finding.getByRole('checkbox', { name: label }).check());
  await stored(page, () => finding.getByRole('radio', { name: 'not supported' }).check());
  const text = finding.getByLabel('The finding, in your words');
  await text.fill('The line gives {recomputed}, as stated. On our footing the number is {no-such-figure}.');
  await stored(page, () => text.press('Tab'));
  await finding.locator('mark', { hasText: '{no-such-figure}' }).waitFor();
  await text.fill('The line gives {recomputed}, as stated. On our footing the number is ');
  await stored(page, () => text.press('Tab'));
  await finding.getByText('Figures that the text can name').click();
  await stored(page, () => finding.getByRole('button', { name: '{on-this-footing}' }).click());
  const read = finding.getByLabel('The finding as it will be read');
  await expect.poll(() => read.innerText()).toMatch(/The line gives 2\.1\d? ± .* On our footing the number is \d/s);
  for (const caution of cautions) await finding.getByText(caution).waitFor();
}

async function sign(page: Page): Promise<void> {
  const finding = section(page, 'Finding');
  await finding.getByLabel('Passphrase for your new signing key').fill(passphrase);
  await finding.getByLabel('The same again').fill(passphrase);
  await finding.getByLabel('Remark, signed with it').fill('Signed at the kitchen table.');
  await stored(page, () => finding.getByRole('button', { name: 'Sign the finding' }).click());
  await finding.getByText('The signature holds.').waitFor();
  await finding.getByText('Ada Brandvold, reviewer · sign-off').waitFor();
}

async function expectFrozen(page: Page): Promise<void> {
  await page.getByText('This sheet is frozen').waitFor();
  await expect(
    section(page, 'Statement').getByRole('button', { name: 'Edit the statement' }).isDisabled(),
  ).resolves.toBe(true);
  await expect(section(page, 'Arithmetic').getByRole('textbox').isDisabled()).resolves.toBe(true);
  for (const name of ['Recompute', 'Test the assumptions', 'Sweep the windows'])
    await expect(page.getByRole('button', { name, exact: true }).isDisabled(), name).resolves.toBe(true);
  await expect(
    page
      .getByRole('combobox', { name: /^Your mark/ })
      .first()
      .isDisabled(),
  ).resolves.toBe(true);
  await expect(section(page, 'Finding').getByLabel('The finding, in your words').isDisabled()).resolves.toBe(true);
}

async function checkTheTrail(page: Page): Promise<void> {
  await goTo(page, 'Trail');
  await page.getByRole('button', { name: 'Verify' }).click();
  await page.getByRole('heading', { name: 'The record is sound' }).waitFor();
  await page.getByRole('button', { name: 'Recheck results' }).click();
  await page.getByRole('heading', { name: 'Every result came out again' }).waitFor();
}

async function writeReport(page: Page, folder: string): Promise<{ html: string; json: string }> {
  await goTo(page, 'Report');
  await page.getByLabel('Into the folder').fill(folder);
  await page.getByRole('button', { name: 'Write the report' }).click();
  const written = page.getByRole('status').getByText('Written:');
  await written.nth(1).waitFor();
  const paths = await written.locator('code').allInnerTexts();
  const [html, json] = ['.html', '.json'].map((end) => paths.find((path) => path.endsWith(end)) ?? `no ${end}`);
  return { html: html ?? '', json: json ?? '' };
}

function expectSound(home: string, project: string, meanings: string[]): void {
  const verify = footingCommand(home, 'verify', project);
  const report = verify.json as VerifyReport;
  expect(verify.exitStatus, verify.errors).toBe(0);
  expect(report.problems).toEqual([]);
  expect(report.signatures.map(({ meaning, isValid }) => ({ meaning, isValid }))).toEqual(
    meanings.map((meaning) => ({ meaning, isValid: true })),
  );
  const recheck = footingCommand(home, 'recheck', project);
  expect(recheck.exitStatus, recheck.errors).toBe(0);
  const { isIdentical, nResults } = recheck.json as RecheckReport;
  expect(isIdentical).toBe(true);
  expect(nResults).toBeGreaterThanOrEqual(4);
}

/** As a reader has it: one file, opened from disk, that fetches nothing. */
async function readReport(path: string): Promise<void> {
  const html = readFileSync(path, 'utf8');
  const context = await (await browser()).newContext();
  const page = await context.newPage();
  const address = pathToFileURL(path).href;
  const problems = watchPage(page, (url) => url === address || /^(data|blob):/.test(url));
  await page.goto(address);
  const text = await page.locator('body').innerText();
  await context.close();

  expect(problems).toEqual([]);
  expect(html).not.toMatch(/<script|(src|href)="(https?:)?\/\//i);
  expect(text).toMatch(/not supported/i);
  expect(text).toMatch(/The line gives 2\.1\d? ± /);
  expect(text).toContain('Ada Brandvold');
  for (const caution of cautions) expect(text).toContain(caution);
  expect(text, 'the head of the trail').toMatch(/[0-9a-f]{64}/);
}

async function counterSign(open: OpenStage, project: string): Promise<void> {
  const { page, close } = await open();
  await introduceReviewer(page, 'Tove Marchetti', 'second reviewer');
  await page.getByLabel('Or the path of a project file').fill(project);
  await page.getByRole('button', { name: 'Open', exact: true }).click();
  await openClaim(page, title);
  const finding = section(page, 'Finding');
  await finding.getByRole('radio', { name: /^Counter-sign/ }).check();
  await finding.getByLabel('Passphrase for your new signing key').fill(secondPassphrase);
  await finding.getByLabel('The same again').fill(secondPassphrase);
  await stored(page, () => finding.getByRole('button', { name: 'Counter-sign' }).click());
  await finding.getByText('Tove Marchetti, second reviewer · counter-signature').waitFor();
  await expect(finding.getByText('The signature holds.').count()).resolves.toBe(2);
  await close();
}

async function revise(open: OpenStage, home: string, project: string): Promise<void> {
  const { page } = await open({ home, projectPath: project });
  await openClaim(page, title);
  const finding = section(page, 'Finding');
  await finding
    .getByLabel('Start a new revision: what changes, and why')
    .fill('The talk was held again, with one slide more.');
  await stored(page, () => finding.getByRole('button', { name: 'Start revision 2' }).click());
  await finding.getByText('revision 2, draft').waitFor();
  await expect(
    section(page, 'Statement').getByRole('button', { name: 'Edit the statement' }).isEnabled(),
  ).resolves.toBe(true);
  const text = finding.getByLabel('The finding, in your words');
  await expect(text.inputValue()).resolves.toContain('{recomputed}');
  await finding.getByLabel('Passphrase of your signing key').fill(passphrase);
  await stored(page, () => finding.getByRole('button', { name: 'Sign the finding' }).click());
  await finding.getByText('revision 2, signed').waitFor();
}
