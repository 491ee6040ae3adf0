import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { phaseSurrogates } from '../../../src-main/statistics/phase-surrogates.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

// Level B: R's fft, on LakeHuron with an even and an odd number of years.

let r: RSession;
beforeAll(async () => {
  r = await startR();
});
afterAll(() => r.close());

const rounding = { rel: 1e-11, abs: 1e-10, why: 'sums of a hundred terms, after a level of 579 has been taken off' };

describe('phaseSurrogates', () => {
  it.each([98, 97])('has the amplitudes of the series and the phases of its stream: %d years', async (nYears) => {
    const { values = [] } = await r.numbers('list(values = LakeHuron[1:nYears])', { nYears });
    const surrogates = phaseSurrogates({ values, draws: 3, seed: 21 });
    for (const [draw, surrogate] of surrogates.entries()) {
      const { uniform } = randomStream(21, draw);
      const u = Array.from({ length: Math.floor(nYears / 2) }, uniform);
      const fromR = await r.numbers(
        `n <- length(values)
         half <- seq_len(floor(n / 2))
         phases <- ifelse(2 * half == n, ifelse(u < 0.5, pi, 0), 2 * pi * u)
         z <- Mod(fft(values)) + 0i
         z[1] <- sum(values)
         z[half + 1] <- z[half + 1] * exp(1i * phases)
         z[n + 1 - half] <- Conj(z[half + 1])
         list(surrogate = Re(fft(z, inverse = TRUE)) / n, periodogram = Mod(fft(values)))`,
        { values, u },
      );
      expectClose(surrogate, fromR['surrogate'], rounding);
      const { again } = await r.numbers('list(again = Mod(fft(made)))', { made: [...surrogate] });
      expectClose(again, fromR['periodogram'], { ...rounding, rel: 1e-10, abs: 1e-8 });
    }
    expect(surrogates[0]).not.toEqual(surrogates[1]);
  });
});
