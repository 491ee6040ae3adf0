import type { QuantityId } from '../contract/primitives.ts';

/** Names of the kinds of number, for labels and for running text. */
export const quantityNames: Readonly<Record<QuantityId, { readonly short: string; readonly long: string }>> = {
  'apparent-sensitivity': { short: 'apparent', long: 'apparent sensitivity' },
  'effective-climate-sensitivity': { short: 'EffCS', long: 'effective climate sensitivity (EffCS)' },
  'equilibrium-climate-sensitivity': { short: 'ECS', long: 'equilibrium climate sensitivity (ECS)' },
  'transient-climate-response': { short: 'TCR', long: 'transient climate response (TCR)' },
  trend: { short: 'trend', long: 'trend' },
  ratio: { short: 'ratio', long: 'ratio' },
};
