import { afterAll, beforeAll, describe, it } from 'vitest';
import { designColumns } from '../../../src-main/statistics/design-columns.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { leaveOneOut } from '../../../src-main/statistics/leave-one-out.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: R's dfbeta (the coefficients less those without each row), on the real record.

let r: RSession;
beforeAll(async () => {
  r = await startR();
});
afterAll(() => r.close());

describe('leaveOneOut', () => {
  it('R’s dfbeta, with and without an intercept', async () => {
    const { co2Ppm, temperatureK: y } = co2AndTemperature();
    const x = co2Ppm.map((value) => Math.log(value / 300));
    for (const intercept of [true, false]) {
      const fit = leastSquares({ columns: designColumns('test', x, y.length, intercept), y });
      const place = intercept ? 1 : 0;
      const { slopes } = await r.numbers(
        `fit <- if (intercept) lm(y ~ x) else lm(y ~ x - 1)
         list(slopes = coef(fit)[["x"]] - dfbeta(fit)[, "x"])`,
        { x, y, intercept },
      );
      expectClose(leaveOneOut(fit, place).coefficients, slopes, { rel: 1e-11, abs: 0, why: 'rounding' });
    }
  });
});
