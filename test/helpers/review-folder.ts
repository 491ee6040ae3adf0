import { cpSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, onTestFinished } from 'vitest';
import { footingHere, jsonOf } from './command-line.ts';
import { gistempFile, inventedClaim, maunaLoaFile, readingsFile } from './invented-files.ts';

export const project = 'review.footing';

/** What has to be marked on the invented claim before its finding can be signed. */
export const decisiveAssumptions = [
  'zero-intercept',
  'anchor-year',
  'window',
  'omitted-forcings',
  'transient-as-equilibrium',
  'like-for-like',
  'independent-errors',
  'r-squared',
];

/** A folder with files to work on, gone at the end of the test file. */
export function workingFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), 'footing-command-'));
  afterAll(() => rmSync(folder, { recursive: true, force: true }));
  const files: Record<string, string> = {
    'GLB.Ts+dSST.csv': gistempFile(),
    'co2_mm_mlo.txt': maunaLoaFile(),
    'readings.csv': readingsFile(),
    'talk.txt': 'A doubling of CO2 gives at most 1.8 degrees. (invented)\n',
    'claim.json': JSON.stringify(inventedClaim),
    'request.json': JSON.stringify({ method: 'derivation', lines: ['2.6 * ln(2) = 1.8'] }),
  };
  for (const [name, content] of Object.entries(files)) writeFileSync(join(folder, name), content);
  return folder;
}

/** Fills a working folder with a project that has data, a claim with its results, and a finding. */
export async function prepareReview(folder: string): Promise<void> {
  const reviewer = ['--reviewer', 'Ilse Varrow-Oyelaran', '--role', 'reviewer (invented)'];
  for (const line of [
    ['new', project, '--title', 'Invented review', ...reviewer],
    ['import', project, 'GLB.Ts+dSST.csv', 'co2_mm_mlo.txt'],
    ['claim', project, 'claim.json'],
    ['recompute', project],
    ['assumptions', project],
    ['finding', project, '--conclusion', 'cannot be determined', '--text', 'The line gives {recomputed}.'],
  ]) {
    await jsonOf(footingHere, folder, line);
  }
}

/** A copy of a folder for one test to spoil. */
export function copyOf(folder: string): string {
  const copy = mkdtempSync(join(tmpdir(), 'footing-copy-'));
  onTestFinished(() => rmSync(copy, { recursive: true, force: true }));
  cpSync(folder, copy, { recursive: true });
  return copy;
}
