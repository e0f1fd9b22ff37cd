/**
 * How a plane is read out, as far as spins off resonance are concerned. A spin whose frequency is off by Δf is imaged elsewhere: by
 * Δf/BW pixels along the readout, BW the bandwidth per pixel, and in an echo-planar scan by Δf·ESP·N/R pixels along the phase encoding, where
 * a line takes the echo spacing ESP. At the echo it has the phase −2πΔf·TE in a gradient echo and none in a spin echo; echo-planar
 * scans are taken to be spin echoes. Source: Jezzard & Balaban, Magn Reson Med 1995;34:65.
 */
import type { Acquisition } from './acquisition';
import { phaseEncodeAxis } from './acquisition';
import { gyromagneticRatio } from './encoding';
import type { Grid } from './grid';
import { linesOf } from './lines';
import { choice, quantity } from './parameter';
import { fromMilliseconds } from './units';

export type Sequence = 'spin-echo' | 'gradient-echo' | 'echo-planar';

/** Parameters of every cause that acts through the frequency of spins. */
export const readoutParameters = {
  sequence: choice<Sequence>({
    label: 'Sequence',
    options: [
      { value: 'spin-echo', label: 'Spin echo' },
      { value: 'gradient-echo', label: 'Gradient echo' },
      { value: 'echo-planar', label: 'Echo-planar (spin echo)' },
    ],
    initial: 'spin-echo',
  }),
  imagingFrequency: quantity({
    label: 'Imaging frequency',
    unit: 'MHz',
    min: 1,
    max: 500,
    step: 0.01,
    initial: 63.87,
    fromHeader: {
      fact: 'Imaging frequency, or field strength,',
      read: ({ imagingFrequency: f, fieldStrength: B }) => (f ?? (B === undefined ? undefined : gyromagneticRatio * B) ?? NaN) / 1e6,
    },
  }),
  bandwidth: quantity({
    label: 'Bandwidth',
    unit: 'Hz/px',
    min: 20,
    max: 5000,
    step: 1,
    initial: 200,
    fromHeader: { fact: 'Bandwidth per pixel', read: ({ bandwidthPerPixel }) => bandwidthPerPixel },
    when: { sequence: ['spin-echo', 'gradient-echo'] },
  }),
  echoTime: quantity({
    label: 'TE',
    unit: 'ms',
    min: 0,
    max: 300,
    step: 0.1,
    initial: 6.7,
    fromHeader: { fact: 'TE', read: ({ echoTime }) => (echoTime === undefined ? undefined : 1000 * echoTime) },
    when: { sequence: ['gradient-echo'] },
  }),
  echoSpacing: quantity({
    label: 'Echo spacing',
    unit: 'ms',
    min: 0.2,
    max: 3,
    step: 0.01,
    initial: 0.6,
    when: { sequence: ['echo-planar'] },
  }),
} as const;

/** The values of `readoutParameters`, in their units. */
export interface Readout {
  readonly sequence: Sequence;
  readonly imagingFrequency: number;
  readonly bandwidth: number;
  readonly echoTime: number;
  readonly echoSpacing: number;
}

/** The axis along which spins off resonance are displaced, and pixels per hertz. Pixels of an image that was interpolated along the
 *  readout are smaller than those that the bandwidth speaks of. */
export function displacementOf(readout: Readout, grid: Grid, acquisition: Acquisition): { axis: 0 | 1; pixelsPerHertz: number } {
  const { nLines, samplesPerLine } = linesOf(grid, acquisition);
  const phaseAxis = phaseEncodeAxis(acquisition.phaseEncode);
  if (readout.sequence === 'echo-planar') {
    const R = Math.max(1, acquisition.accelerationFactor ?? 1);
    return { axis: phaseAxis, pixelsPerHertz: (fromMilliseconds(readout.echoSpacing) * nLines) / R };
  }
  const interpolation = acquisition.acquiredReadout ? samplesPerLine / acquisition.acquiredReadout : 1;
  return { axis: phaseAxis === 0 ? 1 : 0, pixelsPerHertz: interpolation / readout.bandwidth };
}

/** Phase at the echo of a spin that is off by one hertz, radians. */
export const phasePerHertz = ({ sequence, echoTime }: Readout): number =>
  sequence === 'gradient-echo' ? -2 * Math.PI * fromMilliseconds(echoTime) : 0;
