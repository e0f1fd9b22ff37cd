/**
 * Homodyne detection of one-sided k-space: I = |Re{ F⁻¹[W·K] · exp(−iθ) }|. The ramp W(k) = 0, 1 + k/ks, 2 counts the far lines of
 * the taken side twice, with W(k) + W(−k) = 2; θ is the phase of the symmetric band |k| < ks, ks the reach of the short side.
 * Source: Noll, Nishimura, Macovski, IEEE Trans Med Imaging 1991;10:154, doi 10.1109/42.79473.
 *
 * Where both sides reach equally far nothing is to be made up, and the result is the zero-filled one: for all lines, and for lines
 * skipped evenly. With both skipped lines and a short side the copies stay and each is sharpened.
 */
import { defineReconstruction } from '../cause';
import { inverse } from '../fourier';
import type { ComplexPlane } from '../grid';
import { linesOf, takenLines, weightLines } from '../lines';

/** The furthest line taken below and above the line of zero phase encoding. For an even count the line −N/2 is left out: it is its
 *  own mirror image. */
function reachOf(taken: readonly boolean[], centre: number): { below: number; above: number } {
  const isSelfConjugate = (line: number) => taken.length % 2 === 0 && line === 0;
  const first = taken.findIndex((isTaken, line) => isTaken && !isSelfConjugate(line));
  const last = taken.lastIndexOf(true);
  return { below: Math.max(0, centre - first), above: Math.max(0, last - centre) };
}

/** W of every line; `side` is +1 where the lines above the centre are complete, −1 where those below are. */
export function homodyneWeight(nLines: number, centre: number, reach: number, side: 1 | -1): Float64Array {
  return Float64Array.from({ length: nLines }, (_, line) => {
    const k = side * (line - centre);
    if (Math.abs(k) < reach) return 1 + k / reach;
    return k > 0 ? 2 : 0;
  });
}

/** Re{ image · exp(−iθ) }, θ the phase of `low`; where `low` vanishes there is no phase to take out. */
function inPhase(image: ComplexPlane, low: ComplexPlane): ComplexPlane {
  const re = new Float64Array(image.re.length);
  for (let i = 0; i < re.length; i++) {
    const a = low.re[i] as number;
    const b = low.im[i] as number;
    const size = Math.sqrt(a * a + b * b);
    const x = image.re[i] as number;
    re[i] = size > 0 ? (x * a + (image.im[i] as number) * b) / size : x;
  }
  return { ...image, re, im: new Float64Array(re.length) };
}

export const homodyne = defineReconstruction({
  id: 'homodyne',
  title: 'Homodyne',
  parameters: {},
  looks: {
    image:
      'As sharp as with all lines where the phase of the object is smooth; dark or bright where it changes within the blur of the symmetric band.',
    kspace: 'The missing side is made up from the other as its conjugate, so that the k-space of the image looks complete.',
  },
  sources: [
    {
      citation: 'Noll DC, Nishimura DG, Macovski A. Homodyne detection in magnetic resonance imaging. IEEE Trans Med Imaging 10:154',
      year: 1991,
      doi: '10.1109/42.79473',
      standing: 'confirmed',
    },
  ],
  reconstruct(kspace, _parameters, { acquisition }) {
    const lines = linesOf(kspace, acquisition);
    const { below, above } = reachOf(takenLines(kspace, lines), lines.centre);
    if (below === above) return inverse(kspace);
    const reach = Math.max(1, Math.min(below, above));
    const none = new Float64Array(lines.nLines);
    const ramp = homodyneWeight(lines.nLines, lines.centre, reach, above > below ? 1 : -1);
    const band = none.map((_, line) => (Math.abs(line - lines.centre) < reach ? 1 : 0));
    const image = inverse(weightLines(kspace, lines, { re: ramp, im: none }));
    const low = inverse(weightLines(kspace, lines, { re: band, im: none }));
    return inPhase(image, low);
  },
});
