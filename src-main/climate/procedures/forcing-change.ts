import type { ClaimComputation } from '../../contract/compute.ts';
import type { ForcingFormula } from '../../contract/forcing.ts';
import type { ForcingProcedure } from '../../contract/procedure.ts';
import type { Recomputation } from '../../contract/result.ts';
import { InputError } from '../../errors.ts';
import { annualMeans } from '../../quantities/annual-means.ts';
import { checkUnit } from '../../quantities/check-unit.ts';
import { formulaNames } from '../../quantities/formula-names.ts';
import { formatNumber, formatQuantity } from '../../quantities/notation.ts';
import { agreementWithStated } from '../../quantities/stated-number.ts';
import { forcing } from '../forcing/forcing.ts';
import { seriesOf } from './series-of.ts';
import { checkStatedUnit } from './stated-unit.ts';

interface Change {
  reference: number;
  value: number;
  from: string;
}

/**
 * Radiative forcing of a change of concentrations, by the formulas that the claim names.
 *
 * @returns  the sum over the gases that were given, W/m²; every gas, and the same under the other formulas, in the working
 * @throws   InputError `unit-mismatch`, `year-missing`, `series-missing`; as `forcing`, `checkUnit`, `annualMeans`
 *
 * Source    as `forcing`
 * Checked   test/unit/climate/procedures/forcing-change.test.ts (A: 5.35 ln 2 and AR6's printed forcings)
 */
export function forcingChange(computation: ClaimComputation, procedure: ForcingProcedure): Recomputation {
  const { statement } = computation;
  const { formula, isEffective, ch4Ppb, n2oPpb } = procedure;
  checkStatedUnit('forcing', statement.unit, 'W/m²');
  const co2 = co2Change(computation, procedure);
  const under = (name: ForcingFormula) =>
    forcing({
      formula: name,
      adjustment: isEffective ? 'ar6' : 'none',
      co2Ppm: co2.value,
      co2RefPpm: co2.reference,
      ...(ch4Ppb ? { ch4Ppb: ch4Ppb.value, ch4RefPpb: ch4Ppb.reference } : {}),
      ...(n2oPpb ? { n2oPpb: n2oPpb.value, n2oRefPpb: n2oPpb.reference } : {}),
    });
  const answer = under(formula);
  const value = scalar(answer.totalWm2);
  return {
    quantity: isEffective ? 'effective-radiative-forcing' : 'radiative-forcing',
    unit: 'W/m²',
    value,
    standardError: null,
    interval: null,
    agreement: agreementWithStated(statement.value, value, { bound: statement.bound, unit: 'W/m²' }),
    fit: null,
    conversion: `${formulaNames[formula]}${isEffective ? ', with the adjustments of AR6' : ''}: ${formatQuantity(value, 'W/m²', { significantDigits: 4 })}`,
    working: [
      {
        caption: 'Gas by gas',
        columns: ['Gas', 'Before', 'After', 'From', 'Forcing (W/m²)'],
        rows: [
          ['CO₂ (ppm)', co2.reference, co2.value, co2.from, scalar(answer.co2Wm2)],
          ...(ch4Ppb ? [['CH₄ (ppb)', ch4Ppb.reference, ch4Ppb.value, 'figures given', scalar(answer.ch4Wm2)]] : []),
          ...(n2oPpb ? [['N₂O (ppb)', n2oPpb.reference, n2oPpb.value, 'figures given', scalar(answer.n2oWm2)]] : []),
        ],
      },
      {
        caption: `The same change under every formula${isEffective ? ', with the adjustments of AR6' : ''}`,
        columns: ['Formula', 'Forcing (W/m²)', 'Minus the one above'],
        rows: (Object.keys(formulaNames) as ForcingFormula[]).map((name) => {
          const total = scalar(under(name).totalWm2);
          return [formulaNames[name], total, total - value];
        }),
      },
    ],
    caveats: answer.caveats,
  };
}

function co2Change(computation: ClaimComputation, { co2Ppm }: ForcingProcedure): Change {
  if (co2Ppm.kind === 'figures') return { reference: co2Ppm.reference, value: co2Ppm.value, from: 'figures given' };
  const series = seriesOf(computation, 'co2SeriesId', 'a series of CO2 concentrations');
  const factor = checkUnit(series, 'ppm');
  const { years, values } = annualMeans(series, 12);
  const at = (year: number): number => {
    const found = values[years.indexOf(year)];
    if (found !== undefined) return found * factor;
    throw new InputError({
      code: 'year-missing',
      where: `series ${series.name}`,
      expected: `a value for the whole year ${year}`,
      received: 'none',
      hint: `Choose a year with twelve months; the series has ${formatNumber(years.length, { decimals: 0 })} of them.`,
    });
  };
  const { referenceYear, year } = co2Ppm;
  return { reference: at(referenceYear), value: at(year), from: `${series.name}, ${referenceYear} and ${year}` };
}

/** One number went in, one comes out. */
function scalar(value: number | number[] | undefined): number {
  return typeof value === 'number' ? value : NaN;
}
