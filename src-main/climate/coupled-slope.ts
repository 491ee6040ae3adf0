import type { CoupledSlopeInput, CoupledSlopeValue } from '../contract/climate-response.ts';
import type { Caveat } from '../contract/primitives.ts';
import { InputError } from '../errors.ts';
import { finiteNumber } from '../statistics/finite-values.ts';
import { generatorId, randomStream } from '../statistics/random-stream.ts';

/** Draws per random stream. Part of the numbers: changing it changes the digits of every stored result. */
const DRAWS_PER_BLOCK = 65_536;

/**
 * Slope of temperature on ln CO2 when each drives the other: what a regression finds where CO2 warms and warmth sets CO2
 * free.
 *
 * Model    T = γx + e, x = T/τ + v, x = ln(C/C0) about its mean; e and v independent, of variance σ_e² and σ_v². Solved,
 *          T = (γv + e)/(1 − γ/τ), x = (v + e/τ)/(1 − γ/τ); the least-squares slope of T on x in a large sample is
 *          (γσ_v² + σ_e²/τ)/(σ_v² + σ_e²/τ²) = wγ + (1 − w)τ, w = σ_v²/(σ_v² + σ_e²/τ²): between γ and τ, never their sum
 * Assumes  both answer at once, and linearly; no trend that a third thing gives to both
 *
 * @param response       γ ≥ 0, K per e-folding of CO2
 * @param exchange       τ > γ, K per e-folding of CO2
 * @param sdTemperature  σ_e ≥ 0, K; sdCarbon  σ_v ≥ 0, dimensionless; not both 0
 * @param simulation     also draws (e, v), normal, and fits them with an intercept; each 65 536 draws have their own
 *                       random stream
 * @returns  slope in K per e-folding; simulated slope with its classical standard error; caveat not-driven-by-carbon
 * @throws   InputError runaway when γ/τ ≥ 1: each round of the loop adds to the last, and nothing is settled;
 *           no-variation, out-of-range
 *
 * Source   simultaneous-equations bias: Haavelmo 1943, Econometrica 11, 1–12; the loop gain of climate and carbon:
 *          Scheffer et al. 2006, Geophys. Res. Lett. 33, L10702 (both from memory)
 * Checked  test/reference/climate/coupled-slope.test.ts (B: R's lm on draws of R; C: worked value, limits)
 */
export function coupledSlope(
  { response, exchange, sdTemperature, sdCarbon, simulation }: CoupledSlopeInput,
  onProgress?: (shareDone: number) => void,
): CoupledSlopeValue {
  const caller = 'coupledSlope';
  finiteNumber(caller, 'response', response, { atLeast: 0, atMost: 1e6 });
  finiteNumber(caller, 'exchange', exchange, { above: 0, atMost: 1e9 });
  finiteNumber(caller, 'sdTemperature', sdTemperature, { atLeast: 0, atMost: 1e6 });
  finiteNumber(caller, 'sdCarbon', sdCarbon, { atLeast: 0, atMost: 1e6 });
  refuseRunaway(response, exchange);
  const carbonFromTemperature = sdTemperature / exchange;
  const scatter = Math.hypot(sdCarbon, carbonFromTemperature);
  if (scatter === 0) {
    throw new InputError({
      code: 'no-variation',
      where: `${caller}, sdTemperature and sdCarbon`,
      expected: 'one of the two standard deviations above 0',
      received: '0 and 0',
      hint: 'Without anything that moves CO2 or temperature there is no slope.',
    });
  }
  const weightOnResponse = (sdCarbon / scatter) ** 2;
  return {
    slope: response * weightOnResponse + exchange * (carbonFromTemperature / scatter) ** 2,
    weightOnResponse,
    gain: 1 / (1 - response / exchange),
    simulated: simulation ? simulate({ response, exchange, sdTemperature, sdCarbon }, simulation, onProgress) : null,
    caveats: caveatsOf(weightOnResponse),
  };
}

function refuseRunaway(response: number, exchange: number): void {
  if (response < exchange) return;
  throw new InputError({
    code: 'runaway',
    where: 'coupledSlope, response',
    expected: `a response below the exchange coefficient of ${exchange} K, so that γ/τ is below 1`,
    received: `${response} K, γ/τ = ${(response / exchange).toPrecision(3)}`,
    hint: 'Each K of warming would then release CO2 enough for another K or more: no such record could be observed. Check that both are in K per e-folding (per doubling: divide by ln 2).',
  });
}

function simulate(
  { response, exchange, sdTemperature, sdCarbon }: Required<Omit<CoupledSlopeInput, 'simulation'>>,
  { draws: nDraws, seed }: NonNullable<CoupledSlopeInput['simulation']>,
  onProgress?: (shareDone: number) => void,
): NonNullable<CoupledSlopeValue['simulated']> {
  finiteNumber('coupledSlope', 'simulation.draws', nDraws, { isWhole: true, atLeast: 3 });
  const gain = 1 / (1 - response / exchange);
  // Running moments about the means: Welford 1962, Technometrics 4, 419–420.
  let [meanX, meanT, squaresX, squaresT, products] = [0, 0, 0, 0, 0];
  for (let nDone = 0, block = 0; nDone < nDraws; block++) {
    const stream = randomStream(seed, block);
    const end = Math.min(nDone + DRAWS_PER_BLOCK, nDraws);
    while (nDone < end) {
      const e = sdTemperature * stream.normal();
      const v = sdCarbon * stream.normal();
      const temperature = gain * (response * v + e);
      const x = gain * (v + e / exchange);
      nDone++;
      const [fromX, fromT] = [x - meanX, temperature - meanT];
      meanX += fromX / nDone;
      meanT += fromT / nDone;
      squaresX += fromX * (x - meanX);
      squaresT += fromT * (temperature - meanT);
      products += fromX * (temperature - meanT);
    }
    onProgress?.(nDone / nDraws);
  }
  const slope = products / squaresX;
  const unexplained = Math.max(0, squaresT - slope * products);
  return {
    slope,
    standardError: Math.sqrt(unexplained / (nDraws - 2) / squaresX),
    random: { generator: generatorId, seed, nDraws },
  };
}

function caveatsOf(weightOnResponse: number): Caveat[] {
  if (weightOnResponse >= 0.5) return [];
  return [
    {
      code: 'not-driven-by-carbon',
      detail:
        'Most of the variation of CO2 follows from temperature here: the slope says more of the exchange than of the response.',
    },
  ];
}
