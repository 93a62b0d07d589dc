/**
 * Share of a standard Gaussian below `z`, good to 1.5e-7:
 * Abramowitz & Stegun (1964), Handbook of Mathematical Functions, 7.1.26.
 */
export function gaussianBelow(z: number): number {
  const x = Math.abs(z) / Math.SQRT2;
  const t = 1 / (1 + 0.3275911 * x);
  const series =
    t * (0.254829592 + t * (-0.284496736 + t * (1.421413741 + t * (-1.453152027 + t * 1.061405429))));
  const upper = (series * Math.exp(-x * x)) / 2;
  return z < 0 ? upper : 1 - upper;
}

/**
 * Smallest count y with F(y) >= `share` under NB2 with mean `mu` and size `theta`: variance mu + mu^2/theta
 * (Hilbe 2011, Negative Binomial Regression, 2nd ed.). Stops at `most`, more than any branch can carry.
 */
export function negativeBinomialQuantile(share: number, mu: number, theta: number, most = 999): number {
  let mass = Math.pow(theta / (theta + mu), theta);
  let below = mass;
  let count = 0;
  while (below < share && count < most) {
    mass *= ((count + theta) / (count + 1)) * (mu / (theta + mu));
    below += mass;
    count++;
  }
  return count;
}
