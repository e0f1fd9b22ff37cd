/**
 * Thermal noise, white and Gaussian: K' = K + σ(g1 + i·g2) on every sample taken, σ = S/SNR with S the mean of the object. The transform
 * is orthonormal, so that σ is also that of the real and of the imaginary part of a fully sampled image. Its magnitude is Rician, in air
 * Rayleigh. SNR is that of all samples taken: what skipping lines costs then follows.
 *
 * Several coils: n equal ones, uncorrelated, each with I/√n, combined by root sum of squares. A rotation among the coils, which leaves
 * white noise white, puts the whole signal into one and noise alone into n − 1:
 *   M² = |I + n_1|² + X,   X = σ²·χ² with 2(n − 1) degrees of freedom:   M is non-central χ.
 * Encoded has one plane. It then holds the k-space of the combined image, of magnitude M and the phase of I + n_1, as a stored image has
 * it; causes after this one act on that. Exact where every sample is taken; else X is as strong as the samples taken make it, and what
 * of the combined image falls on samples not taken is lost.
 */
import type { Encoded } from '../cause';
import { defineCause } from '../cause';
import { inverse, transform } from '../fourier';
import { objectLevel } from '../levels';
import { quantity } from '../parameter';
import type { Random } from '../random';

/** Adds to every sample taken a normal of standard deviation `sigma` in each part; in the order of memory. */
function addNoise(kspace: Encoded, sigma: number, random: Random): Encoded {
  const re = kspace.re.slice();
  const im = kspace.im.slice();
  for (let i = 0; i < re.length; i++) {
    if (kspace.taken[i] === 0) continue;
    re[i] = (re[i] as number) + sigma * random.normal();
    im[i] = (im[i] as number) + sigma * random.normal();
  }
  return { ...kspace, re, im };
}

/** A gamma variate of whole `shape`, 1 or more, scale 1; half a χ² of twice as many degrees of freedom. Marsaglia & Tsang, ACM Trans
 *  Math Softw 2000;26:363 (from memory): the cube of a normal, accepted as often as its density asks. */
export function gammaVariate(shape: number, random: Random): number {
  const d = shape - 1 / 3;
  const c = 1 / Math.sqrt(9 * d);
  for (;;) {
    const x = random.normal();
    const v = (1 + c * x) ** 3;
    if (v > 0 && Math.log(1 - random.uniform()) < (x * x) / 2 + d - d * v + d * Math.log(v)) return d * v;
  }
}

/** |I|² + X in place of |I|², in image space; the samples that were taken of the result. */
function withOtherCoils(kspace: Encoded, coils: number, sigma: number, random: Random): Encoded {
  const image = inverse(kspace);
  const fractionTaken = kspace.taken.reduce((sum, taken) => sum + taken, 0) / kspace.taken.length;
  const variance = 2 * sigma * sigma * fractionTaken;
  for (let i = 0; i < image.re.length; i++) {
    const a = image.re[i] as number;
    const b = image.im[i] as number;
    const signal = a * a + b * b;
    const ratio = signal > 0 ? Math.sqrt(1 + (variance * gammaVariate(coils - 1, random)) / signal) : 1;
    image.re[i] = a * ratio;
    image.im[i] = b * ratio;
  }
  const { re, im } = transform(image);
  for (let i = 0; i < re.length; i++) {
    if (kspace.taken[i] === 1) continue;
    re[i] = 0;
    im[i] = 0;
  }
  return { ...kspace, re, im };
}

export const noise = defineCause({
  id: 'noise',
  title: 'Noise',
  stage: 'receive',
  domain: 'kspace',
  seen: ['noise'],
  runsAlong: 'none',
  phantom: 'resolution',
  formula: String.raw`K' = K + \sigma\,(g_1 + i g_2),\quad \sigma = \bar S / \mathrm{SNR},\quad M = \sqrt{\textstyle\sum_{c=1}^{n} |I_c + n_c|^2}`,
  drivers: [
    { fact: 'Slice thickness and pixel size', does: 'SNR rises with the volume of a voxel' },
    { fact: 'Averages', does: 'SNR rises with the square root of their number' },
    { fact: 'Bandwidth per pixel', does: 'SNR falls with its square root' },
    { fact: 'Acceleration', does: 'SNR falls with its square root, and with the geometry of the coils besides' },
    { fact: 'Field strength and receive coil', does: 'set the signal, and how much of the body the noise comes from' },
  ],
  parameters: {
    snr: quantity({ label: 'SNR of the object', unit: '', min: 1, max: 200, step: 1, initial: 15 }),
    coils: quantity({ label: 'Coils combined by root sum of squares', unit: 'coils', min: 1, max: 32, step: 1, initial: 1 }),
  },
  strength: { snr: [40, 4] },
  looks: {
    image:
      'Grain over the whole image, air included; in air the magnitude has a floor, which rises with the number of coils, and contrast of dark tissue is lost.',
    kspace: 'A uniform haze, in which the outer part of k-space is drowned first.',
  },
  sources: [
    {
      citation: 'Gudbjartsson H, Patz S. The Rician distribution of noisy MRI data. Magn Reson Med 34:910',
      year: 1995,
      doi: '10.1002/mrm.1910340618',
      standing: 'confirmed',
    },
    {
      citation: 'Henkelman RM. Measurement of signal intensities in the presence of noise in MR images. Med Phys 12:232',
      year: 1985,
      standing: 'confirmed',
    },
    {
      citation:
        'Constantinides CD, Atalar E, McVeigh ER. Signal-to-noise measurements in magnitude images from NMR phased arrays. Magn Reson Med 38:852',
      year: 1997,
      standing: 'confirmed',
    },
    {
      citation: 'Edelstein WA et al. The intrinsic signal-to-noise ratio in NMR imaging. Magn Reson Med 3:604',
      year: 1986,
      doi: '10.1002/mrm.1910030413',
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Use a coil that fits, close to the part, seated and with the right elements',
      who: 'technologist',
      price: 'Minutes for a new set-up of the patient',
      moves: { time: 'once' },
    },
    {
      change: 'More averages',
      who: 'technologist',
      price: 'Longer in proportion; SNR rises with the square root; the absorbed energy rises with the time',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Thicker slice or larger pixels',
      who: 'technologist',
      price: 'Coarser detail, more partial volume; SNR rises with the volume of a voxel',
      moves: { snr: 'rises' },
    },
    {
      change: 'Lower the bandwidth',
      who: 'technologist',
      price:
        'Larger chemical shift and distortion, longer shortest TE and other contrast; SNR rises with the square root; a weaker readout gradient: nerve stimulation falls',
      moves: { snr: 'rises', contrast: 'changes', nerveStimulation: 'falls' },
    },
    {
      change: 'Shorten TE, or lower the acceleration',
      who: 'technologist',
      price: 'Other contrast with TE; longer in proportion with less acceleration; SNR rises with either',
      moves: { time: 'changes', snr: 'rises', contrast: 'changes' },
    },
    {
      change: 'Measure SNR on a phantom against the record of the coil',
      who: 'physicist',
      price: 'Half an hour of scanner time',
      moves: { time: 'once' },
    },
    {
      change: 'Check preamplifiers and noise figure',
      who: 'licensed service',
      price: 'Hours to days in which coil or scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { snr, coils }, { random }) {
    const sigma = objectLevel(kspace).mean / snr;
    const noisy = addNoise(kspace, sigma, random);
    return coils > 1 ? withOtherCoils(noisy, coils, sigma, random) : noisy;
  },
});
