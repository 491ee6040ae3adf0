import { resolve } from 'node:path';
import { describe, expect, it } from 'vitest';
import { InputError } from '../../../src-main/errors.ts';
import { launchArguments, readLaunchOptions } from '../../../src-main/hosts/launch-options.ts';

const directory = resolve('/somewhere');
const read = (...args: string[]) => readLaunchOptions(args, directory);

describe('readLaunchOptions', () => {
  it('starts empty, with a browser', () => {
    expect(read()).toEqual({ isDemo: false, projectPath: null, isBrowserWanted: true });
  });

  it('reads every option, and files from where the user is', () => {
    expect(read('--demo', '--no-open')).toEqual({ isDemo: true, projectPath: null, isBrowserWanted: false });
    expect(read('--project', 'a b.footing').projectPath).toBe(resolve(directory, 'a b.footing'));
    expect(read(`--project=${resolve('/x/y.footing')}`).projectPath).toBe(resolve('/x/y.footing'));
  });

  it.each([['--dmeo'], ['file.footing'], ['--project'], ['--demo=yes'], ['--demo', '--project', 'a.footing']])(
    'refuses %s and says what there is',
    (...args) => {
      expect(() => read(...args)).toThrow(InputError);
      expect(() => read(...args)).toThrow('Options: --demo');
    },
  );

  it('passes over what Chromium adds, when told to', () => {
    const args = ['--inspect=0', '/app', '--allow-file-access-from-files', '--demo', '--original-process-start-time=1'];
    expect(readLaunchOptions(args, directory, true)).toEqual({
      isDemo: true,
      projectPath: null,
      isBrowserWanted: true,
    });
  });

  it('comes back the same from the arguments it is handed on as', () => {
    for (const args of [[], ['--demo'], ['--project', 'a b.footing', '--no-open']]) {
      const options = read(...args);
      expect(readLaunchOptions(launchArguments(options), '/elsewhere')).toEqual(options);
    }
  });
});
