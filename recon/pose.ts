/**
 * A rigid object that stands elsewhere while some of the lines are taken. A line taken while the object is turned by α and moved by d is
 * K'(k) = K(R⁻¹k)·exp(−i2πk·d), R the rotation by α from the phase-encode axis towards the readout, about the centre of the picture.
 */
import type { Encoded } from './cause';
import type { FineKspace } from './off-grid';
import { fineKspace, sampleAt } from './off-grid';
import type { Lines } from './lines';
import { copyOf, copyOfBytes, giveBackPlane } from './spare-arrays';

/** Metres along each axis, and radians. */
export interface Pose {
  readonly alongPhaseEncode: number;
  readonly alongReadout: number;
  readonly rotation: number;
}

/** Pixel sizes [phase encode, readout] in metres of the image that `kspace` is the transform of. */
function pixelSizes({ rows, columns, spacing }: Encoded, lines: Lines): readonly [number, number] {
  const sizes = [1 / (rows * spacing[0]), 1 / (columns * spacing[1])] as const;
  return lines.sampleStride === 1 ? sizes : [sizes[1], sizes[0]];
}

/** Line `line` of `turned` as it is read with the object turned by `rotation`. */
function readTurned(turned: Encoded, fine: FineKspace, lines: Lines, [line, rotation]: readonly [number, number]): void {
  const { nLines, samplesPerLine, centre, lineStride, sampleStride } = lines;
  const [phasePixel, readoutPixel] = pixelSizes(turned, lines);
  const [phaseField, readoutField] = [nLines * phasePixel, samplesPerLine * readoutPixel];
  const [cosine, sine] = [Math.cos(rotation), Math.sin(rotation)];
  const ky = (line - centre) / phaseField;
  const value = new Float64Array(2);
  for (let sample = 0; sample < samplesPerLine; sample++) {
    const i = line * lineStride + sample * sampleStride;
    if (turned.taken[i] === 0) continue;
    const kx = (sample - Math.floor(samplesPerLine / 2)) / readoutField;
    const alongPhaseEncode = (ky * cosine + kx * sine) * phaseField;
    const alongReadout = (kx * cosine - ky * sine) * readoutField;
    if (sampleStride === 1) sampleAt(fine, alongPhaseEncode, alongReadout, value);
    else sampleAt(fine, alongReadout, alongPhaseEncode, value);
    turned.re[i] = value[0] as number;
    turned.im[i] = value[1] as number;
  }
}

/** Multiplies a line by exp(−i2πk·d), d in pixels [phase encode, readout]; along the line the phase is a recurrence. */
function rampLine(moved: Encoded, lines: Lines, line: number, [alongPhaseEncode, alongReadout]: readonly [number, number]): void {
  const { nLines, samplesPerLine, centre, lineStride, sampleStride } = lines;
  const start = (line - centre) * (alongPhaseEncode / nLines) - Math.floor(samplesPerLine / 2) * (alongReadout / samplesPerLine);
  const step = (-2 * Math.PI * alongReadout) / samplesPerLine;
  const [stepRe, stepIm] = [Math.cos(step), Math.sin(step)];
  let re = Math.cos(-2 * Math.PI * start);
  let im = Math.sin(-2 * Math.PI * start);
  for (let sample = 0; sample < samplesPerLine; sample++) {
    const i = line * lineStride + sample * sampleStride;
    const a = moved.re[i] as number;
    const b = moved.im[i] as number;
    moved.re[i] = a * re - b * im;
    moved.im[i] = a * im + b * re;
    const next = re * stepRe - im * stepIm;
    im = re * stepIm + im * stepRe;
    re = next;
  }
}

/** k-space of an object that has the pose `poses[line]` while a line is taken. */
export function withPoses(kspace: Encoded, lines: Lines, poses: readonly Pose[]): Encoded {
  const moved = { ...kspace, re: copyOf(kspace.re), im: copyOf(kspace.im), taken: copyOfBytes(kspace.taken) };
  const [phasePixel, readoutPixel] = pixelSizes(kspace, lines);
  let fine: FineKspace | undefined;
  poses.forEach(({ alongPhaseEncode, alongReadout, rotation }, line) => {
    if (rotation !== 0) {
      fine ??= fineKspace(kspace);
      readTurned(moved, fine, lines, [line, rotation]);
    }
    if (alongPhaseEncode !== 0 || alongReadout !== 0) {
      rampLine(moved, lines, line, [alongPhaseEncode / phasePixel, alongReadout / readoutPixel]);
    }
  });
  if (fine) giveBackPlane(fine);
  return moved;
}
