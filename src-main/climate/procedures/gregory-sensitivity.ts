import type { GregoryValue } from '../../contract/climate-response.ts';
import type { ClaimComputation } from '../../contract/compute.ts';
import type { Caveat } from '../../contract/primitives.ts';
import type { GregoryProcedure } from '../../contract/procedure.ts';
import type { Recomputation } from '../../contract/result.ts';
import type { SeriesData } from '../../contract/series.ts';
import { NumericError } from '../../errors.ts';
import { checkUnit } from '../../quantities/check-unit.ts';
import { formatNumber, formatQuantity, formatYears } from '../../quantities/notation.ts';
import { perDoublingFactor } from '../../quantities/per-doubling-factor.ts';
import { agreementWithStated } from '../../quantities/stated-number.ts';
import { gregory } from '../gregory.ts';
import { alignWindow } from './align-window.ts';
import { gregoryWorking } from './gregory-working.ts';
import { seriesOf } from './series-of.ts';
import { warmingFromZero } from './warming-from-zero.ts';

/**
 * Effective climate sensitivity from a Gregory regression: the equilibrium warming of an abrupt change of CO2, turned
 * into that of a doubling.
 *
 * Model    as `gregory`: N = F − λΔT, S = F/λ/divisor
 * Assumes  annual means; years of the split are counted from the first year in use
 *
 * @returns  interval: Fieller's at 95 %, over the divisor; lines, parts and bracket in the working
 * @throws   InputError as `alignWindow`, `checkUnit`, `warmingFromZero`, `perDoublingFactor`; NumericError
 *           `no-finite-sensitivity` where the feedback cannot be told from none, `no-positive-forcing`; as `gregory`
 *
 * Source    as `gregory`
 * Checked   test/unit/climate/procedures/gregory-sensitivity.test.ts (C: tabulated regressions of the two-layer model)
 */
export function gregorySensitivity(computation: ClaimComputation, procedure: GregoryProcedure): Recomputation {
  const { statement } = computation;
  const { divisor, split, covariance } = procedure;
  const factor = perDoublingFactor(statement.unit);
  const imbalance = seriesOf(computation, 'seriesId', 'the series of the energy imbalance');
  const temperature = seriesOf(computation, 'temperatureSeriesId', 'the series of the warming');
  const wm2PerUnit = checkUnit(imbalance, 'W/m² of imbalance');
  const kPerUnit = warmingFromZero(temperature);
  const aligned = alignWindow([imbalance, temperature], procedure.minMonths, procedure.window);
  const [imbalanceValues = [], warmingValues = []] = aligned.columns;
  const answer = gregory({
    imbalanceWm2: imbalanceValues.map((value) => value * wm2PerUnit),
    warmingK: warmingValues.map((value) => value * kPerUnit),
    years: aligned.years.map((year) => year - aligned.window.start + 1),
    split,
    doublingDivisor: divisor,
    covariance,
  });
  const equilibriumK = boundedEquilibrium(answer);
  const scaled = (kelvin: number | null | undefined) =>
    kelvin === null || kelvin === undefined ? null : (kelvin / divisor) * factor;
  const value = (equilibriumK / divisor) * factor;
  const { unit } = statement;
  const interval = answer.equilibriumFieller95;
  return {
    quantity: 'effective-climate-sensitivity',
    unit,
    value,
    standardError: scaled(answer.equilibriumStandardErrorK),
    interval: interval && { ...interval, low: scaled(interval.low), high: scaled(interval.high) },
    agreement: agreementWithStated(statement.value, value, { bound: statement.bound, unit }),
    fit: null,
    conversion: `F/λ ÷ ${divisor} = ${formatQuantity(equilibriumK, 'K', { significantDigits: 4 })} ÷ ${divisor} = ${formatQuantity(value, unit, { significantDigits: 4 })}`,
    working: gregoryWorking(procedure, [imbalance, temperature], aligned, answer),
    caveats: [
      zeroOfWarming(temperature),
      ...divisorConvention(divisor, equilibriumK),
      ...ofOneAgent(imbalance),
      ...aligned.caveats,
      ...answer.caveats,
    ],
  };
}

function boundedEquilibrium({ equilibriumK, feedbackWm2PerK, ...line }: GregoryValue): number {
  const found = `F ${formatNumber(line.forcingWm2)}, λ ${formatNumber(feedbackWm2PerK)} ± ${formatNumber(line.feedbackStandardErrorWm2PerK)} W/m² per K`;
  if (equilibriumK === null) {
    throw new NumericError({
      code: 'no-finite-sensitivity',
      where: 'procedure gregory',
      expected: 'an imbalance that falls as it warms, by more than its scatter',
      received: found,
      hint: 'The equilibrium cannot be told from unbounded. Check that heat gained counts as positive and that each series is in its place; take more years, or an experiment whose change is abrupt.',
    });
  }
  if (equilibriumK > 0) return equilibriumK;
  throw new NumericError({
    code: 'no-positive-forcing',
    where: 'procedure gregory',
    expected: 'a forcing above 0 W/m² where the line meets ΔT = 0',
    received: found,
    hint: 'Check the zero of both series: the climate before the change. After a fall of CO2 turn both signs round.',
  });
}

function zeroOfWarming({ name, baseline }: SeriesData): Caveat {
  return {
    code: 'zero-of-warming',
    detail: `The warming is taken as ${name} has it${baseline ? `, against ${formatYears(baseline)}` : ''}: forcing and equilibrium are right only if its zero is the climate before the change. The feedback does not depend on it.`,
  };
}

/** F(4×CO2)/F(2×CO2) by Meinshausen et al. 2020 is 2.0993. */
const divisorInUse = 2.1;

function divisorConvention(divisor: number, equilibriumK: number): Caveat[] {
  if (divisor !== 2) return [];
  return [
    {
      code: 'divisor-convention',
      detail: `Half of what 4×CO2 does, as is usual. Forcing grows a little faster than the logarithm; over ${divisorInUse}, which is in use too, it is ${formatQuantity(equilibriumK / divisorInUse, 'K per doubling')}.`,
    },
  ];
}

function ofOneAgent({ name, agent }: SeriesData): Caveat[] {
  if (agent === null) return [];
  return [
    {
      code: 'imbalance-of-an-agent',
      detail: `${name} is the forcing of “${agent}”, and a forcing is no imbalance: that is what is left of it once the planet has warmed.`,
    },
  ];
}
