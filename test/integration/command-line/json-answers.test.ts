import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Ajv2020, type AnySchema } from 'ajv/dist/2020.js';
import { beforeAll, describe, expect, it } from 'vitest';
import { footingHere, jsonOf, shellWords } from '../../helpers/command-line.ts';
import { decisiveAssumptions, project, workingFolder } from '../../helpers/review-folder.ts';

/** Every command at work, in the order of a review; those with two forms of an answer twice. */
const lines = [
  `new ${project} --title "Invented review" --reviewer "Ilse Varrow-Oyelaran"`,
  `import ${project} GLB.Ts+dSST.csv co2_mm_mlo.txt`,
  `import ${project} readings.csv --unit K --quantity temperature-anomaly --baseline 1951-1980`,
  `undo ${project}`,
  `redo ${project}`,
  `series ${project}`,
  `source ${project} talk.txt --kind transcript`,
  `claim ${project} claim.json`,
  `recompute ${project}`,
  `recompute ${project} --claim 1`,
  `assumptions ${project}`,
  `sweep ${project}`,
  `estimators ${project}`,
  ...decisiveAssumptions.map((id) => `mark ${project} ${id} "not met"`),
  `note ${project} "A note in the margin."`,
  'published',
  `finding ${project} --conclusion "cannot be determined" --text "It gives {recomputed}." --published ar6-ecs`,
  `sign ${project}`,
  `revise ${project} --reason "A later data version."`,
  `report ${project} --out report --format html,json`,
  `verify ${project}`,
  `recheck ${project}`,
  `trail ${project}`,
  'compute request.json',
  'schema',
  'schema claim',
  'help',
  'help sweep',
  'demo example',
];
/** What is found wanting, or not done, has a form too. */
const wanting = [
  ['compute wrong.json', 'command.compute', 2],
  [`recompute ${project}`, 'command.recompute', 2],
  [`series nowhere.footing`, 'refusal', 3],
  ['bogus', 'refusal', 2],
] as const;

describe('what a command prints with --json', () => {
  const folder = workingFolder();
  // A form with named keys lists them as property names, not as properties. Formats are patterns in the schemas too.
  const ajv = new Ajv2020({
    strict: true,
    strictRequired: false,
    allowUnionTypes: true,
    validateFormats: false,
    allErrors: true,
  });
  const printedSchema = async (name: string) => (await jsonOf(footingHere, folder, ['schema', name])) as AnySchema;

  async function expectFits(name: string, json: unknown): Promise<void> {
    const fits = ajv.compile(await printedSchema(name));
    const isFit = fits(json);
    expect({ isFit, errors: fits.errors?.slice(0, 3) }, name).toEqual({ isFit: true });
  }

  const answers = new Map<string, unknown[]>();
  beforeAll(async () => {
    for (const line of lines) {
      const [name = '', ...rest] = shellWords(line);
      answers.set(name, [...(answers.get(name) ?? []), await jsonOf(footingHere, folder, [name, ...rest])]);
    }
  });

  it('is there for every command', async () => {
    const names = ((await jsonOf(footingHere, folder, ['help'])) as { name: string }[]).map(({ name }) => name);
    expect([...answers.keys()].sort()).toEqual([...names, 'help'].sort());
    const schemaNames = (await jsonOf(footingHere, folder, ['schema'])) as string[];
    expect(schemaNames.filter((name) => name.startsWith('command.'))).toEqual(
      [...answers.keys()].map((name) => `command.${name}`).sort(),
    );
  });

  it.each([...new Set(lines.map((line) => shellWords(line)[0] ?? ''))])(
    'by %s fits the schema that footing schema prints, and no other value does',
    async (name) => {
      const printed = answers.get(name) ?? [];
      expect(printed.length).toBeGreaterThan(0);
      for (const json of printed) await expectFits(`command.${name}`, json);
      const fits = ajv.compile(await printedSchema(`command.${name}`));
      expect(fits(7)).toBe(false);
      expect(fits({ ok: true })).toBe(name === 'schema');
    },
  );

  it('when something is wanting fits too', async () => {
    writeFileSync(
      join(folder, 'wrong.json'),
      '[{ "method": "derivation", "lines": ["1 = 1"] }, { "method": "huber" }]',
    );
    writeFileSync(
      join(folder, 'outside.json'),
      JSON.stringify({
        title: 'Outside',
        statement: { words: 'w', quantity: 'trend', value: '0.1', unit: 'K per decade' },
        procedure: { kind: 'trend', seriesId: 'gistemp-annual', window: { start: 1800, end: 1850 } },
      }),
    );
    await jsonOf(footingHere, folder, ['claim', project, 'outside.json']);
    for (const [line, schema, status] of wanting) {
      const ran = await footingHere(folder, [...shellWords(line), '--json']);
      expect(ran, line).toMatchObject({ status });
      await expectFits(schema, JSON.parse(ran.out));
    }
  });

  it('names only schemas that are schemas', async () => {
    const names = (await jsonOf(footingHere, folder, ['schema'])) as string[];
    expect(names.length).toBeGreaterThan(80);
    for (const name of names) {
      const schema = await printedSchema(name);
      expect(() => ajv.compile(schema), name).not.toThrow();
    }
  });
});
