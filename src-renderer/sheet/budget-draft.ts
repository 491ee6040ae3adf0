import type { EnergyBudgetInputs } from '../../src-main/contract/claim.ts';
import type { ErrorAnswer } from '../../src-main/contract/requests.ts';
import { inputDraftProblem, inputOfDraft, type InputDraft } from '../components/input-draft.ts';

export type BudgetKey = keyof EnergyBudgetInputs;
export type BudgetDraft = Readonly<Record<BudgetKey, InputDraft>>;

export const budgetFields: readonly { key: BudgetKey; label: string; unit: string }[] = [
  { key: 'warmingK', label: 'Warming between the two periods, ΔT', unit: 'K' },
  { key: 'forcingWm2', label: 'Forcing change, ΔF', unit: 'W/m²' },
  { key: 'uptakeWm2', label: 'Heat-uptake change, ΔN', unit: 'W/m²' },
  { key: 'doublingWm2', label: 'Forcing of a CO₂ doubling, F2x', unit: 'W/m²' },
];

/** What keeps a draft from being used; null when nothing does. */
export function budgetProblem(draft: BudgetDraft): ErrorAnswer | null {
  const given = budgetFields.filter(({ key }) => inputOfDraft(draft[key]));
  for (const { key, label } of given) {
    const problem = inputDraftProblem(`Energy budget: ${label}`, draft[key]);
    if (problem) return problem;
  }
  const isDoublingAlone = given.length === 1 && given[0]?.key === 'doublingWm2';
  if (given.length === 0 || given.length === budgetFields.length || isDoublingAlone) return null;
  const missing = budgetFields.filter((field) => !given.includes(field)).map(({ label }) => label);
  return {
    kind: 'InputError',
    code: 'input-incomplete',
    where: 'Energy budget',
    expected: 'all four values, the doubling forcing alone, or none',
    received: `nothing for ${missing.join('; ')}`,
    hint: '',
  };
}
