/**
 * Magic angle: in tendon the dipolar interaction of water that collagen holds in line shortens T2, and vanishes at 3cos²θ = 1,
 *   1/T2(θ) = 1/T2i + b·(3cos²θ − 1)²,   S = S0·exp(−TE/T2),
 * θ from the fibre to the main field: the longest T2, and the brightest tendon, at 54.74°. T2i is T2 there and b follows from T2 along the
 * field, where (3cos²θ − 1)² = 4. The figures to begin with are those measured by Du et al. at 3 T.
 *
 * A tendon is laid into the picture, a strip along an arc in the plane: none can be told in a single image. At TE 0 it is as bright as
 * stated; its brightness replaces what was there and keeps its phase.
 */
import type { Acquisition } from '../acquisition';
import type { Arc } from '../arc';
import { alongArc } from '../arc';
import { defineCause } from '../cause';
import { angleInPlane, angleToNormal } from '../field-direction';
import type { ComplexPlane } from '../grid';
import { magnitude } from '../grid';
import { linesOf } from '../lines';
import { quantity } from '../parameter';
import { percentile } from '../statistics';
import { fromDegrees, fromMillimetres } from '../units';

/** (3cos²θ − 1)² of a fibre along the field. */
const alongField = 4;

/** T2 in the unit of both times given, θ in radians. T2 does not fall with θ below 54.74°: `alongTheField` counts as `atMagicAngle` at most. */
export function tendonT2(theta: number, atMagicAngle: number, alongTheField: number): number {
  const b = Math.max(0, 1 / alongTheField - 1 / atMagicAngle) / alongField;
  const angular = 3 * Math.cos(theta) ** 2 - 1;
  return 1 / (1 / atMagicAngle + b * angular * angular);
}

interface Tendon extends Arc {
  /** Brightness at TE 0. */
  readonly brightness: number;
}

interface Decay {
  /** Radians: the field to the slice normal, and its part in the plane from the phase-encode axis. */
  readonly toNormal: number;
  readonly inPlane: number;
  readonly echoTime: number;
  readonly atMagicAngle: number;
  readonly alongTheField: number;
}

/** `object` with `tendon` in place of what was there, by the part of each pixel that it fills. */
function withTendon(object: ComplexPlane, acquisition: Acquisition, tendon: Tendon, decay: Decay): ComplexPlane {
  const { nLines, samplesPerLine, centre, lineStride, sampleStride } = linesOf(object, acquisition);
  const [phasePixel, readoutPixel] = sampleStride === 1 ? object.spacing : [object.spacing[1], object.spacing[0]];
  const pixel = Math.sqrt(phasePixel * readoutPixel);
  const re = object.re.slice();
  const im = object.im.slice();
  for (let line = 0; line < nLines; line++) {
    for (let sample = 0; sample < samplesPerLine; sample++) {
      const place = [(line - centre) * phasePixel, (sample - Math.floor(samplesPerLine / 2)) * readoutPixel] as const;
      const { distance, direction } = alongArc(tendon, place);
      const part = Math.min(1, Math.max(0, 0.5 - distance / pixel));
      if (part === 0) continue;
      const theta = Math.acos(Math.sin(decay.toNormal) * Math.cos(direction - decay.inPlane));
      const signal = tendon.brightness * Math.exp(-decay.echoTime / tendonT2(theta, decay.atMagicAngle, decay.alongTheField));
      const i = line * lineStride + sample * sampleStride;
      const a = object.re[i] as number;
      const b = object.im[i] as number;
      const size = Math.sqrt(a * a + b * b);
      re[i] = a * (1 - part) + part * signal * (size > 0 ? a / size : 1);
      im[i] = b * (1 - part) + part * signal * (size > 0 ? b / size : 0);
    }
  }
  return { ...object, re, im };
}

export const magicAngle = defineCause({
  id: 'magic-angle',
  title: 'Magic angle',
  stage: 'object',
  domain: 'image',
  seen: ['other'],
  runsAlong: 'both',
  formula: String.raw`\frac{1}{T_2(\theta)} = \frac{1}{T_{2i}} + b \left(3\cos^2\theta - 1\right)^2,\quad S = S_0\, e^{-T_E / T_2(\theta)}`,
  drivers: [
    { fact: 'TE', does: 'decides: at 15 ms the tendon lights up at 55°, beyond about 40 ms it no longer does' },
    { fact: 'Orientation and patient position', does: 'set the angle of the tendon to the main field, which runs along the bore' },
  ],
  parameters: {
    echoTime: quantity({
      label: 'TE',
      unit: 'ms',
      min: 0,
      max: 200,
      step: 0.1,
      initial: 15,
      fromHeader: { fact: 'TE', read: ({ echoTime }) => (echoTime === undefined ? undefined : 1000 * echoTime) },
    }),
    thickness: quantity({ label: 'Thickness of the tendon', unit: 'mm', min: 0, max: 20, step: 0.5, initial: 6 }),
    length: quantity({ label: 'Length of the tendon', unit: 'mm', min: 5, max: 200, step: 1, initial: 90 }),
    direction: quantity({
      label: 'Direction at its middle, from the phase-encode axis',
      unit: '°',
      min: -90,
      max: 90,
      step: 1,
      initial: 45,
    }),
    bend: quantity({ label: 'Turn from end to end', unit: '°', min: 0, max: 180, step: 1, initial: 90 }),
    alongPhaseEncode: quantity({ label: 'Off centre along phase encoding', unit: 'of FOV', min: -0.5, max: 0.5, step: 0.01, initial: 0 }),
    alongReadout: quantity({ label: 'Off centre along readout', unit: 'of FOV', min: -0.5, max: 0.5, step: 0.01, initial: 0 }),
    brightness: quantity({ label: 'Brightness at TE 0', unit: '× P99 of the object', min: 0, max: 2, step: 0.05, initial: 1 }),
    atMagicAngle: quantity({ label: 'T2 at 55° to the field', unit: 'ms', min: 1, max: 40, step: 0.05, initial: 15.25 }),
    alongTheField: quantity({ label: 'T2 along the field', unit: 'ms', min: 0.2, max: 20, step: 0.02, initial: 1.94 }),
    toNormal: quantity({
      label: 'Main field to the slice normal',
      unit: '°',
      min: 0,
      max: 90,
      step: 1,
      initial: 90,
      fromHeader: { fact: 'Orientation and patient position', read: angleToNormal },
    }),
    inPlane: quantity({
      label: 'Main field in the plane, from the phase-encode axis',
      unit: '°',
      min: 0,
      max: 180,
      step: 1,
      initial: 0,
      fromHeader: { fact: 'Orientation and patient position', read: angleInPlane },
    }),
  },
  identity: {
    echoTime: 15,
    thickness: 0,
    length: 90,
    direction: 45,
    bend: 90,
    alongPhaseEncode: 0,
    alongReadout: 0,
    brightness: 1,
    atMagicAngle: 15.25,
    alongTheField: 1.94,
    toNormal: 90,
    inPlane: 0,
  },
  phantom: 'vials',
  /** The effect fades as TE grows. */
  strength: { echoTime: [45, 8] },
  looks: {
    image:
      'A tendon, dark elsewhere, is bright over the stretch that runs at about 55° to the main field, at short TE alone; it passes for a tear or tendinosis. The tendon shown is laid into the picture.',
    kspace: 'k-space does not show this cause.',
  },
  sources: [
    {
      citation:
        'Du J et al. Magic angle effect in magnetic resonance imaging of the Achilles tendon and enthesis. Magn Reson Imaging 27:557',
      year: 2009,
      standing: 'confirmed',
    },
    {
      citation: 'Erickson SJ et al. Effect of tendon orientation on MR imaging signal intensity. Radiology 181:389',
      year: 1991,
      doi: '10.1148/radiology.181.2.1924777',
      standing: 'confirmed',
    },
    {
      citation: 'Fullerton GD, Cameron IL, Ord VA. Orientation of tendons in the magnetic field and its effect on T2. Radiology 155:433',
      year: 1985,
      standing: 'from memory',
    },
  ],
  remedies: [
    {
      change: 'Confirm with a TE above 40 ms: what is bright there as well is no magic angle',
      who: 'technologist',
      price: 'The time of one more scan, of other contrast',
      moves: { time: 'rises', contrast: 'changes' },
    },
    {
      change: 'Lay the limb otherwise, so that the tendon leaves 55° to the bore',
      who: 'technologist',
      price: 'A few minutes at the table; the tendon may then show it elsewhere along its arc',
      moves: { time: 'once' },
    },
    {
      change: 'Plan protocols for tendons with one sequence of long TE in every plane',
      who: 'physicist',
      price: 'Longer by that sequence, whose SNR is lower',
      moves: { time: 'rises', snr: 'falls' },
    },
  ],
  apply(object, { echoTime, atMagicAngle, alongTheField, brightness, ...shape }, { acquisition }) {
    if (shape.thickness === 0) return { ...object, re: object.re.slice(), im: object.im.slice() };
    const { nLines, samplesPerLine, sampleStride } = linesOf(object, acquisition);
    const [phasePixel, readoutPixel] = sampleStride === 1 ? object.spacing : [object.spacing[1], object.spacing[0]];
    const tendon = {
      middle: [shape.alongPhaseEncode * nLines * phasePixel, shape.alongReadout * samplesPerLine * readoutPixel] as const,
      direction: fromDegrees(shape.direction),
      length: fromMillimetres(shape.length),
      turn: fromDegrees(shape.bend),
      thickness: fromMillimetres(shape.thickness),
      brightness: brightness * percentile(magnitude(object).values, 99),
    };
    const field = { toNormal: fromDegrees(shape.toNormal), inPlane: fromDegrees(shape.inPlane) };
    return withTendon(object, acquisition, tendon, { ...field, echoTime, atMagicAngle, alongTheField });
  },
});
