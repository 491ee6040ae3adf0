import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { footing } from '../../helpers/command-line.ts';
import { workingFolder } from '../../helpers/review-folder.ts';

describe('the worked example of the built command line', () => {
  const folder = workingFolder();

  it('goes from nothing to a signed report that verifies, in a folder of its own', async () => {
    const ran = await footing(folder, ['demo', 'example', '--json']);
    expect(ran.status, ran.errors).toBe(0);
    const demo = JSON.parse(ran.out) as { project: string; report: string[]; claims: { isSigned: boolean }[] };
    expect(demo).toMatchObject({ verify: { isSound: true }, recheck: { isIdentical: true } });
    expect(demo.claims.length).toBeGreaterThan(0);
    expect(demo.claims.every(({ isSigned }) => isSigned)).toBe(true);
    for (const file of demo.report) expect(readFileSync(file, 'utf8').length).toBeGreaterThan(1000);
    expect(await footing(folder, ['verify', demo.project])).toMatchObject({ status: 0 });
  });
});
