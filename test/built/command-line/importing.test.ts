import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { footing, jsonOf } from '../../helpers/command-line.ts';
import { copyOf, prepareReview, project, workingFolder } from '../../helpers/review-folder.ts';

const untidy = 'ein "Test" ß.csv';

describe('import and recompute of the built command line', () => {
  const prepared = workingFolder();
  beforeAll(async () => {
    await prepareReview(prepared);
    writeFileSync(join(prepared, untidy), 'year;temp (K)\r\n1990;0,1\r\n1991;abc\r\n1992;0,3\r\n1993;0,35\r\n');
  });

  it('imports all of its files or none', async () => {
    const folder = copyOf(prepared);
    const before = await jsonOf(footing, folder, ['series', project]);
    expect(await footing(folder, ['import', project, 'readings.csv', 'talk.txt'])).toMatchObject({
      status: 2,
      out: '',
    });
    const refused = await footing(folder, ['import', project, 'readings.csv', untidy, '--refuse-bad-rows']);
    expect(refused).toMatchObject({ status: 2, out: '' });
    expect(refused.errors).toMatch(
      /^ein "Test" ß\.csv: expected rows that can all be used, but found 1 that cannot, .*line 3/,
    );
    expect(await jsonOf(footing, folder, ['series', project])).toEqual(before);
  });

  it('says what it recognised, read, left out and noticed', async () => {
    const { out } = await footing(copyOf(prepared), ['import', project, untidy, 'GLB.Ts+dSST.csv']);
    expect(out).toMatch(/left out, line 3: .*abc/);
    expect(out).toMatch(/note: .*decimal comma/);
    expect(out).toMatch(/note: The same bytes are in the project as dataset 1/);
    expect(out).toMatch(
      /gistemp-annual-2: temperature-anomaly, K, 1980–2019 by year, vs 1951–1980, 1 missing, 0 absent/,
    );
    expect(out).toMatch(/part year 2019: /);
    expect(out).toContain('3 rows read, 1 left out');
  });

  it('goes on to the next claim when one cannot be recomputed, and says so by its status', async () => {
    const folder = copyOf(prepared);
    const claim = JSON.parse(readFileSync(join(folder, 'claim.json'), 'utf8')) as { procedure: object };
    const window = { start: 1800, end: 1850 };
    const outside = { ...claim, title: 'Outside', procedure: { ...claim.procedure, window } };
    writeFileSync(join(folder, 'outside.json'), JSON.stringify(outside));
    await jsonOf(footing, folder, ['claim', project, 'outside.json']);
    await jsonOf(footing, folder, ['claim', project, 'claim.json']);
    const ran = await footing(folder, ['recompute', project, '--json']);
    expect(ran.status).toBe(2);
    expect(JSON.parse(ran.out)).toMatchObject([
      { claimId: 1, recomputation: { unit: 'K per doubling' } },
      { claimId: 2, error: { kind: 'InputError' } },
      { claimId: 3, recomputation: { unit: 'K per doubling' } },
    ]);
    const text = await footing(folder, ['recompute', project]);
    expect(text.out).toMatch(/claim 2 {2}Outside\n {2}.*1800–1850/);
  });
});
