import type { ErrorAnswer } from '../../src-main/contract/requests.ts';
import type { UncertainInput } from '../../src-main/contract/uncertain-input.ts';
import { numberIn } from './number-in.ts';

/** A best value with its range, as it is being written. */
export interface InputDraft {
  best: string;
  low: string;
  high: string;
  levelPercent: number;
  source: string;
}

/** Levels of a range, by the words they are published with. */
export const rangeLevels: readonly { value: number; label: string }[] = [
  { value: 90, label: '5–95 %' },
  { value: 66, label: '17–83 %' },
  { value: 95, label: '2.5–97.5 %' },
  { value: 68.27, label: '± 1 σ' },
];

export function draftOfInput(input: UncertainInput | null | undefined): InputDraft {
  if (!input) return { best: '', low: '', high: '', levelPercent: 90, source: '' };
  const { best, low, high, levelPercent, source } = input;
  return { best: String(best), low: String(low), high: String(high), levelPercent, source };
}

/** What has been written; null when nothing has. Without a range the value is taken as exact. */
export function inputOfDraft({ best, low, high, levelPercent, source }: InputDraft): UncertainInput | null {
  if ([best, low, high].every(isEmpty)) return null;
  const isExact = isEmpty(low) && isEmpty(high);
  return {
    best: numberIn(best),
    low: numberIn(isExact ? best : low),
    high: numberIn(isExact ? best : high),
    levelPercent,
    source: source.trim(),
  };
}

/** What keeps a draft that has been begun from being used; null when nothing does. */
export function inputDraftProblem(where: string, draft: InputDraft): ErrorAnswer | null {
  const input = inputOfDraft(draft);
  if (!input) return null;
  const problem = (expected: string, received: string): ErrorAnswer => ({
    kind: 'InputError',
    code: 'input-incomplete',
    where,
    expected,
    received,
    hint: '',
  });
  if (!Number.isFinite(input.best)) return problem('a number', said(draft.best));
  if (!Number.isFinite(input.low) || !Number.isFinite(input.high)) {
    return problem(
      'both ends of its range, or none for a value taken as exact',
      `${said(draft.low)} to ${said(draft.high)}`,
    );
  }
  if (input.low > input.best || input.best > input.high) {
    return problem('a best value within its range', `${draft.best} beside ${draft.low} to ${draft.high}`);
  }
  return null;
}

const isEmpty = (text: string) => text.trim() === '';

const said = (text: string) => (isEmpty(text) ? 'nothing' : `“${text.trim()}”`);
