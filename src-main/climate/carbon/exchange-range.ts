import type { ExchangeSourceId, ExchangeValue } from '../../contract/carbon.ts';
import { recordedCo2Changes } from '../../quantities/recorded-co2-changes.ts';
import { exchangeSources } from '../seawater/exchange-sources.ts';

type Row = ExchangeValue['range']['rows'][number];

/** Of the open ocean; for the row of Weiss 1974 where no other is given. */
export const usualSalinity = 35;

/**
 * The exchange coefficient under every source at once: the laws of seawater at one temperature, and what records of the
 * past show for the whole system.
 *
 * Model    τ = 1/(d ln p/dT) for a law; τ = ΔT/ln(C/C0) for a record
 *
 * @param temperatureC  °C
 * @param salinity      g/kg; 35 unless given, said in the row's label
 * @param co2Ppm        level for ppm per K, or none
 * @returns  rows from the smallest τ up, their ends; K
 * @throws   InputError `suspected-unit`, `out-of-range`
 *
 * Source    see the sources; records in `quantities/recorded-co2-changes.ts`
 * Checked   test/reference/climate/exchange.test.ts (B: nine cases computed elsewhere)
 */
export function exchangeRange(
  temperatureC: number,
  salinity: number = usualSalinity,
  co2Ppm?: number,
): ExchangeValue['range'] {
  const row = (label: string, kind: Row['kind'], dLnPco2PerK: number): Row => ({
    label,
    kind,
    dLnPco2PerK,
    exchangeCoefficientK: 1 / dLnPco2PerK,
    ...(co2Ppm === undefined ? {} : { ppmPerK: co2Ppm * dLnPco2PerK }),
  });
  const rows = [
    ...(Object.keys(exchangeSources) as ExchangeSourceId[]).map((id) => {
      const { label, kind, needsSalinity, slopePerK } = exchangeSources[id];
      return row(needsSalinity ? `${label}, S ${salinity}` : label, kind, slopePerK(temperatureC, salinity));
    }),
    ...recordedCo2Changes.map(({ label, fromPpm, toPpm, warmingK }) =>
      row(label, 'record', Math.log(toPpm / fromPpm) / warmingK),
    ),
  ].sort((one, other) => one.exchangeCoefficientK - other.exchangeCoefficientK);
  const coefficients = rows.map(({ exchangeCoefficientK }) => exchangeCoefficientK);
  return { lowK: Math.min(...coefficients), highK: Math.max(...coefficients), rows };
}
