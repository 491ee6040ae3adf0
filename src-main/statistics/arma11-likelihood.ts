import { arma11Filter } from './arma11-filter.ts';
import { multiplyByQTransposed, pivotedQr, solveUpper } from './pivoted-qr.ts';
import { sumOfProducts } from './summation.ts';

export interface Arma11Height {
  phi: number;
  theta: number;
  logLikelihood: number;
  /** Derivatives of the log-likelihood by φ and θ, with the coefficients and σ at their best for each. */
  slopePhi: number;
  slopeTheta: number;
}

/**
 * Profile log-likelihood of a line with ARMA(1,1) errors over φ and θ: coefficients and σ² at their best for each pair,
 * with the exact derivatives, so that a maximum can be found to more digits than its own height shows.
 *
 * Model    ℓ = −n/2 (log 2πS/n + 1) − ½ Σ log F_t, S = Σ (v_t²/F_t), v the prediction errors of e = y − Xb. By the
 *          envelope theorem b does not count in the derivatives: they follow from the recursions of `arma11Filter`,
 *          differentiated for fixed e
 *
 * @param columns  design, linearly independent; y [nObs]; steps as `arma11Filter`
 *
 * Checked  test/unit/statistics/arma11-likelihood.test.ts (C: difference quotients); test/reference/statistics/gls-arma11.test.ts
 *          (B: dense covariance matrices in base R)
 */
export function arma11Likelihood(
  columns: readonly Float64Array[],
  y: Float64Array,
  steps: Float64Array,
): (phi: number, theta: number) => Arma11Height {
  const n = y.length;
  return (phi, theta) => {
    const { freed, logVariances } = arma11Filter(phi, theta, steps);
    const coefficients = bestCoefficients(columns.map(freed), freed(y));
    const errors = y.map((value, t) =>
      columns.reduce((rest, column, j) => rest - coefficients[j]! * column[t]!, value),
    );
    const innovations = freed(errors);
    const squares = sumOfProducts(innovations, innovations);
    const { squaresByPhi, squaresByTheta, logsByPhi, logsByTheta } = derivatives(phi, theta, errors, steps);
    return {
      phi,
      theta,
      logLikelihood: -0.5 * (n * (Math.log((2 * Math.PI * squares) / n) + 1) + logVariances),
      slopePhi: -0.5 * ((n * squaresByPhi) / squares + logsByPhi),
      slopeTheta: -0.5 * ((n * squaresByTheta) / squares + logsByTheta),
    };
  };
}

function bestCoefficients(columns: Float64Array[], y: Float64Array): Float64Array {
  const qr = pivotedQr(columns);
  multiplyByQTransposed(qr, y);
  const solution = solveUpper(qr, y);
  const coefficients = new Float64Array(columns.length);
  qr.pivot.forEach((j, place) => (coefficients[j] = solution[place]!));
  return coefficients;
}

/** Derivatives of S = Σ v²/F and of Σ log F, one pass; p and G as in `arma11Filter`, dP the derivative by P of φ or θ. */
function derivatives(phi: number, theta: number, errors: Float64Array, steps: Float64Array) {
  const both = phi + theta;
  const stationary = (1 - phi) * (1 + phi);
  let g = both ** 2 / stationary;
  let gByPhi = (2 * both) / stationary + (2 * phi * both ** 2) / stationary ** 2;
  let gByTheta = (2 * both) / stationary;
  let [p, pByPhi, pByTheta] = [0, 0, 0];
  let [squaresByPhi, squaresByTheta, logsByPhi, logsByTheta] = [0, 0, 0, 0];
  for (let t = 0; t < errors.length; t++) {
    for (let missing = 1; missing < steps[t]!; missing++) {
      gByPhi = 2 * both + 2 * phi * g + phi ** 2 * gByPhi;
      gByTheta = 2 * both + phi ** 2 * gByTheta;
      g = both ** 2 + phi ** 2 * g;
      pByPhi = p + phi * pByPhi;
      pByTheta *= phi;
      p *= phi;
    }
    const f = 1 + g;
    const share = (errors[t]! - p) / f;
    squaresByPhi -= share * (2 * pByPhi + share * gByPhi);
    squaresByTheta -= share * (2 * pByTheta + share * gByTheta);
    logsByPhi += gByPhi / f;
    logsByTheta += gByTheta / f;
    p = phi * errors[t]! + theta * share;
    pByPhi = errors[t]! - (theta * (pByPhi + share * gByPhi)) / f;
    pByTheta = share - (theta * (pByTheta + share * gByTheta)) / f;
    gByTheta = (theta / f) ** 2 * gByTheta + (2 * theta * g) / f;
    gByPhi *= (theta / f) ** 2;
    g *= theta ** 2 / f;
  }
  return { squaresByPhi, squaresByTheta, logsByPhi, logsByTheta };
}
