/** How an ARMA(1,1) process forgets: what its innovations are, row by row, whatever the column. */
export interface Arma11Filter {
  /** Σ log F_t, F_t the variance of the t-th prediction error in units of σ². */
  logVariances: number;
  /** A column's prediction errors over √F_t: uncorrelated, of one variance, when the column is such a process. */
  freed(column: Float64Array): Float64Array;
}

/**
 * Rows freed from ARMA(1,1) errors e_t = φ e_{t−1} + u_t + θ u_{t−1}, exactly: the first row from the stationary
 * distribution, and years without a row predicted across, so that a gap costs information but leaves no false neighbours.
 *
 * Model    p_t the best linear prediction of row t from the rows before, F_t = 1 + G_t its variance over σ²:
 *          p_1 = 0, G_1 = (φ + θ)²/(1 − φ²);
 *          after a row    p ← φ e_t + θ (e_t − p_t)/F_t,  G ← θ² G/(1 + G);
 *          for each year without a row    p ← φ p,  G ← (φ + θ)² + φ² G.
 *          Written in G, nothing cancels: at θ = −φ, where the process is white noise, G is 0 throughout
 *
 * @param phi    −1 < φ < 1
 * @param theta  any; beyond ±1 the process is that of 1/θ with innovations θ times as large
 * @param steps  [nObs] calendar distance of each row from the one before
 *
 * Source   Kalman filter of the process; recursions without gaps in Brockwell & Davis 1991, Time Series: Theory and
 *          Methods, example 5.3.3 (number from memory). θ with the sign of R's arima
 * Checked  test/unit/statistics/arma11-filter.test.ts (C: products are those of the inverse covariance matrix)
 */
export function arma11Filter(phi: number, theta: number, steps: Float64Array): Arma11Filter {
  const variances = steps.slice();
  let excess = (phi + theta) ** 2 / ((1 - phi) * (1 + phi));
  for (let t = 0; t < steps.length; t++) {
    if (t > 0) excess = (theta ** 2 * excess) / (1 + excess);
    for (let missing = 1; missing < steps[t]!; missing++) excess = (phi + theta) ** 2 + phi ** 2 * excess;
    variances[t] = 1 + excess;
  }
  return {
    logVariances: variances.reduce((total, variance) => total + Math.log(variance), 0),
    freed(column) {
      let prediction = 0;
      return column.map((value, t) => {
        for (let missing = 1; missing < steps[t]!; missing++) prediction *= phi;
        const error = value - prediction;
        prediction = phi * value + (theta * error) / variances[t]!;
        return error / Math.sqrt(variances[t]!);
      });
    },
  };
}
