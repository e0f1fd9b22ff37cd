/**
 * Moiré: anatomy that wraps around from both sides of a gradient echo lies over itself with another phase, and the two add up to
 * fringes. Phase at the echo: φ = −2πc·(2p/L)², p along the phase encoding from the centre, L the field of view that holds all of the object, c
 * the cycles gathered at its edge, where the main field falls off. Folded to a part r of L, what overlaps is r·L apart, and the phase between
 * them, 2πc·8r·t/L at t from the middle of the overlap, makes fringes of period L/(8rc).
 */
import { phaseEncodeAxis } from '../acquisition';
import { defineCause } from '../cause';
import { fold, phaseFieldOfView } from '../fold';
import { linesOf } from '../lines';
import { quantity } from '../parameter';

export const moire = defineCause({
  id: 'moire',
  title: 'Moiré fringes',
  stage: 'object',
  domain: 'image',
  seen: ['lines', 'fold-in'],
  runsAlong: 'phase-encode',
  phantom: 'abdomen',
  formula: String.raw`I'(y) = \sum_m I(y + m r L)\, e^{-i 2\pi c\, (2 (y + m r L)/L)^2}`,
  drivers: [
    { fact: 'Percent phase field of view', does: 'is the fraction r that the object is folded to' },
    { fact: 'TE', does: 'multiplies the phase at the edge; in a spin echo there are no fringes' },
    { fact: 'Phase-encode axis', does: 'sets the sides from which anatomy folds in' },
  ],
  changesMatrix: true,
  parameters: {
    fraction: phaseFieldOfView,
    cycles: quantity({ label: 'Phase at the edge', unit: 'cycles', min: 0, max: 40, step: 0.5, initial: 6 }),
  },
  identity: { fraction: 1, cycles: 0 },
  looks: {
    image:
      'Alternating bright and dark fringes where anatomy from both sides lies over itself, at the edges along the phase encoding, as often the arms or flanks in a large gradient-echo image.',
    kspace: 'k-space does not show this cause by eye: there are fewer lines, and the phase of the object only complex data hold.',
  },
  sources: [
    {
      citation: 'Zhuo J, Gullapalli RP. MR artifacts, safety, and quality control. RadioGraphics 26:275',
      year: 2006,
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Make the phase field of view larger than the anatomy, or oversample along the phase encoding',
      who: 'technologist',
      price: 'Longer, or coarser pixels, in proportion; SNR rises with either',
      moves: { time: 'changes', snr: 'rises' },
    },
    {
      change: 'Arms out of the plane, or above the head',
      who: 'technologist',
      price: 'Minutes for a new set-up; padding where skin would touch skin',
      moves: { time: 'once' },
    },
    {
      change: 'Spin echo instead of gradient echo, or a shorter TE',
      who: 'technologist',
      price: 'Other contrast; refocusing pulses raise SAR: check the conditions of an implant',
      moves: { contrast: 'changes', sar: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Choose the elements of a surface coil that see only the region',
      who: 'technologist',
      price: 'A minute at the console; signal falls towards the edge',
      moves: { time: 'once', snr: 'falls' },
    },
    { change: 'Shim again over the region', who: 'technologist', price: 'Seconds to a minute', moves: { time: 'once' } },
  ],
  apply(object, { fraction, cycles }, { acquisition }) {
    const { nLines, samplesPerLine, centre, lineStride, sampleStride } = linesOf(object, acquisition);
    const re = new Float64Array(object.re.length);
    const im = new Float64Array(object.im.length);
    for (let line = 0; line < nLines; line++) {
      const phase = -2 * Math.PI * cycles * ((2 * (line - centre)) / nLines) ** 2;
      const [cosine, sine] = [Math.cos(phase), Math.sin(phase)];
      for (let sample = 0; sample < samplesPerLine; sample++) {
        const i = line * lineStride + sample * sampleStride;
        const a = object.re[i] as number;
        const b = object.im[i] as number;
        re[i] = a * cosine - b * sine;
        im[i] = a * sine + b * cosine;
      }
    }
    return fold({ ...object, re, im }, phaseEncodeAxis(acquisition.phaseEncode), Math.max(1, Math.round(fraction * nLines)), 0);
  },
});
