import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { TrendProcedure } from '../../../src-main/contract/procedure.ts';
import { recompute } from '../../../src-main/climate/procedures/recompute.ts';
import { computationOf, realTemperature } from '../../helpers/claim-computation.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

// Level B: R's lm on the same published record, against the calendar year itself.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./log-regression.R', import.meta.url));
});
afterAll(() => r.close());

const temperature = realTemperature();

describe('trend against R', () => {
  for (const [start, end, per, factor, lag, small] of [
    [1880, 2023, 'decade', 10, 4, false],
    [1970, 2019, 'year', 1, 7, true],
  ] as const) {
    it(`gives the slope and errors of lm, ${start}–${end}, per ${per}`, async () => {
      const procedure: TrendProcedure = {
        kind: 'trend',
        seriesId: 1,
        minMonths: 12,
        window: { start, end },
        covariance: small ? { kind: 'newey-west', lag, smallSample: true } : { kind: 'classical' },
        per,
      };
      const statement = { unit: `K per ${per}`, quantity: 'trend', value: '0.08' } as const;
      const { fit, value, unit } = recompute(computationOf(procedure, { seriesId: temperature }, statement));
      const fromR = await r.numbers('trend_line(year, temperature, start, end, lag, small)', {
        year: temperature.values.years,
        temperature: temperature.values.values as number[],
        start,
        end,
        lag,
        small,
      });
      const tolerance = { rel: 1e-10, abs: 0, why: 'R fits on the year itself, which costs it some digits' };
      const slopes = small ? [...(fit?.slopes ?? [])].reverse() : (fit?.slopes ?? []);
      expect(unit).toBe(`K per ${per}`);
      expectClose(value, fromR['slope']![0]! * factor, tolerance, 'value');
      expectClose(
        slopes.map(({ standardError }) => standardError),
        fromR['standardErrors'],
        tolerance,
        'errors',
      );
      expectClose(fit?.diagnostics.durbinWatson, fromR['durbinWatson']![0], tolerance, 'Durbin–Watson');
      expectClose(fit?.diagnostics.rSquaredCentred, fromR['rSquaredCentred']![0], tolerance, 'R²');
    });
  }
});
