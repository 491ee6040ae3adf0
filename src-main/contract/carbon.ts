import { z } from 'zod';
import { column, rowYears } from './line-estimators.ts';
import { caveat } from './primitives.ts';

export const exchangeSource = z.enum([
  'weiss1974',
  'henry-vant-hoff',
  /** Linear, 0.0423 per °C. */
  'takahashi1993',
  'takahashi1993-quadratic',
  'humphreys2024-fit',
  'humphreys2024-enthalpy',
]);
export type ExchangeSourceId = z.infer<typeof exchangeSource>;

const exchangeInput = z.object({
  source: exchangeSource,
  temperatureC: z.number(),
  /** g/kg; weiss1974 needs it, the others have none. */
  salinity: z.number().optional(),
  /** Level at which ppm per K is wanted, and from which a rise starts. */
  co2Ppm: z.number().optional(),
  /** A change of temperature: which rise follows? */
  warmingK: z.number().optional(),
  /** The end of a rise from co2Ppm: which warming would be needed for it? */
  toPpm: z.number().optional(),
  revelleFactor: z.number().optional(),
});
export type ExchangeInput = z.infer<typeof exchangeInput>;

/** What the coefficient describes: CO2 that is merely dissolved, a closed seawater, or a record of the whole system. */
const exchangeKind = z.enum(['solubility', 'isochemical', 'record']);
export type ExchangeKind = z.infer<typeof exchangeKind>;

const efolding = {
  dLnPco2PerK: z.number(),
  /** α in ln p = const − α/T, K. */
  vantHoffK: z.number(),
  /** τ = T0²/α, K of warming for a rise by the factor e. */
  exchangeCoefficientK: z.number(),
  doublingK: z.number(),
};

const exchangeValue = z.object({
  source: exchangeSource,
  kind: exchangeKind,
  solubilityMolPerKgAtm: z.number().optional(),
  solubilityMolPerLAtm: z.number().optional(),
  solubilityMolPerM3Pa: z.number().optional(),
  /** Concentration in water over concentration in air. */
  solubilityWaterAir: z.number().optional(),
  ...efolding,
  ppmPerK: z.number().optional(),
  /** From co2Ppm by warmingK; `risePpmBySlope` is the same without compounding. */
  rise: z.object({ toPpm: z.number(), risePpm: z.number(), risePpmBySlope: z.number() }).optional(),
  warmingNeededK: z.number().optional(),
  /** Per cent of its dissolved carbon that the water gives off for each K, to keep its CO2 pressure. */
  dicPercentPerK: z.number().optional(),
  /** τ of every source at this temperature, and of records of the past, from the smallest up. */
  range: z.object({
    lowK: z.number(),
    highK: z.number(),
    rows: z.array(
      z.object({
        label: z.string(),
        kind: exchangeKind,
        dLnPco2PerK: z.number(),
        exchangeCoefficientK: z.number(),
        ppmPerK: z.number().optional(),
      }),
    ),
  }),
  caveats: z.array(caveat),
});
export type ExchangeValue = z.infer<typeof exchangeValue>;

const carbonBudgetInput = z
  .object({
    years: rowYears.optional(),
    /** Without cement carbonation when that is given, else as the source counts it. */
    fossilGtCPerYr: column,
    landUseGtCPerYr: column,
    growthGtCPerYr: column.optional(),
    growthPpmPerYr: column.optional(),
    /** For growth in ppm; 2.124 unless given. */
    gtCPerPpm: z.number().optional(),
    /** Sinks are positive: what leaves the atmosphere. */
    cementCarbonationGtCPerYr: column.optional(),
    oceanSinkGtCPerYr: column.optional(),
    landSinkGtCPerYr: column.optional(),
    /** Take the values as GtC even where they look like another unit. */
    unitConfirmed: z.boolean().optional(),
  })
  .refine(({ growthGtCPerYr, growthPpmPerYr }) => (growthGtCPerYr === undefined) !== (growthPpmPerYr === undefined), {
    error: 'give either growthGtCPerYr or growthPpmPerYr',
  });
export type CarbonBudgetInput = z.infer<typeof carbonBudgetInput>;

const fraction = z.number().nullable();
const carbonBudgetValue = z.object({
  /** Emissions of people: fossil, less cement carbonation when it was given, and land use. */
  emissionsGtCPerYr: column,
  growthGtCPerYr: column,
  /** Growth less emissions; negative: land and ocean take up more than they give off. */
  naturalNetFluxGtCPerYr: column,
  /** Growth over all emissions, and over fossil emissions alone; null where there are none. */
  airborneFractionOfTotal: z.array(fraction),
  airborneFractionOfFossil: z.array(fraction),
  /** What the ocean sink leaves for the land. */
  residualLandSinkGtCPerYr: column.optional(),
  /** Emissions less growth and both sinks. */
  imbalanceGtCPerYr: column.optional(),
  /** Over all years; fractions are those of the sums. */
  mean: z.object({
    emissionsGtCPerYr: z.number(),
    growthGtCPerYr: z.number(),
    naturalNetFluxGtCPerYr: z.number(),
    airborneFractionOfTotal: fraction,
    airborneFractionOfFossil: fraction,
    residualLandSinkGtCPerYr: z.number().optional(),
    imbalanceGtCPerYr: z.number().optional(),
  }),
  sign: z.object({
    nSinkYears: z.int(),
    nSourceYears: z.int(),
    nYears: z.int(),
    /** Years, or row numbers from 0 without years, in which nature was no net sink. */
    exceptions: z.array(z.int()),
    statement: z.string(),
  }),
  caveats: z.array(caveat),
});
export type CarbonBudgetValue = z.infer<typeof carbonBudgetValue>;

export const carbonMethods = {
  exchange: { input: exchangeInput, value: exchangeValue },
  'carbon-budget': { input: carbonBudgetInput, value: carbonBudgetValue },
} as const;
