import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { engineVersion } from '../../src-main/engine-version.ts';

it('is the version of the package', () => {
  const { version } = JSON.parse(readFileSync(new URL('../../package.json', import.meta.url), 'utf8')) as {
    version: string;
  };
  expect(engineVersion).toBe(version);
});
