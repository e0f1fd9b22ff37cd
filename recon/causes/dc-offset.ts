/**
 * A receiver with a constant offset, K' = K + c on every sample taken: a dot of c·√(NM) at the very centre of the image and nothing
 * elsewhere. An offset that drifts evenly from line to line, by the part d over the scan, draws the dot out along the phase encoding:
 *   c(n) = c·(1 + d·(n/(N − 1) − ½)).
 * The brightness of the dot is a multiple of the object's 99th percentile.
 */
import { defineCause } from '../cause';
import { objectLevel } from '../levels';
import { linesOf } from '../lines';
import { quantity } from '../parameter';
import { fromDegrees, fromPercent } from '../units';

export const dcOffset = defineCause({
  id: 'dc-offset',
  title: 'DC offset',
  stage: 'receive',
  domain: 'kspace',
  seen: ['other', 'lines'],
  runsAlong: 'phase-encode',
  phantom: 'vials',
  formula: String.raw`K'(k_x, n) = K(k_x, n) + c\left(1 + d\left(\tfrac{n}{N-1} - \tfrac12\right)\right)`,
  drivers: [{ fact: 'Averages', does: 'with the RF phase reversed from one to the next, two of them cancel the offset' }],
  needsObjectPhase: true,
  parameters: {
    brightness: quantity({ label: 'Brightness of the dot', unit: '× P99 of the object', min: 0, max: 20, step: 0.5, initial: 3 }),
    drift: quantity({ label: 'Drift over the scan', unit: '% of the offset', min: 0, max: 200, step: 5, initial: 0 }),
    phase: quantity({ label: 'Phase', unit: '°', min: 0, max: 360, step: 5, initial: 0 }),
  },
  identity: { brightness: 0, drift: 0, phase: 0 },
  looks: {
    image: 'One bright dot at the exact centre of the image; a dotted line through it along the phase encoding where the offset drifts.',
    kspace: 'An even pedestal, seen only in the outer part where the signal is weak.',
  },
  sources: [
    {
      citation: 'Henkelman RM, Bronskill MJ. Artifacts in magnetic resonance imaging. Rev Magn Reson Med 2:1',
      year: 1987,
      standing: 'from memory',
    },
  ],
  remedies: [
    {
      change: 'Two averages with the RF phase reversed, which cancel the offset',
      who: 'technologist',
      price: 'Twice the time; SNR rises with the square root',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Move the part off the centre of the field of view, clear of the dot',
      who: 'technologist',
      price: 'Nothing but a minute',
      moves: { time: 'once' },
    },
    {
      change: 'Calibrate the offset of the receiver, or replace it',
      who: 'licensed service',
      price: 'Hours to days in which the scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { brightness, drift, phase }, { acquisition }) {
    const { nLines, samplesPerLine, lineStride, sampleStride } = linesOf(kspace, acquisition);
    const c = (brightness * objectLevel(kspace).percentile99) / Math.sqrt(nLines * samplesPerLine);
    const d = fromPercent(drift);
    const re = kspace.re.slice();
    const im = kspace.im.slice();
    for (let n = 0; n < nLines; n++) {
      const offset = c * (nLines > 1 ? 1 + d * (n / (nLines - 1) - 0.5) : 1);
      const offsetRe = offset * Math.cos(fromDegrees(phase));
      const offsetIm = offset * Math.sin(fromDegrees(phase));
      for (let sample = 0; sample < samplesPerLine; sample++) {
        const i = n * lineStride + sample * sampleStride;
        if (kspace.taken[i] === 0) continue;
        re[i] = (re[i] as number) + offsetRe;
        im[i] = (im[i] as number) + offsetIm;
      }
    }
    return { ...kspace, re, im };
  },
});
