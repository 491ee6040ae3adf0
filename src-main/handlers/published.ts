import { energyBudgetStudies } from '../quantities/energy-budget-studies.ts';
import { likelihoods } from '../quantities/likelihoods.ts';
import { publishedConflicts } from '../quantities/published-conflicts.ts';
import { publishedDefinitions } from '../quantities/published-definitions.ts';
import { publishedValues } from '../quantities/published-values.ts';
import type { Handlers } from './context.ts';

export const publishedHandlers: Handlers<'published.list'> = {
  'published.list': () => ({
    values: [...publishedValues],
    conflicts: [...publishedConflicts],
    definitions: [...publishedDefinitions],
    likelihoods: [...likelihoods],
    studies: [...energyBudgetStudies],
  }),
};
