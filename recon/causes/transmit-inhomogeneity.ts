/**
 * Uneven transmit field: the flip angle is b₊(r)·α. With a standing wave about the centre of the field of view,
 *   b₊ = edge + (centre − edge)·cos²(2πr/λ) for r < λ/4, edge beyond;  λ = c/(f0·√ε_r), ε_r = 58, without losses.
 * Spin echo of 90° and 180°, full recovery: S ∝ sin³(90°·b₊). Spoilt gradient echo: S ∝ sin(b₊α)(1 − E1)/(1 − E1·cos(b₊α)),
 * E1 = exp(−TR/T1) (Ernst). Both are set to 1 where b₊ = 1. One T1 for all tissue; where the header gives no TR, 150 ms is assumed.
 */
import { defineCause } from '../cause';
import type { ComplexPlane } from '../grid';
import { choice, quantity } from '../parameter';
import { fromDegrees, fromMilliseconds, fromPercent } from '../units';
import { weighted } from '../weighting';

const speedOfLight = 299_792_458;
const tissuePermittivity = 58;
const assumedRepetitionTime = 0.15;
const centimetresPerMetre = 100;

/** Metres. Plane wave of `frequency` hertz in a lossless medium of relative permittivity ε_r. */
export const wavelength = (frequency: number, relativePermittivity: number): number =>
  speedOfLight / (frequency * Math.sqrt(relativePermittivity));

/** sin³(90°·b): 90° and 180° pulses of which both are off by the factor b. */
export const spinEchoSignal = (b: number): number => Math.sin((Math.PI / 2) * b) ** 3;

/** The steady state of a spoilt gradient echo with flip angle α: sin α·(1 − E1)/(1 − E1·cos α). */
export const ernstSignal = (alpha: number, E1: number): number => (Math.sin(alpha) * (1 - E1)) / (1 - E1 * Math.cos(alpha));

/** b₊ [row, column] about the centre sample. */
function transmitField({ rows, columns, spacing }: ComplexPlane, centre: number, edge: number, lambda: number): Float64Array {
  const b = new Float64Array(rows * columns).fill(edge);
  for (let row = 0; row < rows; row++) {
    const y = (row - Math.floor(rows / 2)) * spacing[0];
    for (let column = 0; column < columns; column++) {
      const x = (column - Math.floor(columns / 2)) * spacing[1];
      const r = Math.sqrt(x * x + y * y);
      if (r < lambda / 4) b[row * columns + column] = edge + (centre - edge) * Math.cos((2 * Math.PI * r) / lambda) ** 2;
    }
  }
  return b;
}

export const transmitInhomogeneity = defineCause({
  id: 'transmit-inhomogeneity',
  title: 'Uneven transmit field',
  stage: 'object',
  domain: 'image',
  seen: ['shading', 'signal-loss'],
  runsAlong: 'none',
  formula: String.raw`S_{\mathrm{SE}} \propto \sin^3(90^\circ b_+),\quad S_{\mathrm{GRE}} \propto \frac{\sin(b_+\alpha)\,(1 - E_1)}{1 - E_1 \cos(b_+\alpha)},\quad E_1 = e^{-T_R/T_1}`,
  drivers: [
    {
      fact: 'Imaging frequency',
      does: 'sets the wavelength in tissue: 0.31 m at 3 T, twice that at 1.5 T, and so the size of the pattern',
    },
    { fact: 'Flip angle', does: 'is what the transmit field multiplies; small angles of gradient echoes follow it in proportion' },
    { fact: 'TR', does: 'sets the angle of most signal of a gradient echo, about which the signal hardly changes' },
    { fact: 'Sequence', does: 'spin echoes lose with the third power of the sine, on either side of the right angle' },
  ],
  parameters: {
    sequence: choice({
      label: 'Sequence',
      options: [
        { value: 'spin-echo', label: 'Spin echo' },
        { value: 'gradient-echo', label: 'Gradient echo' },
      ],
      initial: 'spin-echo',
    }),
    centre: quantity({ label: 'Transmit field at the centre', unit: '%', min: 30, max: 150, step: 5, initial: 65 }),
    edge: quantity({ label: 'Transmit field at the edge', unit: '%', min: 30, max: 150, step: 5, initial: 100 }),
    wavelength: quantity({
      label: 'Wavelength in tissue',
      unit: 'cm',
      min: 5,
      max: 200,
      step: 1,
      initial: 31,
      fromHeader: {
        fact: 'Imaging frequency',
        read: ({ imagingFrequency: f }) => (f === undefined ? undefined : centimetresPerMetre * wavelength(f, tissuePermittivity)),
      },
    }),
    flipAngle: quantity({
      label: 'Flip angle',
      unit: '°',
      min: 1,
      max: 120,
      step: 1,
      initial: 30,
      fromHeader: {
        fact: 'Flip angle',
        read: ({ flipAngle: alpha }) => (alpha === undefined ? undefined : (alpha * 180) / Math.PI),
      },
      when: { sequence: ['gradient-echo'] },
    }),
    t1: quantity({ label: 'T1', unit: 'ms', min: 100, max: 4000, step: 50, initial: 800, when: { sequence: ['gradient-echo'] } }),
  },
  identity: { sequence: 'spin-echo', centre: 100, edge: 100, wavelength: 31, flipAngle: 30, t1: 800 },
  looks: {
    image:
      'A broad dark or bright patch that does not follow anatomy, typically in the middle of a large body at 3 T; contrast changes with it. Where the header has no TR, 150 ms is assumed for gradient echoes.',
    kspace: 'k-space does not show this cause by eye: only the few samples about the centre change.',
  },
  sources: [
    {
      citation: 'Tofts PS. Standing waves in uniform water phantoms. J Magn Reson B 104:143',
      year: 1994,
      standing: 'from memory',
    },
    {
      citation: 'Ernst RR, Anderson WA. Application of Fourier transform spectroscopy to magnetic resonance. Rev Sci Instrum 37:93',
      year: 1966,
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Lay a dielectric pad between body and coil',
      who: 'technologist',
      price: 'Minutes for a new set-up; the pad may show on long TE scans',
      moves: { time: 'once' },
    },
    {
      change: 'Repeat the transmit calibration with the volume over the part',
      who: 'technologist',
      price: 'Seconds; SAR rises or falls with what it finds: check the conditions of an implant',
      moves: { time: 'once', sar: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Use the transmit shimming that the scanner offers',
      who: 'technologist',
      price: 'Seconds to a minute; SAR changes, and its local limits or the conditions of an implant may forbid it',
      moves: { time: 'once', sar: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Scan at 1.5 T',
      who: 'technologist',
      price:
        'Another scanner: a new set-up and an hour; half the SNR, other contrast, lower SAR; the conditions of an implant differ from field to field',
      moves: { time: 'once', snr: 'falls', contrast: 'changes', sar: 'falls', implantConditions: 'changes' },
    },
    { change: 'Map the transmit field on a phantom', who: 'physicist', price: 'Half an hour of scanner time', moves: { time: 'once' } },
    {
      change: 'Check transmit chain and body coil',
      who: 'licensed service',
      price: 'Hours to days in which the scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(object, { sequence, centre, edge, wavelength: lambda, flipAngle, t1 }, { acquisition }) {
    const b = transmitField(object, fromPercent(centre), fromPercent(edge), lambda / centimetresPerMetre);
    const alpha = fromDegrees(flipAngle);
    const E1 = Math.exp(-(acquisition.repetitionTime ?? assumedRepetitionTime) / fromMilliseconds(t1));
    const nominal = ernstSignal(alpha, E1);
    for (let i = 0; i < b.length; i++) {
      b[i] = sequence === 'spin-echo' ? spinEchoSignal(b[i] as number) : ernstSignal((b[i] as number) * alpha, E1) / nominal;
    }
    return weighted(object, b);
  },
});
