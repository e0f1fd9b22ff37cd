/**
 * Metal, or air: a ball or a rod whose susceptibility differs by Δχ bends the field about it (`dipole-field.ts`), spins there are imaged
 * elsewhere, and in a gradient echo cancel (`off-resonance-encoding.ts`). The body itself gives no signal. Rod: along the slice normal.
 *
 * Assumed: the slice stays flat. Near strong metal it does not: spins are then excited beside it, and the void is larger than shown.
 */
import { defineCause } from '../cause';
import type { Dipole } from '../dipole-field';
import { dipoleField, outsideBody } from '../dipole-field';
import { angleInPlane, angleToNormal } from '../field-direction';
import { encodeOffResonance } from '../off-resonance-encoding';
import { choice, quantity } from '../parameter';
import { readoutParameters } from '../sequence';
import { fromDegrees, fromMegahertz, fromMillimetres } from '../units';
import { weighted } from '../weighting';

export const susceptibility = defineCause({
  id: 'susceptibility',
  title: 'Metal and susceptibility',
  stage: 'object',
  domain: 'image',
  seen: ['signal-loss', 'distortion'],
  runsAlong: 'readout',
  phantom: 'resolution',
  formula: String.raw`\frac{\Delta B}{B_0} = \frac{\Delta\chi}{3} \left(\frac{a}{r}\right)^3 \left(3\cos^2\theta - 1\right),\quad u = \frac{\bar\gamma\, \Delta B}{\mathrm{BW}}`,
  drivers: [
    { fact: 'Bandwidth per pixel', does: 'divides the displacement along the readout' },
    { fact: 'Sequence and TE', does: 'a gradient echo loses the signal about the metal, more with TE; a spin echo only bends it' },
    { fact: 'Imaging frequency', does: 'multiplies the disturbance: it is a part of the main field' },
    { fact: 'Orientation and patient position', does: 'set the direction of the main field in the picture, and so the shape' },
    { fact: 'Slice thickness', does: 'sets how much cancels through the slice' },
  ],
  parameters: {
    shape: choice<Dipole['shape']>({
      label: 'Body',
      options: [
        { value: 'ball', label: 'Ball' },
        { value: 'rod', label: 'Rod through the slice' },
      ],
      initial: 'ball',
    }),
    difference: quantity({
      label: 'Susceptibility against tissue',
      unit: 'ppm',
      min: 0,
      max: 7000,
      step: 0.2,
      initial: 182,
    }),
    radius: quantity({ label: 'Radius', unit: 'mm', min: 0, max: 40, step: 0.5, initial: 5 }),
    alongPhaseEncode: quantity({ label: 'Off centre along phase encoding', unit: 'of FOV', min: -0.5, max: 0.5, step: 0.01, initial: 0.1 }),
    alongReadout: quantity({ label: 'Off centre along readout', unit: 'of FOV', min: -0.5, max: 0.5, step: 0.01, initial: 0 }),
    height: quantity({ label: 'Above the slice', unit: 'mm', min: 0, max: 60, step: 0.5, initial: 0, when: { shape: ['ball'] } }),
    toNormal: quantity({
      label: 'Main field to the slice normal',
      unit: '°',
      min: 0,
      max: 90,
      step: 1,
      initial: 0,
      fromHeader: { fact: 'Orientation and patient position', read: angleToNormal },
    }),
    inPlane: quantity({
      label: 'Main field to the phase-encode axis',
      unit: '°',
      min: 0,
      max: 180,
      step: 1,
      initial: 0,
      fromHeader: { fact: 'Orientation and patient position', read: angleInPlane },
    }),
    sliceThickness: quantity({
      label: 'Slice thickness',
      unit: 'mm',
      min: 0.5,
      max: 20,
      step: 0.1,
      initial: 5,
      fromHeader: {
        fact: 'Slice thickness',
        read: ({ sliceThickness }) => (sliceThickness === undefined ? undefined : 1000 * sliceThickness),
      },
      when: { shape: ['ball'], sequence: ['gradient-echo'] },
    }),
    ...readoutParameters,
  },
  identity: {
    shape: 'ball',
    difference: 182,
    radius: 0,
    alongPhaseEncode: 0.1,
    alongReadout: 0,
    height: 0,
    toNormal: 0,
    inPlane: 0,
    sliceThickness: 5,
    sequence: 'gradient-echo',
    imagingFrequency: 63.87,
    bandwidth: 200,
    echoTime: 6.7,
    echoSpacing: 0.6,
  },
  looks: {
    image:
      'A void with a bright rim on one side and bent lines about it along the readout; in a gradient echo a larger dark halo; in an echo-planar scan stretching and pile-up along the phase encoding.',
    kspace:
      'k-space does not show this cause in a spin echo. In a gradient echo the echo of the surroundings is broadened and lies off the centre, which only complex data show.',
  },
  sources: [
    {
      citation: 'Schenck JF. The role of magnetic susceptibility in magnetic resonance imaging. Med Phys 23:815',
      year: 1996,
      doi: '10.1118/1.597854',
      standing: 'confirmed',
    },
    {
      citation: 'Lüdeke KM, Röschmann P, Tischler R. Susceptibility artefacts in NMR imaging. Magn Reson Imaging 3:329',
      year: 1985,
      standing: 'from memory',
    },
    {
      citation: 'Hargreaves BA et al. Metal-induced artifacts in MRI. AJR Am J Roentgenol 197:547',
      year: 2011,
      doi: '10.2214/AJR.11.7364',
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change:
        'An unexpected void is a question of safety first: stop, take the patient out, look for metal on and in the patient, screen again',
      who: 'technologist',
      price: 'Minutes; no scan goes on before it is answered',
      moves: { time: 'once' },
    },
    {
      change: 'Take off what can be taken off: clips, jewellery, clothing with metal',
      who: 'technologist',
      price: 'A minute or two',
      moves: { time: 'once' },
    },
    {
      change: 'Spin echo or turbo spin echo instead of gradient echo or echo-planar',
      who: 'technologist',
      price: 'Longer; other contrast; refocusing pulses raise SAR, which may leave the conditions of an implant',
      moves: { time: 'rises', contrast: 'changes', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Highest bandwidth, thin slices, short echo spacing',
      who: 'technologist',
      price:
        'SNR falls; stronger gradients: nerve stimulation rises, check the conditions of an implant; thin slices need more of them, and longer',
      moves: { time: 'changes', snr: 'falls', nerveStimulation: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Suppress fat by inversion recovery, not by frequency',
      who: 'technologist',
      price: 'Longer, less SNR, other contrast; SAR rises: check the conditions of an implant; not after contrast agent',
      moves: { time: 'rises', snr: 'falls', contrast: 'changes', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Sequences made for metal: view-angle tilting, or several spectral bins, where the scanner has them',
      who: 'physicist',
      price: 'Much longer, blur; SAR rises: to be set up within the conditions of the implant',
      moves: { time: 'rises', sar: 'rises', implantConditions: 'changes' },
    },
  ],
  apply(object, { shape, difference, toNormal, inPlane, sliceThickness, ...rest }, { acquisition }) {
    const dipole: Dipole = {
      shape,
      radius: fromMillimetres(rest.radius),
      susceptibility: difference * 1e-6,
      alongPhaseEncode: rest.alongPhaseEncode,
      alongReadout: rest.alongReadout,
      height: fromMillimetres(rest.height),
      toNormal: fromDegrees(toNormal),
      inPlane: fromDegrees(inPlane),
    };
    const scan = { frequency: fromMegahertz(rest.imagingFrequency), sliceThickness: fromMillimetres(sliceThickness) };
    const field = dipoleField(object, acquisition, dipole, scan);
    return encodeOffResonance(weighted(object, outsideBody(object, acquisition, dipole)), field, rest, acquisition);
  },
});
