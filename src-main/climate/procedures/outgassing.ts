import type { ExchangeKind, ExchangeValue } from '../../contract/carbon.ts';
import type { ClaimComputation } from '../../contract/compute.ts';
import type { Caveat } from '../../contract/primitives.ts';
import type { OutgassingProcedure } from '../../contract/procedure.ts';
import type { Recomputation, WorkingTable } from '../../contract/result.ts';
import { exchangeSourceNames } from '../../quantities/exchange-source-names.ts';
import { formatQuantity, withUnit } from '../../quantities/notation.ts';
import { agreementWithStated } from '../../quantities/stated-number.ts';
import { exchange } from '../carbon/exchange.ts';
import { riseFromWarming } from '../carbon/rise-from-warming.ts';
import { warmingForRise } from '../carbon/warming-for-rise.ts';
import { checkStatedUnit } from './stated-unit.ts';

/**
 * Outgassing, "one degree adds so many ppm": the rise of CO2 that a warming gives under the law that the claim names.
 *
 * Model    as `exchange`: C = C0 exp(ΔT/τ). The figures are taken as exact, a degree as one degree
 *
 * @returns  the rise in ppm; the same under every law and record, and the warming that a recorded rise would need, in the
 *           working. No interval: the laws differ by more than any of them is uncertain
 * @throws   InputError `unit-mismatch`; as `exchange`
 *
 * Source    as `exchange`
 * Checked   test/unit/climate/procedures/outgassing.test.ts (B: 12.1 and 18.1 ppm, 9.91 K, nine coefficients computed
 *           elsewhere; C)
 */
export function outgassing({ statement }: ClaimComputation, procedure: OutgassingProcedure): Recomputation {
  const { source, warmingK, temperatureC, salinity, co2Ppm, toPpm } = procedure;
  checkStatedUnit('outgassing', statement.unit, 'ppm');
  const answer = exchange({
    source,
    temperatureC,
    warmingK,
    co2Ppm,
    ...(salinity === null ? {} : { salinity }),
    ...(toPpm === null ? {} : { toPpm }),
  });
  const { exchangeCoefficientK } = answer;
  const value = riseFromWarming(exchangeCoefficientK, co2Ppm, warmingK).risePpm;
  const tau = formatQuantity(exchangeCoefficientK, 'K', { significantDigits: 4 });
  return {
    quantity: 'co2-change',
    unit: 'ppm',
    value,
    standardError: null,
    interval: null,
    agreement: agreementWithStated(statement.value, value, { bound: statement.bound, unit: 'ppm' }),
    fit: null,
    conversion: `${given(co2Ppm, 'ppm')} × (exp(${given(warmingK, 'K')} ÷ ${tau}) − 1) = ${formatQuantity(value, 'ppm', { significantDigits: 4 })}`,
    working: [inputTable(procedure), answerTable(procedure, answer), rangeTable(procedure, answer)],
    caveats: [...answer.caveats, netSink],
  };
}

const netSink: Caveat = {
  code: 'nature-is-a-net-sink',
  detail:
    'What warm water would give off is not what the ocean does while CO2 in the air rises from other causes. People emitted about twice what stayed in the air, 10.8 against 5.2 GtC a year in 2014–2023 (Global Carbon Budget 2024, partly from memory): land and ocean took CO2 up on balance.',
};

function inputTable(procedure: OutgassingProcedure): WorkingTable {
  const { source, warmingK, temperatureC, salinity, co2Ppm, toPpm } = procedure;
  return {
    caption: 'What goes in',
    columns: ['Quantity', 'Value'],
    rows: [
      ['law', exchangeSourceNames[source]],
      ['warming ΔT', given(warmingK, 'K')],
      ['temperature of the water', given(temperatureC, '°C')],
      ...(salinity === null ? [] : [['salinity', given(salinity, 'g/kg')]]),
      ['CO₂ at the start, C₀', given(co2Ppm, 'ppm')],
      ...(toPpm === null ? [] : [['end of the recorded rise', given(toPpm, 'ppm')]]),
    ],
  };
}

function answerTable({ co2Ppm, toPpm }: OutgassingProcedure, answer: ExchangeValue): WorkingTable {
  const { dLnPco2PerK, exchangeCoefficientK, doublingK, ppmPerK, rise, warmingNeededK } = answer;
  return {
    caption: 'Under the law of the claim',
    columns: ['Figure', 'Value'],
    rows: [
      ['slope d ln p/dT, % per K', 100 * dLnPco2PerK],
      ['τ, the warming for a factor e, K', exchangeCoefficientK],
      ['the warming for a doubling, K', doublingK],
      [`ppm per K at ${given(co2Ppm, 'ppm')}`, ppmPerK ?? null],
      ['rise by the slope at the start, without compounding, ppm', rise?.risePpmBySlope ?? null],
      ['CO₂ afterwards, ppm', rise?.toPpm ?? null],
      ...(toPpm === null ? [] : [[neededHeading(co2Ppm, toPpm), warmingNeededK ?? null]]),
    ],
  };
}

const kindNames: Record<ExchangeKind, string> = {
  solubility: 'dissolved gas alone',
  isochemical: 'closed surface water',
  record: 'the whole system, both ways',
};

function rangeTable({ co2Ppm, warmingK, toPpm }: OutgassingProcedure, { range }: ExchangeValue): WorkingTable {
  return {
    caption: 'The same under every law and record, from the strongest to the weakest',
    columns: [
      'Law or record',
      'Describes',
      'τ (K)',
      'ppm per K',
      'Rise (ppm)',
      ...(toPpm === null ? [] : [neededHeading(co2Ppm, toPpm)]),
    ],
    rows: range.rows.map(({ label, kind, exchangeCoefficientK, ppmPerK }) => [
      label,
      kindNames[kind],
      exchangeCoefficientK,
      ppmPerK ?? null,
      riseFromWarming(exchangeCoefficientK, co2Ppm, warmingK).risePpm,
      ...(toPpm === null ? [] : [warmingForRise(exchangeCoefficientK, co2Ppm, toPpm)]),
    ]),
  };
}

const neededHeading = (co2Ppm: number, toPpm: number) => `Needed for ${co2Ppm} to ${toPpm} ppm (K)`;
const given = (value: number, unit: string) => withUnit(String(value).replace('-', '−'), unit);
