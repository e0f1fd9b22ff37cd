/**
 * Gradients that grow weaker away from the isocentre, taken to lie at the centre of the image: what is at r appears at
 *   r' = r − κ·r³,   κ = d/R³ for a displacement d at R = 20 cm;   I'(r') = I(r(r'))·|∂r/∂r'|,
 * in the plane, the first term after the linear one of a gradient of odd symmetry. Signal is kept: what is drawn together is brighter.
 * Beyond the turning point, r = 1/√(3κ), the gradient has the wrong sign; what lies there is left out. So is the displacement through
 * the plane. Values between pixels are bilinear, which softens the finest detail a little.
 */
import { defineCause } from '../cause';
import type { ComplexPlane } from '../grid';
import { complexZeros } from '../grid';
import { quantity } from '../parameter';
import { fromMillimetres } from '../units';

const referenceRadius = 0.2;
/** Newton's method doubles the right digits each time; near the turning point it gains one bit a time, which is enough there. */
const nIterations = 12;

/** κ in 1/m² of a displacement of `distance` metres, towards the isocentre, at 20 cm. */
export const cubicCoefficient = (distance: number): number => distance / referenceRadius ** 3;

/**
 * The source of what appears at r': s = r/r', solving s − a·s³ = 1 with a = κ·r'², and the area that a unit of the image takes from
 * the object, s/(1 − 3a·s²). Undefined beyond the turning point, 27a > 4.
 */
export function sourceOf(a: number): { scale: number; area: number } | undefined {
  if (27 * a >= 4) return undefined;
  let s = 1;
  for (let iteration = 0; iteration < nIterations; iteration++) s -= (s - a * s * s * s - 1) / (1 - 3 * a * s * s);
  return { scale: s, area: s / (1 - 3 * a * s * s) };
}

/** Adds weight·I(row, column), bilinear, to sample `i` of `result`; nothing from outside the plane. */
function gather(image: ComplexPlane, [row, column]: readonly [number, number], weight: number, result: ComplexPlane, i: number): void {
  const top = Math.floor(row);
  const left = Math.floor(column);
  for (let y = top; y <= top + 1; y++) {
    for (let x = left; x <= left + 1; x++) {
      if (y < 0 || x < 0 || y >= image.rows || x >= image.columns) continue;
      const share = weight * (1 - Math.abs(row - y)) * (1 - Math.abs(column - x));
      const from = y * image.columns + x;
      result.re[i] = (result.re[i] as number) + share * (image.re[from] as number);
      result.im[i] = (result.im[i] as number) + share * (image.im[from] as number);
    }
  }
}

export const gradientNonLinearity = defineCause({
  id: 'gradient-non-linearity',
  title: 'Gradient non-linearity',
  stage: 'object',
  domain: 'image',
  seen: ['distortion', 'shading'],
  runsAlong: 'none',
  phantom: 'resolution',
  formula: String.raw`r' = r - \kappa r^3,\quad I'(r') = I(r)\left|\frac{\partial r}{\partial r'}\right|`,
  drivers: [
    { fact: 'Field of view and place of the slice', does: 'set how far from the isocentre the image reaches: displacement grows with r³' },
    { fact: 'Image type', does: 'says whether the distortion has been corrected, in the plane only or in three dimensions' },
  ],
  parameters: {
    displacement: quantity({
      label: 'Displacement at 20 cm; above 0 towards the centre',
      unit: 'mm',
      min: -20,
      max: 20,
      step: 0.5,
      initial: 5,
    }),
  },
  identity: { displacement: 0 },
  /** A field of view of 24 cm reaches 12 cm out, where a fifth of it is left. */
  strength: { displacement: [5, 20] },
  looks: {
    image:
      'Straight lines bend towards the edge of a large field of view; the periphery is drawn in and brighter, or pushed out and darker.',
    kspace: 'k-space does not show this cause.',
  },
  sources: [
    {
      citation: 'Doran SJ et al. A complete distortion correction for MR images: I. Gradient warp correction. Phys Med Biol 50:1343',
      year: 2005,
      standing: 'from memory',
    },
    {
      citation:
        'Jovicich J et al. Reliability in multi-site structural MRI studies: effects of gradient non-linearity correction. NeuroImage 30:436',
      year: 2006,
      doi: '10.1016/j.neuroimage.2005.09.046',
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Bring the part to the isocentre',
      who: 'technologist',
      price: 'Minutes for a new set-up of the patient',
      moves: { time: 'once' },
    },
    {
      change: 'Switch the distortion correction on, in three dimensions where offered',
      who: 'technologist',
      price: 'Nothing in the scan; a little blur',
      moves: {},
    },
    {
      change: 'Take two smaller fields of view in place of one large',
      who: 'technologist',
      price: 'About twice the time',
      moves: { time: 'rises' },
    },
    { change: 'Measure distances on a grid phantom', who: 'physicist', price: 'Half an hour of scanner time', moves: { time: 'once' } },
    {
      change: 'Check the gradient coil and the coefficients of its correction',
      who: 'licensed service',
      price: 'Hours to days in which the scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(object, { displacement }) {
    const { rows, columns, spacing } = object;
    const kappa = cubicCoefficient(fromMillimetres(displacement));
    const result = complexZeros(object);
    const [centreRow, centreColumn] = [Math.floor(rows / 2), Math.floor(columns / 2)];
    for (let row = 0; row < rows; row++) {
      const y = (row - centreRow) * spacing[0];
      for (let column = 0; column < columns; column++) {
        const x = (column - centreColumn) * spacing[1];
        const source = sourceOf(kappa * (x * x + y * y));
        if (!source) continue;
        const from = [centreRow + (row - centreRow) * source.scale, centreColumn + (column - centreColumn) * source.scale] as const;
        gather(object, from, source.area, result, row * columns + column);
      }
    }
    return result;
  },
});
