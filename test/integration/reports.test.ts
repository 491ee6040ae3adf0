import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { testCore } from '../helpers/test-core.ts';

it('keeps earlier reports beside the newest, since each bears witness to the trail as it was', async () => {
  const test = await testCore();
  await test.ask('project.create', { title: 'Reports' });
  const directory = join(test.folder, 'out');
  await test.ask('report.write', { directory, formats: ['json'] });
  const first = readFileSync(join(directory, 'report.json'), 'utf8');
  await test.ask('project.rename', { title: 'Reports, renamed' });
  await test.ask('report.write', { directory, formats: ['json'] });
  await test.ask('report.write', { directory, formats: ['json'] });
  expect(readdirSync(directory).sort()).toEqual(['report-earlier-1.json', 'report-earlier-2.json', 'report.json']);
  expect(readFileSync(join(directory, 'report-earlier-1.json'), 'utf8')).toBe(first);
  await test.end();
});
