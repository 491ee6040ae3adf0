import type { ForcingFormula } from '../contract/forcing.ts';

/** The publications behind the sets of forcing formulas, the oldest first. */
export const formulaNames: Readonly<Record<ForcingFormula, string>> = {
  ipcc1990: 'IPCC 1990',
  myhre1998: 'Myhre et al. 1998',
  etminan2016: 'Etminan et al. 2016',
  meinshausen2020: 'Meinshausen et al. 2020',
};
