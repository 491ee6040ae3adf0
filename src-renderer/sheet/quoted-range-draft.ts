import { statedNumber } from '../../src-main/contract/stated.ts';
import type { QuotedRange } from '../../src-main/contract/claim.ts';
import type { ErrorAnswer } from '../../src-main/contract/requests.ts';

/** A quoted range as it is being written. */
export interface QuotedRangeDraft {
  low: string;
  high: string;
  levelPercent: string;
}

export function draftOfQuotedRange(range: QuotedRange | null): QuotedRangeDraft {
  const level = range?.levelPercent ?? null;
  return { low: range?.low ?? '', high: range?.high ?? '', levelPercent: level === null ? '' : String(level) };
}

/** What has been written; a range of null when nothing has, an error when it cannot be read. */
export function quotedRangeOfDraft(draft: QuotedRangeDraft): { range: QuotedRange | null } | { error: ErrorAnswer } {
  const [low, high, level] = [draft.low, draft.high, draft.levelPercent].map((text) => text.trim());
  for (const [name, text] of [
    ['lower end', low],
    ['upper end', high],
  ]) {
    if (text && !statedNumber.safeParse(text).success) {
      return { error: problem(`Quoted range: ${name}`, 'a number as printed, such as 2.5', text) };
    }
  }
  const percent = level ? Number(level.replace(/\s*%$/, '').replace(',', '.')) : null;
  if (percent !== null && !(percent > 0 && percent <= 100)) {
    return { error: problem('Quoted range: level', 'per cent above 0 and up to 100, or nothing', level ?? '') };
  }
  if (!low && !high && percent === null) return { range: null };
  return { range: { low: low || null, high: high || null, levelPercent: percent } };
}

function problem(where: string, expected: string, received: string): ErrorAnswer {
  return { kind: 'InputError', code: 'quoted-range-form', where, expected, received: `“${received}”`, hint: '' };
}
