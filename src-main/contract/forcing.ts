import { z } from 'zod';
import { oneOrEach } from './line-estimators.ts';
import { caveat } from './primitives.ts';

export const forcingFormula = z.enum(['ipcc1990', 'myhre1998', 'etminan2016', 'meinshausen2020']);
export type ForcingFormula = z.infer<typeof forcingFormula>;

/** One number for all rows, or one for each; a gas and its reference go together. */
const forcingInput = z.object({
  formula: forcingFormula,
  /** `ar6`: effective forcing by AR6's tropospheric adjustments; without it, stratospherically adjusted forcing. */
  adjustment: z.enum(['none', 'ar6']).optional(),
  co2Ppm: oneOrEach,
  co2RefPpm: oneOrEach,
  ch4Ppb: oneOrEach.optional(),
  ch4RefPpb: oneOrEach.optional(),
  n2oPpb: oneOrEach.optional(),
  n2oRefPpb: oneOrEach.optional(),
});
export type ForcingInput = z.infer<typeof forcingInput>;

/** Numbers when every concentration was one number, else a value for each row. */
const forcingValue = z.object({
  co2Wm2: oneOrEach,
  /** Only of a gas that was given. */
  ch4Wm2: oneOrEach.optional(),
  n2oWm2: oneOrEach.optional(),
  totalWm2: oneOrEach,
  caveats: z.array(caveat),
});
export type ForcingValue = z.infer<typeof forcingValue>;

export const forcingMethods = { forcing: { input: forcingInput, value: forcingValue } } as const;
