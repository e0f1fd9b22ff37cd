/**
 * Unfolding by coil sensitivities. n places lie over each other in one folded pixel; element j sees them as a_j = Σ_p S_jp·v_p, and the
 * least-squares answer is v = A⁻¹Sᴴa, A = SᴴS. With the Cholesky factor A = L·Lᴴ, white noise of the elements becomes L⁻ᴴz, z white, and
 *   g_p = √([A⁻¹]_pp · A_pp)
 * is what it has grown to beyond √R. The noise of the elements is taken to be equal and uncorrelated (Ψ = 1).
 * Source: Pruessmann et al., Magn Reson Med 1999;42:952, eqs. 4 and 23.
 */

/** Complex numbers as two arrays. */
export interface ComplexArray {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** S_jp, element j of place p at [p · nElements + j]. */
export interface Sensitivities extends ComplexArray {
  readonly nElements: number;
  readonly nPlaces: number;
}

/** A pivot below this part of the mean diagonal is raised to it: places that no element tells apart would otherwise share infinities. No
 *  place of which g is below a thousand is touched. */
const leastPivot = 1e-6;

export const complexArray = (length: number): ComplexArray => ({ re: new Float64Array(length), im: new Float64Array(length) });

/** Sᴴa, [place], into `product`. */
export function project(maps: Sensitivities, signal: ComplexArray, product: ComplexArray): void {
  const { nElements, nPlaces } = maps;
  for (let place = 0; place < nPlaces; place++) {
    let re = 0;
    let im = 0;
    for (let j = 0; j < nElements; j++) {
      const i = place * nElements + j;
      const a = maps.re[i] as number;
      const b = maps.im[i] as number;
      const x = signal.re[j] as number;
      const y = signal.im[j] as number;
      re += a * x + b * y;
      im += a * y - b * x;
    }
    product.re[place] = re;
    product.im[place] = im;
  }
}

/** A = SᴴS, its lower triangle, [place, place], into `normal`; its trace. */
function normalMatrix({ re, im, nElements, nPlaces }: Sensitivities, normal: ComplexArray): number {
  let trace = 0;
  for (let p = 0; p < nPlaces; p++) {
    for (let q = 0; q <= p; q++) {
      let sumRe = 0;
      let sumIm = 0;
      for (let j = 0; j < nElements; j++) {
        const a = re[p * nElements + j] as number;
        const b = im[p * nElements + j] as number;
        const c = re[q * nElements + j] as number;
        const d = im[q * nElements + j] as number;
        sumRe += a * c + b * d;
        sumIm += a * d - b * c;
      }
      normal.re[p * nPlaces + q] = sumRe;
      normal.im[p * nPlaces + q] = sumIm;
    }
    trace += normal.re[p * nPlaces + p] as number;
  }
  return trace;
}

/** L of A = L·Lᴴ, lower triangle, real diagonal, into `factor`. Throws where no element reaches any of the places. */
export function factorise(maps: Sensitivities, factor: ComplexArray): void {
  const n = maps.nPlaces;
  const { re, im } = factor;
  const least = (leastPivot * normalMatrix(maps, factor)) / n;
  if (!(least > 0)) throw RangeError('sensitivities must reach a place, got none that do');
  for (let q = 0; q < n; q++) {
    for (let p = q; p < n; p++) {
      let x = re[p * n + q] as number;
      let y = im[p * n + q] as number;
      for (let k = 0; k < q; k++) {
        const a = re[p * n + k] as number;
        const b = im[p * n + k] as number;
        const c = re[q * n + k] as number;
        const d = im[q * n + k] as number;
        x -= a * c + b * d;
        y -= b * c - a * d;
      }
      const pivot = p === q ? Math.sqrt(Math.max(least, x)) : (re[q * n + q] as number);
      re[p * n + q] = p === q ? pivot : x / pivot;
      im[p * n + q] = p === q ? 0 : y / pivot;
    }
  }
}

/** L⁻¹v in place of v. */
export function solveLower({ re, im }: ComplexArray, n: number, v: ComplexArray): void {
  for (let p = 0; p < n; p++) {
    let x = v.re[p] as number;
    let y = v.im[p] as number;
    for (let q = 0; q < p; q++) {
      const a = re[p * n + q] as number;
      const b = im[p * n + q] as number;
      x -= a * (v.re[q] as number) - b * (v.im[q] as number);
      y -= a * (v.im[q] as number) + b * (v.re[q] as number);
    }
    v.re[p] = x / (re[p * n + p] as number);
    v.im[p] = y / (re[p * n + p] as number);
  }
}

/** L⁻ᴴv in place of v. */
export function solveUpper({ re, im }: ComplexArray, n: number, v: ComplexArray): void {
  for (let p = n - 1; p >= 0; p--) {
    let x = v.re[p] as number;
    let y = v.im[p] as number;
    for (let q = p + 1; q < n; q++) {
      const a = re[q * n + p] as number;
      const b = -(im[q * n + p] as number);
      x -= a * (v.re[q] as number) - b * (v.im[q] as number);
      y -= a * (v.im[q] as number) + b * (v.re[q] as number);
    }
    v.re[p] = x / (re[p * n + p] as number);
    v.im[p] = y / (re[p * n + p] as number);
  }
}

/** g of every place, 1 or more. */
export function geometryFactors(maps: Sensitivities): Float64Array {
  const { nElements, nPlaces } = maps;
  const factor = complexArray(nPlaces * nPlaces);
  factorise(maps, factor);
  return Float64Array.from({ length: nPlaces }, (_, place) => {
    const unit = complexArray(nPlaces);
    unit.re[place] = 1;
    solveLower(factor, nPlaces, unit);
    let inverse = 0;
    let direct = 0;
    for (let p = 0; p < nPlaces; p++) inverse += (unit.re[p] as number) ** 2 + (unit.im[p] as number) ** 2;
    for (let j = 0; j < nElements; j++) {
      const i = place * nElements + j;
      direct += (maps.re[i] as number) ** 2 + (maps.im[i] as number) ** 2;
    }
    return Math.sqrt(inverse * direct);
  });
}
