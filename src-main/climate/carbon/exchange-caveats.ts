import type { ExchangeInput } from '../../contract/carbon.ts';
import type { Caveat } from '../../contract/primitives.ts';
import { formatNumber } from '../../quantities/notation.ts';
import { exchangeSources } from '../seawater/exchange-sources.ts';

/** A slope that changes by less than this over the warming may pass for constant. */
const notableShare = 0.02;

const scope = {
  solubility:
    'CO2 that is merely dissolved, its amount held fixed. Most carbon in seawater is bicarbonate, which warming turns back into CO2 as well; the isochemical effect counts that and is larger.',
  isochemical:
    'A surface water whose dissolved carbon and alkalinity stay as they are. Where ocean and atmosphere exchange carbon, the loss lowers the pressure again: the effect on the atmosphere is smaller.',
};

/**
 * What must stand beside an exchange coefficient: what it describes, where it was fitted, and what was assumed.
 *
 * @param input     of the request, checked
 * @param warmingK  given or needed; null when neither was asked for
 * @returns  scope-solubility or scope-isochemical, outside-fitted-range, salinity-not-used, outside-salinity-range,
 *           salinity-as-fraction, slope-changes, ppm-for-microatm
 *
 * Checked   test/unit/climate/carbon/exchange-caveats.test.ts (C: each on and off)
 */
export function exchangeCaveats(input: ExchangeInput, warmingK: number | null): Caveat[] {
  const { kind } = exchangeSources[input.source];
  return [
    { code: `scope-${kind}`, detail: scope[kind] },
    ...rangeCaveats(input, warmingK),
    ...salinityCaveats(input),
    ...slopeCaveats(input, warmingK),
    ...(input.co2Ppm === undefined ? [] : [ppmForMicroatm]),
  ];
}

const ppmForMicroatm: Caveat = {
  code: 'ppm-for-microatm',
  detail:
    'The laws are for pCO2 in µatm; levels here are mole fractions in dry air, ppm. pCO2 = ppm × (pressure − water vapour), 1.7 % less in number at 15 °C and one atmosphere, 3.1 % at 25 °C. Ratios are taken as equal.',
};

function rangeCaveats({ source, temperatureC }: ExchangeInput, warmingK: number | null): Caveat[] {
  const { label, range } = exchangeSources[source];
  const { lowC, highC, origin } = range;
  const span = `${formatNumber(lowC, 1)} to ${formatNumber(highC, 1)} °C, ${origin}`;
  const isOutside = (value: number) => value < lowC || value > highC;
  const endC = temperatureC + (warmingK ?? 0);
  if (isOutside(temperatureC)) {
    const fahrenheit =
      temperatureC > highC ? ` If it was °F, it is ${formatNumber((temperatureC - 32) / 1.8, 1)} °C.` : '';
    return [
      {
        code: 'outside-fitted-range',
        detail: `${formatNumber(temperatureC, 1)} °C is outside ${span} (${label}). The coefficient is extrapolated.${fahrenheit}`,
      },
    ];
  }
  if (!isOutside(endC)) return [];
  return [
    {
      code: 'outside-fitted-range',
      detail: `A change by ${formatNumber(warmingK ?? 0, 1)} K ends at ${formatNumber(endC, 1)} °C, outside ${span} (${label}).`,
    },
  ];
}

function salinityCaveats({ source, salinity }: ExchangeInput): Caveat[] {
  if (salinity === undefined) return [];
  const { label, needsSalinity } = exchangeSources[source];
  if (!needsSalinity) return [{ code: 'salinity-not-used', detail: `${label} does not depend on salinity.` }];
  if (salinity > 40) {
    return [{ code: 'outside-salinity-range', detail: `S ${salinity} is above 40, where ${label} was fitted.` }];
  }
  if (salinity < 0.02 || salinity > 0.045) return [];
  const asGrams = Number((1000 * salinity).toPrecision(12));
  return [
    {
      code: 'salinity-as-fraction',
      detail: `S ${salinity} is all but fresh water. If it was meant as a share of mass, it is ${asGrams} g/kg.`,
    },
  ];
}

function slopeCaveats({ source, temperatureC, salinity = 0 }: ExchangeInput, warmingK: number | null): Caveat[] {
  const endC = temperatureC + (warmingK ?? 0);
  // Beyond what can be a temperature of water the range caveat says enough.
  if (warmingK === null || endC < -5 || endC > 60) return [];
  const { slopePerK } = exchangeSources[source];
  const atStart = slopePerK(temperatureC, salinity);
  const atEnd = slopePerK(endC, salinity);
  if (Math.abs(atEnd / atStart - 1) < notableShare) return [];
  return [
    {
      code: 'slope-changes',
      detail: `The coefficient at the start is used throughout: ${formatNumber(1 / atStart, 1)} K. At the end of a change by ${formatNumber(warmingK, 1)} K it is ${formatNumber(1 / atEnd, 1)} K.`,
    },
  ];
}
