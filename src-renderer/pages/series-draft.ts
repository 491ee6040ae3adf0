import type { OfferedSeries, SeriesChoice, SeriesQuantity } from '../../src-main/contract/series.ts';

/** What the reviewer has said so far about one offered series. Years are text while they are being typed. */
export interface SeriesDraft {
  key: string;
  isTaken: boolean;
  name: string;
  quantity: SeriesQuantity;
  unit: string;
  baselineStart: string;
  baselineEnd: string;
  /** The reviewer has looked, and the baseline cannot be found out. */
  isBaselineUnknown: boolean;
}

export interface SeriesProblems {
  name: string;
  unit: string;
  baseline: string;
}

export function seriesDraft({ key, isMain, suggestedName, quantity, unit, baseline }: OfferedSeries): SeriesDraft {
  return {
    key,
    isTaken: isMain,
    name: suggestedName,
    quantity,
    unit,
    baselineStart: baseline ? String(baseline.start) : '',
    baselineEnd: baseline ? String(baseline.end) : '',
    isBaselineUnknown: false,
  };
}

export const needsBaseline = ({ quantity }: Pick<SeriesDraft, 'quantity'>): boolean =>
  quantity === 'temperature-anomaly';

/** What still has to be said before the series can be taken; empty words where nothing has. */
export function seriesProblems(draft: SeriesDraft): SeriesProblems {
  return {
    name: draft.name.trim() === '' ? 'Give the series a name.' : '',
    unit: draft.unit.trim() === '' ? 'The file does not say the unit. State it.' : '',
    baseline: needsBaseline(draft) && !draft.isBaselineUnknown ? baselineProblem(draft) : '',
  };
}

export function baselineProblem({
  baselineStart,
  baselineEnd,
}: Pick<SeriesDraft, 'baselineStart' | 'baselineEnd'>): string {
  const [start, end] = [baselineStart.trim(), baselineEnd.trim()];
  if (start === '' && end === '')
    return 'An anomaly counts from the mean of some years. State them, or say that they are not known.';
  if (!isYear(start) || !isYear(end)) return 'Two years are expected, such as 1951 and 1980.';
  return Number(start) > Number(end) ? 'The first year comes after the last.' : '';
}

const isYear = (text: string): boolean => /^-?\d{1,4}$/.test(text);

/** The draft as the request wants it. Call only when nothing is left to be said. */
export function seriesChoice(draft: SeriesDraft): SeriesChoice {
  const hasBaseline = needsBaseline(draft) && !draft.isBaselineUnknown;
  return {
    key: draft.key,
    name: draft.name.trim(),
    quantity: draft.quantity,
    unit: draft.unit.trim(),
    baseline: hasBaseline ? { start: Number(draft.baselineStart), end: Number(draft.baselineEnd) } : null,
  };
}
