import { InputError } from '../errors.ts';

const meanings: Readonly<Record<string, string>> = {
  EACCES: 'no permission',
  EPERM: 'no permission',
  EROFS: 'a disk that cannot be written',
  ENOSPC: 'a full disk',
  EEXIST: 'a file in its place',
  ENOTDIR: 'a file where the path needs a folder',
  EISDIR: 'a folder in its place',
  ENOENT: 'nothing there',
  ENAMETOOLONG: 'a name that is too long for this disk',
};

/** What the file system refused, as an error that names the path and the reason in words. */
export function fileProblem(code: string, path: string, expected: string, error: unknown): InputError {
  const system = error instanceof Error && 'code' in error ? String(error.code) : '';
  const words = meanings[system];
  const message = error instanceof Error ? error.message : String(error);
  return new InputError({
    code,
    where: path,
    expected,
    received: words ? `${words} (${system})` : message,
    hint: 'Check the path; choose another, or put this one right.',
  });
}
