/**
 * Truncation (Gibbs ringing): of N lines the round(α·N) about the centre are taken and the rest is zero, in a picture of N pixels.
 * Along an edge the image overshoots by Si(π)/π − ½ = 8.95 % of the jump, and rings with a period of two acquired pixels, 2/α of the
 * pixels shown; a point becomes a sinc of width 1.21/α.
 */
import { defineCause } from '../cause';
import type { Encoded } from '../cause';
import { keepLines, linesAlong } from '../lines';
import type { EncodingDirection, Lines } from '../lines';
import { choice, quantity } from '../parameter';

/** Keeps the band of round(α·N) lines with its zero frequency at its own floor(n/2). */
function truncate(kspace: Encoded, lines: Lines, fraction: number): Encoded {
  const n = Math.max(1, Math.round(fraction * lines.nLines));
  const first = lines.centre - Math.floor(n / 2);
  return keepLines(kspace, lines, (line) => line >= first && line < first + n);
}

export const truncation = defineCause({
  id: 'truncation',
  title: 'Truncation',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['lines', 'blur'],
  runsAlong: 'both',
  phantom: 'resolution',
  formula: String.raw`K'(k) = \begin{cases} K(k) & |k| < \alpha N / 2 \\ 0 & \text{else} \end{cases},\quad I'(x) = I(x) * \frac{\sin \pi \alpha x}{\pi x}`,
  drivers: [
    {
      fact: 'Acquisition matrix',
      does: 'sets α: acquired lines over lines of the picture; the ringing has a period of two acquired pixels',
    },
    { fact: 'Field of view', does: 'makes the acquired pixel, and the ringing with it, larger or smaller' },
    { fact: 'k-space filter', does: 'takes the ringing away, and detail with it' },
  ],
  parameters: {
    fraction: quantity({ label: 'Matrix acquired', unit: 'of picture', min: 0.25, max: 1, step: 0.01, initial: 0.5 }),
    direction: choice<EncodingDirection | 'both'>({
      label: 'Along',
      options: [
        { value: 'phase-encode', label: 'Phase encoding' },
        { value: 'readout', label: 'Readout' },
        { value: 'both', label: 'Both' },
      ],
      initial: 'phase-encode',
    }),
  },
  identity: { fraction: 1, direction: 'both' },
  looks: {
    image:
      'Fine parallel lines beside sharp edges, alternately bright and dark, fading with distance; thin structures widened. Beside the cord or in cartilage they can pass for a lesion.',
    kspace: 'An abrupt border, nothing but zeros beyond it.',
  },
  sources: [
    {
      citation: 'Wood ML, Henkelman RM. Truncation artifacts in magnetic resonance imaging. Magn Reson Med 2:517',
      year: 1985,
      standing: 'confirmed',
    },
    {
      citation: 'Parker DL et al. Artifacts caused by truncation of the k-space data. Med Phys 14:640',
      year: 1987,
      standing: 'from memory',
    },
    { citation: 'Bracewell RN. The Fourier Transform and Its Applications', year: 1965, standing: 'confirmed' },
  ],
  remedies: [
    {
      change: 'Take more lines: a larger matrix along the direction of the ringing',
      who: 'technologist',
      price: 'Longer in proportion along the phase encoding; SNR of a pixel falls',
      moves: { time: 'rises', snr: 'falls' },
    },
    {
      change: 'Make the field of view smaller, with oversampling, at the same matrix',
      who: 'technologist',
      price:
        'SNR falls with the size of the pixel; oversampling takes longer; gradients work harder: nerve stimulation rises, check the conditions of an implant',
      moves: { time: 'rises', snr: 'falls', nerveStimulation: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Swap phase and frequency encoding, where only the phase matrix is coarse',
      who: 'technologist',
      price:
        'Motion ghosts and wrap-around turn with it; longer if the long side is now phase encoded; other gradients work hardest: check nerve stimulation and the conditions of an implant',
      moves: { time: 'changes', nerveStimulation: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Saturate the fat beside the edge, so that the jump is smaller',
      who: 'technologist',
      price: 'More RF and a longer minimum TR: SAR rises, check the conditions of an implant',
      moves: { time: 'rises', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'A stronger k-space filter',
      who: 'physicist',
      price: 'Blur: edges up to twice as wide; SNR rises with it',
      moves: { snr: 'rises' },
    },
  ],
  apply(kspace, { fraction, direction }, { acquisition }) {
    const along = (one: EncodingDirection): Lines => linesAlong(kspace, acquisition, one);
    if (direction !== 'both') return truncate(kspace, along(direction), fraction);
    return truncate(truncate(kspace, along('phase-encode'), fraction), along('readout'), fraction);
  },
});
