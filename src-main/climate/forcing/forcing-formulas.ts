import type { ForcingFormula } from '../../contract/forcing.ts';
import { etminan2016 } from './etminan2016.ts';
import type { GasForcingFormula } from './gas-forcing.ts';
import { ipcc1990 } from './ipcc1990.ts';
import { meinshausen2020 } from './meinshausen2020.ts';
import { myhre1998 } from './myhre1998.ts';

/** The published sets of formulas, by the name under which a request or a claim asks for one. */
export const forcingFormulas: Readonly<Record<ForcingFormula, GasForcingFormula>> = {
  ipcc1990,
  myhre1998,
  etminan2016,
  meinshausen2020,
};
