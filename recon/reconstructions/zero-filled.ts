/** The plain inverse transform, with zeros where no sample was taken. */
import { defineReconstruction } from '../cause';
import { inverse } from '../fourier';

export const zeroFilled = defineReconstruction({
  id: 'zero-filled',
  title: 'Zero-filled',
  parameters: {},
  looks: {
    image: 'What the samples carry and nothing else: missing lines show as blur, ringing or copies.',
    kspace: 'Missing samples stay zero.',
  },
  sources: [{ citation: 'The inverse discrete Fourier transform of the samples taken', standing: 'common practice' }],
  reconstruct: (kspace) => inverse(kspace),
});
