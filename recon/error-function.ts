/**
 * The complementary error function, to 1e-12: Maclaurin series below 2 (DLMF 7.6.1), Laplace's continued fraction above (DLMF 7.9.1).
 */
const crossover = 2;

/** 2/√π · Σ (−1)^m x^(2m+1) / (m! (2m+1)). */
function errorSeries(x: number): number {
  let term = x;
  let sum = x;
  for (let m = 1; m < 60; m++) {
    term *= -(x * x) / m;
    sum += term / (2 * m + 1);
  }
  return (2 / Math.sqrt(Math.PI)) * sum;
}

/** exp(−x²)/√π · 1/(x + ½/(x + 1/(x + 3/2/(x + …)))), from the 120th quotient up. */
function complementaryFraction(x: number): number {
  let denominator = x;
  for (let m = 120; m >= 1; m--) denominator = x + m / 2 / denominator;
  return Math.exp(-x * x) / (Math.sqrt(Math.PI) * denominator);
}

/** erfc(x) for x ≥ 0. */
export const complementaryError = (x: number): number => (x < crossover ? 1 - errorSeries(x) : complementaryFraction(x));
