import type { EnergyBudgetInputs, UncertainInput } from '../../src-main/contract/claim.ts';
import type { ErrorAnswer } from '../../src-main/contract/requests.ts';

export type BudgetKey = keyof EnergyBudgetInputs;

/** One quantity of an energy budget as it is being written. */
export interface BudgetRow {
  mean: string;
  halfWidth90: string;
  source: string;
}
export type BudgetDraft = Readonly<Record<BudgetKey, BudgetRow>>;

export const budgetFields: readonly { key: BudgetKey; label: string; unit: string }[] = [
  { key: 'warmingK', label: 'Warming between the two periods, ΔT', unit: 'K' },
  { key: 'forcingWm2', label: 'Forcing change, ΔF', unit: 'W/m²' },
  { key: 'uptakeWm2', label: 'Heat-uptake change, ΔN', unit: 'W/m²' },
  { key: 'doublingWm2', label: 'Forcing of a CO₂ doubling, F2x', unit: 'W/m²' },
];

/** What has been written for one quantity; null when nothing has. */
export function budgetInput({ mean, halfWidth90, source }: BudgetRow): UncertainInput | null {
  if (mean.trim() === '' && halfWidth90.trim() === '') return null;
  return { mean: numberIn(mean), halfWidth90: numberIn(halfWidth90), source: source.trim() };
}

/** What keeps a draft from being used; null when nothing does. */
export function budgetProblem(draft: BudgetDraft): ErrorAnswer | null {
  const given = budgetFields.filter(({ key }) => budgetInput(draft[key]));
  for (const { key, label } of given) {
    const { mean, halfWidth90 } = draft[key];
    const isSpread = numberIn(halfWidth90) >= 0 && Number.isFinite(numberIn(halfWidth90));
    if (!Number.isFinite(numberIn(mean))) return problem(`Energy budget: ${label}`, 'a number', said(mean));
    if (!isSpread)
      return problem(`Energy budget: ${label}`, 'a 5–95 % half-width, 0 for a value taken as exact', said(halfWidth90));
  }
  const isDoublingAlone = given.length === 1 && given[0]?.key === 'doublingWm2';
  if (given.length === 0 || given.length === budgetFields.length || isDoublingAlone) return null;
  const missing = budgetFields.filter((field) => !given.includes(field)).map(({ label }) => label);
  const received = `nothing for ${missing.join('; ')}`;
  return problem('Energy budget', 'all four values, the doubling forcing alone, or none', received);
}

/** NaN when the text is no number: an empty field is not zero. */
function numberIn(text: string): number {
  const plain = text.trim().replace(',', '.').replace('−', '-');
  return plain === '' ? NaN : Number(plain);
}

const said = (text: string) => (text.trim() === '' ? 'nothing' : `“${text.trim()}”`);

function problem(where: string, expected: string, received: string): ErrorAnswer {
  return { kind: 'InputError', code: 'budget-incomplete', where, expected, received, hint: '' };
}
