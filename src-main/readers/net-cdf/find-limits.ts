import { type Limits, statedLimits } from '../series-values.ts';
import { type Variable, textOf } from './variable-file.ts';

/** Two variables that are the limits of a third. */
export interface FoundLimits {
  base: string;
  names: [string, string];
  levelPercent: number;
  limits: Limits;
}

const percentLimit = /(\d+(?:\.\d+)?)\s*% (?:confidence|credible|uncertainty)? ?(?:limit|bound|interval)/i;

/** The one pair of variables whose long names say which percent limits they are, about the one that is none. */
export function findLimits(variables: readonly Variable[]): FoundLimits | null {
  const stated = variables.map(({ name, attributes }, place) => {
    const percent = percentLimit.exec(textOf(attributes, 'long_name'))?.[1];
    return { name, place, percent: percent === undefined ? null : Number(percent) };
  });
  const found = stated
    .filter(({ percent }) => percent !== null)
    .toSorted((a, b) => (a.percent ?? 0) - (b.percent ?? 0));
  const others = stated.filter(({ percent }) => percent === null);
  const [lower, upper] = found;
  const [base] = others;
  if (lower === undefined || upper === undefined || base === undefined) return null;
  if (found.length > 2 || others.length > 1) return null;
  const levelPercent = (upper.percent ?? 0) - (lower.percent ?? 0);
  return {
    base: base.name,
    names: [lower.name, upper.name],
    levelPercent,
    limits: statedLimits(lower.place, upper.place, levelPercent),
  };
}
