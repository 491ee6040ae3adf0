import { describe, expect, it } from 'vitest';
import { forcingChange } from '../../../../src-main/climate/procedures/forcing-change.ts';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import type { Statement } from '../../../../src-main/contract/claim.ts';
import type { ForcingProcedure } from '../../../../src-main/contract/procedure.ts';
import { recomputation } from '../../../../src-main/contract/result.ts';
import { annualSeries, computationOf } from '../../../helpers/claim-computation.ts';
import { expectClose } from '../../../helpers/close.ts';

const figures = (reference: number, value: number) => ({ kind: 'figures' as const, reference, value });
const procedure: ForcingProcedure = {
  kind: 'forcing',
  formula: 'myhre1998',
  isEffective: false,
  co2Ppm: figures(278, 556),
  co2SeriesId: null,
  ch4Ppb: null,
  n2oPpb: null,
};
const stated: Partial<Statement> = { quantity: 'radiative-forcing', unit: 'W/m²', bound: 'equals', value: '3.7' };

describe('forcingChange', () => {
  it('gives 5.35 ln 2 = 3.7 W/m² for a doubling by Myhre et al. 1998, and the other formulas beside it', () => {
    const answer = recompute(computationOf(procedure, {}, stated));
    expectClose(answer.value, 5.35 * Math.LN2, { rel: 1e-14, abs: 0, why: 'closed form' });
    expect(answer.agreement.isReproduced).toBe(true);
    const others = new Map((answer.working[1]?.rows ?? []).map(([name, total]) => [name, total]));
    expectClose(others.get('IPCC 1990'), 6.3 * Math.LN2, { rel: 1e-14, abs: 0, why: 'closed form' });
    expect(recomputation.parse(answer)).toEqual(answer);
  });

  it('gives the sum of AR6’s printed forcings for 1750 to 2019: 2.16, 0.54 and 0.21 W/m²', () => {
    const all: ForcingProcedure = {
      ...procedure,
      formula: 'meinshausen2020',
      isEffective: true,
      co2Ppm: figures(278.3, 409.9),
      ch4Ppb: figures(729.2, 1866.3),
      n2oPpb: figures(270.1, 332.1),
    };
    const answer = forcingChange(computationOf(all, {}, { ...stated, value: '2.91' }), all);
    const each = (answer.working[0]?.rows ?? []).map((row) => row.at(-1));
    const printed = { rel: 0, abs: 0.01, why: 'printed with two decimals, from concentrations with more digits' };
    expectClose(each, [2.16, 0.54, 0.21], printed);
    expectClose(answer.value, 2.91, { ...printed, abs: 0.02 });
  });

  it('takes the concentrations of two years from a series, and says which', () => {
    const co2 = annualSeries('invented-co2', 'co2', 'ppm', [1960, 1961, 2020], [300, null, 400]);
    const byYears: ForcingProcedure = {
      ...procedure,
      co2Ppm: { kind: 'series', referenceYear: 1960, year: 2020 },
      co2SeriesId: 4,
    };
    const run = (change: Partial<ForcingProcedure> = {}) => {
      const changed = { ...byYears, ...change };
      return forcingChange(computationOf(changed, { co2SeriesId: co2 }, stated), changed);
    };
    const answer = run();
    expectClose(answer.value, 5.35 * Math.log(400 / 300), { rel: 1e-14, abs: 0, why: 'closed form' });
    expect(answer.working[0]?.rows[0]?.[3]).toBe('invented-co2, 1960 and 2020');
    const inGap = { kind: 'series' as const, referenceYear: 1961, year: 2020 };
    expect(() => run({ co2Ppm: inGap })).toThrow(/a value for the whole year 1961/);
  });

  it('passes on the doubts of the formula, and refuses ppb given as ppm', () => {
    const far: ForcingProcedure = { ...procedure, formula: 'etminan2016', co2Ppm: figures(278, 2224) };
    expect(forcingChange(computationOf(far, {}, stated), far).caveats.map(({ code }) => code)).toContain(
      'outside-formula-range',
    );
    const ppb: ForcingProcedure = { ...procedure, co2Ppm: figures(278_000, 556_000) };
    expect(() => forcingChange(computationOf(ppb, {}, stated), ppb)).toThrow(/ppm/);
  });

  it('refuses a statement in another unit', () => {
    expect(() => forcingChange(computationOf(procedure, {}, { ...stated, unit: '1' }), procedure)).toThrow(
      /a statement in W\/m²/,
    );
  });
});
