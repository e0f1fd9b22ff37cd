/**
 * The Bessel function J1, to 1e-11: its power series below 12 (DLMF 10.2.2), Hankel's asymptotic expansion above (DLMF 10.17.3),
 * cut at its smallest term, which is about exp(−2x).
 */
const crossover = 12;

/** Σ (−1)^m (x/2)^(2m+1) / (m! (m+1)!). The largest term is about exp(x)/(2πx), so that rounding costs 1e-12 at the crossover; after
 *  8 + 2x terms the next is below 1e-18. */
function series(x: number): number {
  const half = x / 2;
  let term = half;
  let sum = half;
  const nTerms = 8 + 2 * x;
  for (let m = 1; m < nTerms; m++) {
    term *= -(half * half) / (m * (m + 1));
    sum += term;
  }
  return sum;
}

/** √(2/(πx)) · (P cos χ − Q sin χ), χ = x − 3π/4; P and Q take every other a_k = Π (4 − (2j−1)²) / (8j). */
function asymptotic(x: number): number {
  let term = 1;
  let p = 1;
  let q = 0;
  for (let k = 1; ; k++) {
    const next = (term * (4 - (2 * k - 1) * (2 * k - 1))) / (8 * k * x);
    if (next * next >= term * term || next * next < 1e-34) break;
    term = next;
    const sign = k % 4 < 2 ? 1 : -1;
    if (k % 2 === 0) p += sign * term;
    else q += sign * term;
  }
  const chi = x - (3 * Math.PI) / 4;
  return Math.sqrt(2 / (Math.PI * x)) * (p * Math.cos(chi) - q * Math.sin(chi));
}

/** J1(x) for real x; odd in x. */
export function besselJ1(x: number): number {
  const size = Math.abs(x);
  return Math.sign(x) * (size < crossover ? series(size) : asymptotic(size));
}
