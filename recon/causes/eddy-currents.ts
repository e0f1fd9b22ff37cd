/**
 * Eddy currents of strong diffusion gradients live on into the echo-planar readout that follows. Their field, even in time and linear in
 * place, Δf = γ̄(G_q·q + G_p·p) + f0, displaces along the phase encoding by Δf·ESP·N/R pixels:
 *   p' = p + u,   u = shear·q + scale·p + shift.
 * A gradient along the readout q shears the picture, one along the phase encoding p stretches or shrinks it, a field that is the same
 * everywhere moves it; one through the slices is such a field, another in every slice. Signal is kept: what is stretched is darker.
 *
 * Assumed: fields that do not decay while the picture is read. Those that do also blur.
 */
import { defineCause } from '../cause';
import { phaseEncodeAxis } from '../acquisition';
import { displaced } from '../displacement';
import { gyromagneticRatio } from '../encoding';
import { linesOf } from '../lines';
import { quantity } from '../parameter';
import { displacementOf } from '../sequence';

const fromMicrotesla = 1e-6;

export const eddyCurrents = defineCause({
  id: 'eddy-currents',
  title: 'Eddy currents in diffusion scans',
  stage: 'object',
  domain: 'image',
  seen: ['distortion'],
  runsAlong: 'phase-encode',
  formula: String.raw`p' = p + \left(\bar\gamma\,(G_q q + G_p p) + f_0\right) \frac{\mathrm{ESP}\; N}{R}`,
  drivers: [
    { fact: 'Diffusion weighting and its direction', does: 'set the eddy currents: another direction, another distortion' },
    { fact: 'Echo spacing and acceleration', does: 'set how many pixels a hertz is worth along the phase encoding' },
    { fact: 'Phase-encode axis', does: 'is the one axis along which the picture is sheared, stretched and moved' },
  ],
  parameters: {
    alongReadout: quantity({ label: 'Gradient left along the readout (shear)', unit: 'µT/m', min: -50, max: 50, step: 0.5, initial: 15 }),
    alongPhaseEncode: quantity({
      label: 'Gradient left along the phase encoding (scale)',
      unit: 'µT/m',
      min: -50,
      max: 50,
      step: 0.5,
      initial: 8,
    }),
    offset: quantity({ label: 'Even field (shift)', unit: 'Hz', min: -100, max: 100, step: 1, initial: 5 }),
    echoSpacing: quantity({ label: 'Echo spacing', unit: 'ms', min: 0.2, max: 3, step: 0.01, initial: 0.6 }),
  },
  identity: { alongReadout: 0, alongPhaseEncode: 0, offset: 0, echoSpacing: 0.6 },
  looks: {
    image:
      'The picture is sheared, stretched or shrunk, and moved, along the phase encoding alone, otherwise for every diffusion direction: edges of the maps worked out from them are bright rims. Meant for a diffusion-weighted echo-planar image.',
    kspace: 'k-space does not show this cause by eye: its pattern is sheared and scaled along with the picture.',
  },
  sources: [
    {
      citation:
        'Haselgrove JC, Moore JR. Correction for distortion of echo-planar images used to calculate the apparent diffusion coefficient. Magn Reson Med 36:960',
      year: 1996,
      standing: 'from memory',
    },
    {
      citation:
        'Jezzard P, Barnett AS, Pierpaoli C. Characterization of and correction for eddy current artifacts in echo planar diffusion imaging. Magn Reson Med 39:801',
      year: 1998,
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Switch on the correction of the diffusion images against those without weighting, where the console offers it',
      who: 'technologist',
      price: 'None to the scan; a little blur',
      moves: {},
    },
    {
      change: 'Diffusion preparation with two refocusing pulses, whose eddy currents cancel',
      who: 'technologist',
      price: 'Longer TE, with other contrast and less SNR; one more refocusing pulse raises SAR: check the conditions of an implant',
      moves: { snr: 'falls', contrast: 'changes', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Accelerate, or read in several segments, so that a step through k-space takes less time',
      who: 'technologist',
      price: 'Less SNR, or longer and open to motion between segments',
      moves: { time: 'changes', snr: 'falls' },
    },
    {
      change: 'Hold diffusion images of all directions against one another on a phantom',
      who: 'physicist',
      price: 'Half an hour of scanner time',
      moves: { time: 'once' },
    },
    {
      change: 'Calibrate the eddy-current compensation',
      who: 'licensed service',
      price: 'The scanner is out of use for hours',
      moves: { time: 'once' },
    },
  ],
  apply(object, { alongReadout, alongPhaseEncode, offset, echoSpacing }, { acquisition }) {
    const { nLines, samplesPerLine, centre, lineStride, sampleStride } = linesOf(object, acquisition);
    const [phasePixel, readoutPixel] = sampleStride === 1 ? object.spacing : [object.spacing[1], object.spacing[0]];
    const echoPlanar = { sequence: 'echo-planar', imagingFrequency: 0, bandwidth: 1, echoTime: 0, echoSpacing } as const;
    const { pixelsPerHertz } = displacementOf(echoPlanar, object, acquisition);
    const hertzPerSample = gyromagneticRatio * alongReadout * fromMicrotesla * readoutPixel;
    const hertzPerLine = gyromagneticRatio * alongPhaseEncode * fromMicrotesla * phasePixel;
    const pixels = new Float64Array(object.re.length);
    for (let line = 0; line < nLines; line++) {
      for (let sample = 0; sample < samplesPerLine; sample++) {
        const hertz = hertzPerSample * (sample - Math.floor(samplesPerLine / 2)) + hertzPerLine * (line - centre) + offset;
        pixels[line * lineStride + sample * sampleStride] = hertz * pixelsPerHertz;
      }
    }
    return displaced(object, phaseEncodeAxis(acquisition.phaseEncode), pixels, 'folded');
  },
});
