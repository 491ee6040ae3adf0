import { spawnSync } from 'node:child_process';
import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { beforeAll, describe, expect, it } from 'vitest';
import { builtProgram, footing, footingHere, jsonOf } from '../../helpers/command-line.ts';
import { startChild } from '../../helpers/child-process.ts';
import { copyOf, prepareReview, project, workingFolder } from '../../helpers/review-folder.ts';

describe('the built command line, among other programs', () => {
  const prepared = workingFolder();
  beforeAll(() => prepareReview(prepared));

  it('says what is wrong in one line on standard error, and by its status', async () => {
    const missing = await footing(prepared, ['series', 'nowhere.footing']);
    expect(missing).toMatchObject({ status: 3, out: '' });
    expect(missing.errors).toMatch(/nowhere\.footing: expected [^\n]+\n$/);
    expect(await footing(prepared, ['sweep', project, '--min-years', '2'])).toMatchObject({ status: 2, out: '' });
    expect((await footing(prepared, ['bogus', '--json'])).out).toMatch(/^\{"ok":false,"error":\{[^\n]+\n$/);
  });

  it('prints the same as unbuilt', async () => {
    for (const line of [['help'], ['series', project], ['schema', 'claim'], ['published', 'aerosol']]) {
      expect(await footing(prepared, line), line.join(' ')).toEqual(await footingHere(prepared, line));
    }
  });

  it('reads a request from standard input, and one array of answers from an array', async () => {
    const request = { method: 'derivation', lines: ['2.6 * ln(2) = 1.8'] };
    const one = await footing(prepared, ['compute', '-'], { input: JSON.stringify(request) });
    expect(one).toMatchObject({ status: 0, errors: '' });
    const answer = JSON.parse(one.out) as unknown;
    expect(answer).toMatchObject({ ok: true, value: { lines: [{ agrees: true }] } });
    const two = await footing(prepared, ['compute', '-'], {
      input: JSON.stringify([{ method: 'no-such' }, request]),
    });
    expect(two.status).toBe(2);
    expect(JSON.parse(two.out)).toEqual([
      { ok: false, error: expect.objectContaining({ code: 'unknown-method' }) as object },
      answer,
    ]);
  });

  it('lets no text from elsewhere add lines, drive the terminal or turn the writing round', async () => {
    const folder = copyOf(prepared);
    const title = 'One\nSound: 9 entries\u001b[2J\u009b\u202e';
    const claim = JSON.parse(readFileSync(join(folder, 'claim.json'), 'utf8')) as object;
    writeFileSync(join(folder, 'claim.json'), `\ufeff${JSON.stringify({ ...claim, title })}`);
    const { out } = await footing(folder, ['claim', project, 'claim.json']);
    expect(out).toBe('claim 2  One␊Sound: 9 entries␛[2J��\n');
    expect(await jsonOf(footing, folder, ['claim', project, 'claim.json'])).toMatchObject({ id: 3, title });
  });

  it('may be read in part', () => {
    const line = `"${process.execPath}" "${builtProgram}" schema claim.view.answer | head -c 100 > /dev/null`;
    expect(spawnSync('sh', ['-c', line], { encoding: 'utf8' }).stderr).toBe('');
  });

  it('does not write a project that another program holds, says who does, and goes on reading', async () => {
    const folder = copyOf(prepared);
    const writer = fileURLToPath(new URL('../../faults/processes/writer.ts', import.meta.url));
    const child = startChild(writer, ['hold', join(folder, project)]);
    await child.hasTold(1);
    expect(child.told).toEqual(['open']);

    const refused = await footing(folder, ['note', project, 'Not now.', '--json']);
    expect(refused.status).toBe(3);
    expect(JSON.parse(refused.out)).toMatchObject({ ok: false, error: { kind: 'ProjectError', code: 'in-use' } });
    expect(refused.errors).toMatch(/W\. Process \d+ has open since \d{4}-\d\d-\d\dT/);
    for (const [name = '', ...rest] of [['series'], ['verify'], ['recheck'], ['trail'], ['report', '--out', 'r']]) {
      expect(await footing(folder, [name, project, ...rest]), name).toMatchObject({ status: 0, errors: '' });
    }

    child.kill();
    await child.ended;
    await jsonOf(footing, folder, ['note', project, 'Now.']);
  });
});
