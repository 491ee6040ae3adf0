import { existsSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { makeFolders } from '../../../src-main/project/make-folders.ts';
import { temporaryFolder } from '../../helpers/sample-project.ts';

describe('folders', () => {
  it('are made with all that is missing above them, and left alone when they are there', () => {
    const folder = join(temporaryFolder(), 'a', 'b', 'c');
    makeFolders(folder, 0o700);
    expect(statSync(folder).mode & 0o777).toBe(0o700);
    makeFolders(folder);
    expect(statSync(folder).mode & 0o777).toBe(0o700);
  });

  it('are not made in place of a file, nor below one', () => {
    const file = join(temporaryFolder(), 'file');
    writeFileSync(file, '');
    expect(() => makeFolders(file)).toThrow('a file in its place');
    expect(() => makeFolders(join(file, 'below'))).toThrow(/ENOTDIR/);
  });

  it('are refused at once where the system makes none', ({ skip }) => {
    skip(!existsSync('/proc/self'), 'there is no /proc on this system');
    expect(() => makeFolders('/proc/no-such/folder')).toThrow(/ENOENT|EACCES|EPERM/);
  });
});
