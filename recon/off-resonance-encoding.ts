/**
 * How spins off resonance are imaged. They are displaced along one axis (`sequence.ts`), mass kept. In a gradient echo they also have
 * the phase −2πΔf·TE, and cancel within a voxel by |sinc(δf·TE)|, δf the change of Δf from one of its faces to the other, along the slice
 * and in the plane; the field is taken as even in slope over a voxel, and T2' decay is no more than that.
 */
import type { Acquisition } from './acquisition';
import { phaseEncodeAxis } from './acquisition';
import { displaced } from './displacement';
import type { FieldMap } from './field-map';
import type { ComplexPlane } from './grid';
import type { Readout } from './sequence';
import { displacementOf, phasePerHertz } from './sequence';

/** sin(πx)/(πx), its first terms near 0, where the quotient would lose digits. */
export const sinc = (x: number): number => {
  const angle = Math.PI * x;
  return Math.abs(angle) < 1e-4 ? 1 - (angle * angle) / 6 : Math.sin(angle) / angle;
};

/** Phase and loss at a gradient echo, TE as `turn` = phase in radians per hertz. */
function dephased(object: ComplexPlane, { hertz, acrossSlice }: FieldMap, turn: number): ComplexPlane {
  const { rows, columns } = object;
  const re = new Float64Array(object.re.length);
  const im = new Float64Array(object.im.length);
  const cycles = Math.abs(turn) / (2 * Math.PI);
  for (let row = 0; row < rows; row++) {
    const [above, below] = [Math.max(0, row - 1) * columns, Math.min(rows - 1, row + 1) * columns];
    for (let column = 0; column < columns; column++) {
      const i = row * columns + column;
      const [left, right] = [Math.max(0, column - 1), Math.min(columns - 1, column + 1)];
      const alongRow = ((hertz[row * columns + right] as number) - (hertz[row * columns + left] as number)) / Math.max(1, right - left);
      const alongColumn = ((hertz[below + column] as number) - (hertz[above + column] as number)) / Math.max(1, (below - above) / columns);
      const kept = Math.abs(sinc((acrossSlice[i] as number) * cycles) * sinc(alongRow * cycles) * sinc(alongColumn * cycles));
      const phase = turn * (hertz[i] as number);
      const [cosine, sine] = [kept * Math.cos(phase), kept * Math.sin(phase)];
      const a = object.re[i] as number;
      const b = object.im[i] as number;
      re[i] = a * cosine - b * sine;
      im[i] = a * sine + b * cosine;
    }
  }
  return { ...object, re, im };
}

/** `object` as it is imaged in the field `field`. */
export function encodeOffResonance(object: ComplexPlane, field: FieldMap, readout: Readout, acquisition: Acquisition): ComplexPlane {
  const turn = phasePerHertz(readout);
  const { axis, pixelsPerHertz } = displacementOf(readout, object, acquisition);
  const pixels = field.hertz.map((hertz) => hertz * pixelsPerHertz);
  const beyond = axis === phaseEncodeAxis(acquisition.phaseEncode) ? 'folded' : 'lost';
  return displaced(turn === 0 ? object : dephased(object, field, turn), axis, pixels, beyond);
}
