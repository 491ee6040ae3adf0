import { expect, it } from 'vitest';
import { dicShareOf, pco2ShareOf, revelleFactor } from '../../../../src-main/climate/seawater/revelle-factor.ts';
import { expectClose } from '../../../helpers/close.ts';

const near = { rel: 1e-12, abs: 0, why: 'differences of numbers near one' };

it('+10 % pCO2 for +1 % dissolved carbon is a Revelle factor of 10, −6 % for −0.5 % one of 12', () => {
  expectClose(revelleFactor({ pco2Before: 300, pco2After: 330, dicBefore: 2000, dicAfter: 2020 }), 10, near);
  expectClose(revelleFactor({ pco2Before: 400, pco2After: 376, dicBefore: 2000, dicAfter: 1990 }), 12, near);
});

it('turns shares of the one into shares of the other and back', () => {
  expectClose(dicShareOf(0.1, 10), 0.01, near);
  expectClose(dicShareOf(0.1, 8), 0.0125, near);
  expectClose(pco2ShareOf(0.01, 12), 0.12, near);
  expectClose(pco2ShareOf(dicShareOf(-0.03, 9.3), 9.3), -0.03, near);
});

it('refuses carbon that does not change, and amounts and factors that are not positive', () => {
  const states = { pco2Before: 300, pco2After: 330, dicBefore: 2000, dicAfter: 2020 };
  const refused = [
    () => revelleFactor({ ...states, dicAfter: 2000 }),
    () => revelleFactor({ ...states, pco2Before: 0 }),
    () => revelleFactor({ ...states, pco2After: -330 }),
    () => revelleFactor({ ...states, dicAfter: NaN }),
    () => dicShareOf(0.1, 0),
    () => dicShareOf(NaN, 10),
    () => pco2ShareOf(0.1, -10),
  ];
  for (const run of refused) expect(run).toThrow(expect.objectContaining({ name: 'InputError' }));
});
