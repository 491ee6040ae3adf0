import { describe, expect, it } from 'vitest';
import { outgassing } from '../../../../src-main/climate/procedures/outgassing.ts';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import type { Statement } from '../../../../src-main/contract/claim.ts';
import type { OutgassingProcedure } from '../../../../src-main/contract/procedure.ts';
import { recomputation } from '../../../../src-main/contract/result.ts';
import { computationOf } from '../../../helpers/claim-computation.ts';
import { expectClose } from '../../../helpers/close.ts';

const procedure: OutgassingProcedure = {
  kind: 'outgassing',
  source: 'takahashi1993',
  warmingK: 1,
  temperatureC: 15,
  salinity: null,
  co2Ppm: 280,
  toPpm: null,
};
const stated: Partial<Statement> = { quantity: 'co2-change', unit: 'ppm', bound: 'equals', value: '12' };
const run = (change: Partial<OutgassingProcedure> = {}, statement: Partial<Statement> = {}) => {
  const changed = { ...procedure, ...change };
  return outgassing(computationOf(changed, {}, { ...stated, ...statement }), changed);
};

describe('outgassing', () => {
  it('gives 12.1 ppm for one degree at 280 ppm, and 18.1 at 420', () => {
    const answer = recompute(computationOf(procedure, {}, stated));
    expectClose(answer.value, 280 * (Math.exp(0.0423) - 1), { rel: 1e-12, abs: 0, why: 'closed form' });
    const printed = { rel: 0, abs: 0.05, why: 'computed elsewhere, to one decimal' };
    expectClose([answer.value, run({ co2Ppm: 420 }).value], [12.1, 18.1], printed);
    expect(answer.agreement.isReproduced).toBe(true);
    expect(answer.interval).toBeNull();
    expect(recomputation.parse(answer)).toEqual(answer);
  });

  it('takes the degree as exact: 16 ppm are not 12.1 with a rounded degree', () => {
    expect(run({}, { value: '16' }).agreement.isReproduced).toBe(false);
  });

  it('falls with a cooling, and compounds over a large warming', () => {
    expectClose(run({ warmingK: -6 }).value, 280 * Math.expm1(-0.2538), { rel: 1e-12, abs: 0, why: 'closed form' });
    const figures = new Map(run({ warmingK: 6 }).working[1]?.rows.map(([name, value]) => [name, value]));
    expectClose(figures.get('rise by the slope at the start, without compounding, ppm'), 280 * 0.0423 * 6, {
      rel: 1e-12,
      abs: 0,
      why: 'closed form',
    });
  });

  it('puts every law and record beside it: τ from 11 to 35 K at 15 °C', () => {
    // Computed elsewhere; the records from memory.
    const elsewhere = [11.32, 15.73, 20.37, 23.64, 23.81, 27.3, 33.03, 34.6];
    const tau = (run({ source: 'weiss1974', salinity: 35 }).working[2]?.rows ?? []).map((row) => Number(row[2]));
    for (const value of elsewhere) {
      const nearest = tau.toSorted((one, other) => Math.abs(one - value) - Math.abs(other - value))[0];
      expectClose(nearest, value, { rel: 0, abs: 0.005, why: 'computed elsewhere, to two decimals' });
    }
    expect([Math.min(...tau), Math.max(...tau)]).toEqual([tau[0], tau.at(-1)]);
  });

  it('says which warming the recorded rise would need: 9.91 K from 278 to 422.8 ppm', () => {
    const { working } = run({ co2Ppm: 278, toPpm: 422.8 });
    expectClose(working[1]?.rows.at(-1)?.[1], 9.91, { rel: 0, abs: 0.005, why: 'computed elsewhere, to two decimals' });
    expect(working[2]?.columns.at(-1)).toBe('Needed for 278 to 422.8 ppm (K)');
    expect(run().working[2]?.columns).toHaveLength(5);
  });

  it('says that it is surface water whose carbon is fixed, and that nature has been a net sink', () => {
    const codes = run().caveats.map(({ code }) => code);
    expect(codes).toContain('scope-isochemical');
    expect(codes).toContain('nature-is-a-net-sink');
  });

  it.each([
    { name: 'a temperature as a warming', change: { warmingK: 288 }, says: /a change of temperature in K/ },
    { name: 'ppb', change: { co2Ppm: 280_000 }, says: /divide by 1000/ },
    { name: 'a solubility without salinity', change: { source: 'weiss1974' as const }, says: /a salinity/ },
  ])('refuses $name', ({ change, says }) => {
    expect(() => run(change)).toThrow(says);
  });

  it('refuses a statement in another unit', () => {
    expect(() => run({}, { unit: '%' })).toThrow(/a statement in ppm/);
  });
});
