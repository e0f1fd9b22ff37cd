/**
 * Lines transformed side by side: sample j of lane q lies at index j·lanes + q, so that every butterfly runs over contiguous
 * memory whichever axis of the plane the lines came from.
 */
export interface Lanes {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

export const emptyLanes = (size: number): Lanes => ({ re: new Float64Array(size), im: new Float64Array(size) });

/** Transforms `lanes` lines of the plan's length in place of `data`; `spare` has the same size. Returns the one of the two that
 *  holds the result. Forward kernel exp(−i2πjk/n), no scale, index 0 first. */
export type LineTransform = (data: Lanes, spare: Lanes, lanes: number) => Lanes;

/** cos and −sin of 2πj/n for j = 0 … n−1: the powers of the forward kernel. */
export function rootsOfUnity(n: number): Lanes {
  const roots = emptyLanes(n);
  for (let j = 0; j < n; j++) {
    roots.re[j] = Math.cos((2 * Math.PI * j) / n);
    roots.im[j] = -Math.sin((2 * Math.PI * j) / n);
  }
  return roots;
}
