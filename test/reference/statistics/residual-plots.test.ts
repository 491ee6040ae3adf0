import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { autocorrelations } from '../../../src-main/statistics/autocorrelations.ts';
import { lagOneAutocorrelation } from '../../../src-main/statistics/lag-one-autocorrelation.ts';
import { normalQuantilePlot } from '../../../src-main/statistics/normal-quantile-plot.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR();
});
afterAll(() => r.close());

const near = { rel: 1e-11, abs: 1e-12, why: 'two double-precision programs' };
const { temperatureK } = co2AndTemperature();
const rows = (values: readonly number[]) => values.map((_, row) => 1960 + row);

describe('autocorrelations', () => {
  // Level B: R's acf.
  it('are those of R, for two numbers of lags', async () => {
    const { lake = [] } = await r.numbers('list(lake = LakeHuron)');
    for (const y of [lake, temperatureK]) {
      for (const lags of [5, 17]) {
        const reference = await r.numbers('list(r = acf(y, lag.max = lags, plot = FALSE)$acf[-1])', { y, lags });
        expectClose({ r: autocorrelations(y, rows(y), lags) }, reference, near);
      }
    }
    expectClose(autocorrelations(lake, rows(lake), 1)[0], lagOneAutocorrelation(lake), near);
  });

  // Level C: values −1, 1, 2, −2 (mean 0, Σe² = 10) at 2001, 2002, 2005, 2006.
  it('count the calendar, not the rows, across a gap', () => {
    const found = autocorrelations([-1, 1, 2, -2], [2001, 2002, 2005, 2006], 3);
    // One apart: −1·1 and 2·(−2); two apart: none; three apart: 1·2.
    expectClose(found, [-5 / 10, 0, 2 / 10], near);
  });

  it.each([
    ['a constant', [1, 1, 1], [1, 2, 3], 1, 'not all equal'],
    ['as many lags as values', [1, 2, 4], [1, 2, 3], 3, 'autocorrelations, maxLag'],
    ['times of another length', [1, 2, 4], [1, 2], 1, 'autocorrelations, times'],
  ] as const)('refuse %s', (_, values, times, lags, sentence) => {
    expect(() => autocorrelations(values, times, lags)).toThrow(sentence);
  });
});

describe('normalQuantilePlot', () => {
  // Level B: R's qqnorm; qqline draws through the quartiles of type 7.
  it('is that of R, for a short and for a long sample', async () => {
    for (const y of [temperatureK.slice(0, 9), temperatureK]) {
      const { normal, values, line } = normalQuantilePlot(y);
      const reference = await r.numbers(
        `points <- qqnorm(sort(y), plot.it = FALSE)
         slope <- diff(quantile(y, c(0.25, 0.75))) / diff(qnorm(c(0.25, 0.75)))
         list(normal = points$x, values = points$y, line = c(quantile(y, 0.25) - slope * qnorm(0.25), slope))`,
        { y },
      );
      expectClose({ normal, values, line: [line.intercept, line.slope] }, reference, near);
    }
  });

  it('refuses a constant', () => {
    expect(() => normalQuantilePlot([2, 2, 2])).toThrow('not all equal');
  });
});
