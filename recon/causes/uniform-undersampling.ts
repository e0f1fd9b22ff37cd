/**
 * Skipped lines without coils to fill them in: of every R lines one is taken, the line of zero phase encoding among them, and C
 * adjoining lines about it besides. Zero-filled, I'(y) = (1/R) Σ_j I(y − jN/R): R copies of 1/R each, N/R apart.
 */
import { defineCause } from '../cause';
import { keepLines, linesOf } from '../lines';
import { quantity } from '../parameter';

export const uniformUndersampling = defineCause({
  id: 'uniform-undersampling',
  title: 'Skipped lines',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['fold-in', 'ghosts'],
  runsAlong: 'phase-encode',
  formula: String.raw`I'(y) = \frac{1}{R} \sum_{j=0}^{R-1} I\left(y - \frac{jN}{R}\right)`,
  drivers: [
    { fact: 'Acceleration', does: 'is R: one line in R is taken, and copies lie one R-th of the field of view apart' },
    { fact: 'Phase-encode axis', does: 'sets the direction in which the copies run' },
  ],
  needsObjectPhase: true,
  parameters: {
    accelerationFactor: quantity({
      label: 'Acceleration',
      unit: '×',
      min: 1,
      max: 8,
      step: 1,
      initial: 2,
      fromHeader: {
        fact: 'Parallel-imaging factor along the phase encoding',
        read: ({ accelerationFactor: r }) => (r !== undefined && r > 1 ? r : undefined),
      },
    }),
    calibrationLines: quantity({ label: 'Calibration lines', unit: 'lines', min: 0, max: 64, step: 1, initial: 0 }),
  },
  identity: { accelerationFactor: 1, calibrationLines: 0 },
  looks: {
    image:
      'R overlapping copies of the object, one R-th of the field of view apart along the phase encoding, each one R-th as bright; calibration lines add a blurred true image to them.',
    kspace:
      'Of every R lines only one is filled, apart from a full band in the middle where there are calibration lines. The k-space of the magnitude image has the same gaps, unless calibration lines were taken.',
  },
  sources: [
    { citation: 'Pruessmann KP et al. SENSE: sensitivity encoding for fast MRI. Magn Reson Med 42:952', year: 1999, standing: 'confirmed' },
    { citation: 'Deshmane A et al. Parallel MR imaging. J Magn Reson Imaging 36:55', year: 2012, standing: 'confirmed' },
  ],
  remedies: [
    {
      change: 'Lower the acceleration factor',
      who: 'technologist',
      price: 'Longer in proportion; SNR rises with the square root',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Acquire the calibration again, after the patient has settled, with the field of view of the scan',
      who: 'technologist',
      price: 'Seconds to a minute',
      moves: { time: 'once' },
    },
    { change: 'Take more reference lines', who: 'technologist', price: 'A little longer', moves: { time: 'rises' } },
    {
      change: 'Use a coil with more elements along the phase encoding, all of them selected and seated',
      who: 'technologist',
      price: 'Minutes for a new set-up of the patient; SNR rises with the geometry of the coil',
      moves: { time: 'once', snr: 'rises' },
    },
    {
      change: 'Check every element of the coil on a phantom',
      who: 'physicist',
      price: 'Minutes for each element; the coil is out of use meanwhile',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { accelerationFactor, calibrationLines }, { acquisition }) {
    const lines = linesOf(kspace, acquisition);
    const first = lines.centre - Math.floor(calibrationLines / 2);
    return keepLines(
      kspace,
      lines,
      (line) => (line - lines.centre) % accelerationFactor === 0 || (line >= first && line < first + calibrationLines),
    );
  },
});
