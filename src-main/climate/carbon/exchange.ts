import type { ExchangeInput, ExchangeValue } from '../../contract/carbon.ts';
import { InputError } from '../../errors.ts';
import { finiteNumber } from '../../statistics/finite-values.ts';
import { exchangeSources } from '../seawater/exchange-sources.ts';
import { henrySolubility } from '../seawater/henry-solubility.ts';
import { dicShareOf } from '../seawater/revelle-factor.ts';
import { waterSalinity, waterTemperatureC } from '../seawater/water-values.ts';
import { weiss1974 } from '../seawater/weiss1974.ts';
import { co2Level } from './co2-level.ts';
import { exchangeCaveats } from './exchange-caveats.ts';
import { exchangeCoefficient } from './exchange-coefficient.ts';
import { exchangeRange } from './exchange-range.ts';
import { riseFromWarming } from './rise-from-warming.ts';
import { warmingForRise } from './warming-for-rise.ts';

/** A change of temperature beyond this is a temperature. */
const largestWarmingK = 40;

/**
 * Exchange of CO2 between seawater and air: how strongly the CO2 pressure of seawater rises with temperature under one
 * source, what rise a warming gives, what warming a rise would need, and the same coefficient under all sources.
 *
 * Model    τ = 1/(d ln pCO2/dT) at the given temperature; C = C0 exp(ΔT/τ). Solubility: −d ln K0/dT, dissolved CO2 fixed;
 *          isochemical: dissolved carbon and alkalinity fixed. With a Revelle factor R, the water keeps its pressure
 *          by losing 1/(R τ) of its carbon per K
 * Assumes  the slope at the given temperature over the whole change; mole fractions change as pressures do
 *
 * @param input  temperatureC in °C, salinity in g/kg, levels in ppm, warmingK in K
 * @returns  solubility where the source has one, slope in 1/K, coefficients in K, rise in ppm; caveats
 * @throws   InputError `suspected-unit` (kelvin, °F, ppb, a temperature as a warming), `out-of-range`,
 *           `missing-salinity`, `missing-level`
 *
 * Source    see `weiss1974`, `henrySolubility`, `takahashi1993`, `humphreys2024`
 * Checked   test/reference/climate/exchange.test.ts (B: nine cases computed elsewhere)
 */
export function exchange(input: ExchangeInput): ExchangeValue {
  const { source, salinity = 0, co2Ppm, toPpm, warmingK, revelleFactor } = input;
  refuseBadInput(input);
  const { kind, slopePerK } = exchangeSources[source];
  const coefficient = exchangeCoefficient(slopePerK(input.temperatureC, salinity), input.temperatureC);
  const { exchangeCoefficientK, dLnPco2PerK } = coefficient;
  const value: ExchangeValue = {
    source,
    kind,
    ...solubilities(input),
    ...coefficient,
    range: exchangeRange(input.temperatureC, input.salinity, co2Ppm),
    caveats: [],
  };
  if (co2Ppm !== undefined) {
    value.ppmPerK = co2Ppm * dLnPco2PerK;
    if (warmingK !== undefined) value.rise = riseFromWarming(exchangeCoefficientK, co2Ppm, warmingK);
    if (toPpm !== undefined) value.warmingNeededK = warmingForRise(exchangeCoefficientK, co2Ppm, toPpm);
  }
  if (revelleFactor !== undefined) value.dicPercentPerK = 100 * dicShareOf(dLnPco2PerK, revelleFactor);
  // Of two changes the larger one leaves the fitted range first.
  const changes = [warmingK, value.warmingNeededK].filter((change) => change !== undefined);
  const largest = changes.toSorted((one, other) => Math.abs(other) - Math.abs(one))[0];
  value.caveats = exchangeCaveats(input, largest ?? null);
  return value;
}

function refuseBadInput({ source, temperatureC, salinity, co2Ppm, warmingK, toPpm }: ExchangeInput): void {
  waterTemperatureC('exchange', 'temperatureC', temperatureC);
  if (salinity !== undefined) waterSalinity('exchange', salinity);
  else if (exchangeSources[source].needsSalinity) {
    throw new InputError({
      code: 'missing-salinity',
      where: 'exchange, salinity',
      expected: `a salinity, on which ${source} depends`,
      received: 'none',
      hint: 'The open ocean has about 35 g/kg, fresh water 0.',
    });
  }
  if (co2Ppm !== undefined) co2Level('exchange', 'co2Ppm', co2Ppm);
  if (toPpm !== undefined) co2Level('exchange', 'toPpm', toPpm);
  if (co2Ppm === undefined && (warmingK !== undefined || toPpm !== undefined)) {
    throw new InputError({
      code: 'missing-level',
      where: 'exchange, co2Ppm',
      expected: 'the CO2 level from which the change starts, in ppm',
      received: 'none',
      hint: 'Give co2Ppm beside warmingK or toPpm.',
    });
  }
  if (warmingK === undefined) return;
  finiteNumber('exchange', 'warmingK', warmingK);
  if (Math.abs(warmingK) <= largestWarmingK) return;
  throw new InputError({
    code: 'suspected-unit',
    where: 'exchange, warmingK',
    expected: `a change of temperature in K, at most ${largestWarmingK} either way`,
    received: String(warmingK),
    hint: 'It looks like a temperature: give the difference of two temperatures.',
  });
}

function solubilities({ source, temperatureC, salinity = 0 }: ExchangeInput): Partial<ExchangeValue> {
  if (source === 'weiss1974') {
    const { solubilityMolPerKgAtm, solubilityMolPerLAtm } = weiss1974(temperatureC, salinity);
    return { solubilityMolPerKgAtm, solubilityMolPerLAtm };
  }
  if (source !== 'henry-vant-hoff') return {};
  const { solubilityMolPerM3Pa, solubilityMolPerLAtm, solubilityWaterAir } = henrySolubility(temperatureC);
  return { solubilityMolPerM3Pa, solubilityMolPerLAtm, solubilityWaterAir };
}
