import { AxeBuilder } from '@axe-core/playwright';
import { expect, it, onTestFinished } from 'vitest';
import { reportHtml } from '../../src-main/report/report-html.ts';
import { browser } from '../helpers/browser.ts';
import { inventedReport } from '../unit/report/invented-report.ts';

/** The invented report in a page of its own; what it asks for or complains about is kept. */
async function openReport(options: { bypassCSP: boolean }) {
  const context = await (await browser()).newContext(options);
  onTestFinished(() => context.close());
  const page = await context.newPage();
  const problems: string[] = [];
  page.on('request', (request) => {
    if (!request.url().startsWith('data:')) problems.push(`asks for ${request.url()}`);
  });
  page.on('console', (message) => problems.push(message.text()));
  await page.setContent(await reportHtml(inventedReport));
  return { page, problems };
}

it('shows itself in its own fonts under its own policy, asking for nothing', async () => {
  const { page, problems } = await openReport({ bypassCSP: false });
  const fonts = await page.evaluate(async () => {
    await document.fonts.ready;
    return [...document.fonts].filter((font) => font.status === 'loaded').map((font) => font.family);
  });
  expect(new Set(fonts)).toEqual(new Set(['Literata', 'Atkinson Hyperlegible Next', 'Atkinson Hyperlegible Mono']));
  expect(problems).toEqual([]);
});

it('has no accessibility violation that axe-core finds', async () => {
  // axe-core is put into the page as a script, which the report’s own policy would refuse.
  const { page } = await openReport({ bypassCSP: true });
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html).join(' ')}`)).toEqual([]);
});

it('prints in A4 pages', async () => {
  const { page } = await openReport({ bypassCSP: false });
  const pdf = (await page.pdf({ preferCSSPageSize: true })).toString('latin1');
  const boxes = [...pdf.matchAll(/\/MediaBox \[0 0 ([\d.]+) ([\d.]+)\]/g)].map(([, width, height]) => [width, height]);
  // Contents, two claims with a first page and a check each, sources and trail.
  expect(boxes.length).toBeGreaterThanOrEqual(6);
  for (const [width, height] of boxes) {
    // 210 × 297 mm in points, to the browser’s whole pixel.
    expect(Math.abs(Number(width) - 595.3)).toBeLessThan(1);
    expect(Math.abs(Number(height) - 841.9)).toBeLessThan(1);
  }
});
