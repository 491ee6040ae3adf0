import type { ResponseForcing } from '../../contract/climate-response.ts';
import { finiteNumber, finiteValues } from '../../statistics/finite-values.ts';

/** Far beyond any planet, and safe to compute with; W/m². */
const within = { atLeast: -1e6, atMost: 1e6 };

/**
 * The door of the two-layer model for a forcing.
 *
 * @throws   InputError not-finite, out-of-range, too-few-values
 *
 * Checked   test/unit/climate/two-layer/check-forcing.test.ts (C: each kind, by name)
 */
export function checkForcing(caller: string, forcing: ResponseForcing): void {
  if (forcing.kind === 'step') finiteNumber(caller, 'forcing.wm2', forcing.wm2, within);
  else if (forcing.kind === 'ramp') finiteNumber(caller, 'forcing.wm2PerYr', forcing.wm2PerYr, within);
  else {
    const wm2 = finiteValues(caller, 'forcing.wm2', forcing.wm2);
    const place = wm2.findIndex((value) => Math.abs(value) > within.atMost);
    if (place >= 0) finiteNumber(caller, `forcing.wm2[${place}]`, wm2[place]!, within);
  }
}
