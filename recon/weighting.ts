/** An image whose signal is changed pixel by pixel. */
import type { ComplexPlane } from './grid';

/** `object` times `weight`, real, pixel by pixel. */
export function weighted(object: ComplexPlane, weight: Float64Array): ComplexPlane {
  return {
    ...object,
    re: object.re.map((value, i) => value * (weight[i] as number)),
    im: object.im.map((value, i) => value * (weight[i] as number)),
  };
}
