/**
 * Homodyne detection of one-sided k-space: I = |Re{ F⁻¹[W·K] · exp(−iθ) }|. The ramp W(k) = 0, 1 + k/ks, 2 counts the far lines of
 * the taken side twice, with W(k) + W(−k) = 2; θ is the phase of the symmetric band |k| < ks, ks the reach of the short side.
 * Source: Noll, Nishimura, Macovski, IEEE Trans Med Imaging 1991;10:154, doi 10.1109/42.79473.
 *
 * Where both sides reach equally far nothing is to be made up, and the result is the zero-filled one: for all lines, and for lines
 * skipped evenly. With both skipped lines and a short side the copies stay and each is sharpened. Along the phase encoding and along
 * the readout alike; where both have a short side the one that lacks more is made up and the other stays zero-filled: the
 * method knows one conjugate side only.
 */
import { partialFourier } from '../causes/partial-fourier';
import { defineReconstruction } from '../cause';
import { inverse } from '../fourier';
import type { ComplexPlane } from '../grid';
import { linesAlong, weightLines } from '../lines';
import { reachOf, shortfall } from '../reach';
import { moreLines, smootherPhase } from '../partial-fourier-remedies';

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
  seen: ['shading', 'signal-loss'],
  runsAlong: 'phase-encode',
  formula: String.raw`I = \left|\mathrm{Re}\left\{ e^{-i\theta}\, \mathcal{F}^{-1}\{ W K \} \right\}\right|,\quad W(k) + W(-k) = 2`,
  drivers: [
    { fact: 'Partial Fourier fraction', does: 'sets how wide the symmetric band is from which the phase is known, 2f − 1 of k-space' },
    { fact: 'TE, in a gradient echo', does: 'lets the phase of the object grow, near air and metal most' },
  ],
  needsObjectPhase: true,
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
  remedies: [
    moreLines('Take more of the missing side: 6/8, 7/8 or all lines'),
    ...smootherPhase,
    {
      change: 'The iterative reconstruction of the missing side (POCS) instead',
      who: 'physicist',
      price: 'Slower reconstruction; the scan itself stays as it is',
      moves: {},
    },
  ],
  shownOn: { steps: [{ cause: partialFourier, strength: { fraction: [0.875, 0.625] } }] },
  reconstruct(kspace, _parameters, { acquisition }) {
    const [worst] = (['phase-encode', 'readout'] as const)
      .map((direction) => linesAlong(kspace, acquisition, direction))
      .map((lines) => ({ lines, reach: reachOf(kspace, lines) }))
      .sort((a, b) => shortfall(b.reach) - shortfall(a.reach));
    if (!worst || shortfall(worst.reach) === 0) return inverse(kspace);
    const { lines, reach } = worst;
    const ks = Math.max(1, Math.min(reach.below, reach.above));
    const none = new Float64Array(lines.nLines);
    const ramp = homodyneWeight(lines.nLines, lines.centre, ks, reach.above > reach.below ? 1 : -1);
    const band = none.map((_, line) => (Math.abs(line - lines.centre) < ks ? 1 : 0));
    const image = inverse(weightLines(kspace, lines, { re: ramp, im: none }));
    const low = inverse(weightLines(kspace, lines, { re: band, im: none }));
    return inPhase(image, low);
  },
});
