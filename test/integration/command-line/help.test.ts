import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { footingHere, jsonOf, shellWords } from '../../helpers/command-line.ts';
import { decisiveAssumptions, project, workingFolder } from '../../helpers/review-folder.ts';

const ilse = ['--reviewer', 'Ilse Varrow-Oyelaran'];

/** The order of a review in which the examples work. */
const order = [
  ...['new', 'import', 'undo', 'redo', 'series', 'source', 'claim', 'recompute', 'assumptions', 'sweep', 'estimators'],
  ...['mark', 'note', 'published', 'finding', 'sign', 'report', 'verify', 'recheck', 'trail', 'revise'],
  ...['compute', 'schema', 'demo'],
];

describe('help', () => {
  const folder = workingFolder();
  let names: string[];
  beforeAll(async () => {
    mkdirSync(join(folder, 'second'));
    names = ((await jsonOf(footingHere, folder, ['help'])) as { name: string }[]).map(({ name }) => name);
  });

  it('lists every command with what it does', async () => {
    const { status, out, errors } = await footingHere(folder, ['help']);
    expect({ status, errors }).toEqual({ status: 0, errors: '' });
    for (const name of names) expect(out).toMatch(new RegExp(`^  ${name} +\\S`, 'm'));
    expect((await footingHere(folder, [])).out).toBe(out);
  });

  it('answers --help of a command, and --json', async () => {
    const { out } = await footingHere(folder, ['help', 'sweep']);
    expect(out).toContain('--min-years');
    expect((await footingHere(folder, ['sweep', '--help'])).out).toBe(out);
    expect(await jsonOf(footingHere, folder, ['help', 'sweep'])).toMatchObject({ name: 'sweep', usage: 'FILE' });
    expect(await jsonOf(footingHere, folder, ['--version'])).toEqual({
      engineVersion: expect.stringMatching(/^\d+\.\d+\.\d+$/) as string,
    });
  });

  it('has examples for every command', () => {
    expect([...order].sort()).toEqual([...names].sort());
  });

  // One after the other: each goes on from the project that the one before has left.
  it.each(order)('has examples of %s that run as they are printed', async (name) => {
    // Before anything is signed, its assumptions are tested, and whatever is decisive is marked, by somebody with a name.
    if (name === 'sign') await jsonOf(footingHere, folder, ['assumptions', project, '--claim', '1', ...ilse]);
    for (const id of name === 'sign' ? decisiveAssumptions : []) {
      await jsonOf(footingHere, folder, ['mark', project, id, 'not met', '--claim', '1']);
    }
    // The examples speak of a second claim too.
    if (name === 'recompute') await jsonOf(footingHere, folder, ['claim', project, 'claim.json']);
    const { examples } = (await jsonOf(footingHere, folder, ['help', name])) as { examples: string[] };
    expect(examples.length).toBeGreaterThan(0);
    for (const example of examples) {
      const [program, ...words] = shellWords(example);
      expect(program).toBe('footing');
      const ran = await runExample(words);
      expect(ran, `${example}\n${ran.errors}`).toMatchObject({ status: 0 });
      expect(ran.out.length, example).toBeGreaterThan(1);
      const isJson = words.includes('--json') || ['compute', 'schema'].includes(words[0] ?? '');
      if (isJson && words[1] !== undefined) expect(() => JSON.parse(ran.out) as unknown, example).not.toThrow();
      if (!isJson) expect(() => JSON.parse(ran.out) as unknown, example).toThrow();
    }
  });

  function runExample(words: string[]) {
    // A second reviewer counter-signs, from a machine of their own.
    if (words.includes('counter-signature')) {
      const second = [...words, '--reviewer', 'Teo Brandvold-Achterberg (invented)'];
      return footingHere(folder, second, { home: join(folder, 'second') });
    }
    // Standard input is looked at where the built program is run.
    return footingHere(
      folder,
      words.map((word) => (word === '-' ? 'request.json' : word)),
    );
  }
});
