/** The plain inverse transform, with zeros where no sample was taken. */
import { partialFourier } from '../causes/partial-fourier';
import { defineReconstruction } from '../cause';
import { inverse } from '../fourier';

export const zeroFilled = defineReconstruction({
  id: 'zero-filled',
  title: 'Zero-filled',
  seen: ['blur', 'lines'],
  runsAlong: 'phase-encode',
  formula: String.raw`I = \mathcal{F}^{-1}\{ m\, K \},\quad m(\mathbf{k}) = \begin{cases} 1 & \text{taken} \\ 0 & \text{not taken} \end{cases}`,
  drivers: [
    { fact: 'Partial Fourier fraction, matrix, acceleration', does: 'say which samples are missing, and so what their zeros look like' },
    { fact: 'Phase-encode axis', does: 'is the direction along which lines are left out' },
  ],
  parameters: {},
  looks: {
    image: 'What the samples carry and nothing else: missing lines show as blur, ringing or copies.',
    kspace: 'Missing samples stay zero.',
  },
  sources: [{ citation: 'The inverse discrete Fourier transform of the samples taken', standing: 'common practice' }],
  remedies: [
    {
      change: 'Take more of the missing side: 6/8, 7/8 or all lines',
      who: 'technologist',
      price:
        'Longer in proportion, or a longer shortest TE and other contrast in echo-planar scans; SNR rises with the square root of the fraction',
      moves: { time: 'rises', snr: 'rises', contrast: 'changes' },
    },
    {
      change: 'A reconstruction that makes up the missing side from the other, where the console offers one',
      who: 'physicist',
      price: 'Slower reconstruction; the scan itself stays as it is',
      moves: {},
    },
  ],
  shownOn: { steps: [{ cause: partialFourier, strength: { fraction: [0.875, 0.625] } }] },
  reconstruct: (kspace) => inverse(kspace),
});
