import { InputError } from '../errors.ts';
import type { TextFile } from './decode-text.ts';

/** The error of a reader that is told to read a file which is not of its format. `place` is the 0-based line looked at. */
export function otherFormat(file: TextFile, place: number, expected: string): InputError {
  return new InputError({
    code: 'other-format',
    where: `${file.fileName}, line ${place + 1}`,
    expected,
    received: `“${(file.lines[place] ?? '').trim().slice(0, 80)}”`,
    hint: 'Let the format be recognised, or choose delimited text.',
  });
}
