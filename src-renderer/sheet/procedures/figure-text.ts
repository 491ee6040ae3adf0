import type { ErrorAnswer } from '../../../src-main/contract/requests.ts';
import { numberIn } from '../../components/number-in.ts';

/** A stored figure as a field shows it. */
export function figureText(value: number | null | undefined): string {
  return value === null || value === undefined ? '' : String(value);
}

/** What keeps a field from being used; null when it holds a number that is not below the least. */
export function figureProblem(
  where: string,
  text: string,
  expected: string,
  least: number = -Infinity,
): ErrorAnswer | null {
  const value = numberIn(text);
  if (Number.isFinite(value) && value >= least) return null;
  const received = text.trim() === '' ? 'nothing' : `“${text.trim()}”`;
  return { kind: 'InputError', code: 'input-incomplete', where, expected, received, hint: '' };
}
