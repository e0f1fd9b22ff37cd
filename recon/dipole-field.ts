/**
 * The field about a ball or a rod whose susceptibility differs from that of its surroundings by Δχ (SI), as a part of B0, in its plane or
 * beside it. With u the unit vector from the centre, ρ the distance, b the direction of B0:
 *   ball of radius a:                 (Δχ/3)(a/ρ)³(3(u·b)² − 1)
 *   rod along the slice normal:       (Δχ/2)(a/ρ)² sin²θ cos 2ψ,  θ between B0 and the rod, ψ from the part of B0 in the plane.
 * Inside there is no signal; the value of the surface holds there, so that nothing jumps. Source: Schenck, Med Phys 1996;23:815.
 */
import type { Acquisition } from './acquisition';
import type { FieldMap } from './field-map';
import type { Grid } from './grid';
import { linesOf } from './lines';

export interface Dipole {
  readonly shape: 'ball' | 'rod';
  /** Metres. */
  readonly radius: number;
  /** Dimensionless, SI. */
  readonly susceptibility: number;
  /** Of the centre, in parts of the field of view from the middle of the picture. */
  readonly alongPhaseEncode: number;
  readonly alongReadout: number;
  /** Metres from the centre of a ball to the middle of the slice. */
  readonly height: number;
  /** Radians: of B0 to the slice normal, and of its part in the plane from the phase-encode axis towards the readout. */
  readonly toNormal: number;
  readonly inPlane: number;
}

/** Where the pixels of a picture lie from the centre of a dipole, metres along phase encoding and readout. */
function places(grid: Grid, acquisition: Acquisition, dipole: Dipole): { along: Float64Array; across: Float64Array } {
  const { nLines, samplesPerLine, centre, sampleStride } = linesOf(grid, acquisition);
  const [phasePixel, readoutPixel] = sampleStride === 1 ? grid.spacing : [grid.spacing[1], grid.spacing[0]];
  const from = (n: number, middle: number, pixel: number, part: number): Float64Array =>
    Float64Array.from({ length: n }, (_, index) => (index - middle - part * n) * pixel);
  return {
    along: from(nLines, centre, phasePixel, dipole.alongPhaseEncode),
    across: from(samplesPerLine, Math.floor(samplesPerLine / 2), readoutPixel, dipole.alongReadout),
  };
}

/** Fills field and slope through the slice (a part of B0, and of B0 per metre) at one pixel. */
type Law = (p: number, q: number, i: number) => void;

function ballLaw({ radius: a, susceptibility, height, toNormal, inPlane }: Dipole, field: Float64Array, slope: Float64Array): Law {
  const inPlanePart = Math.sin(toNormal);
  const [bp, bq, bz] = [inPlanePart * Math.cos(inPlane), inPlanePart * Math.sin(inPlane), Math.cos(toNormal)];
  const third = susceptibility / 3;
  return (p, q, i) => {
    const distance = Math.sqrt(p * p + q * q + height * height);
    if (distance === 0) return;
    const rho = Math.max(a, distance);
    const cosine = (p * bp + q * bq + height * bz) / distance;
    const uz = height / distance;
    const size = third * (a / rho) ** 3;
    field[i] = size * (3 * cosine * cosine - 1);
    slope[i] = (size / rho) * (6 * cosine * bz - 15 * cosine * cosine * uz + 3 * uz);
  };
}

function rodLaw({ radius: a, susceptibility, toNormal, inPlane }: Dipole, field: Float64Array): Law {
  const half = (susceptibility / 2) * Math.sin(toNormal) ** 2;
  const [bp, bq] = [Math.cos(inPlane), Math.sin(inPlane)];
  return (p, q, i) => {
    const squared = p * p + q * q;
    if (squared === 0) return;
    const along = p * bp + q * bq;
    field[i] = half * ((a * a) / Math.max(a * a, squared)) * ((2 * along * along) / squared - 1);
  };
}

/** The field of `dipole` over a picture, in hertz at `frequency`, and its change over a slice of `sliceThickness` metres. */
export function dipoleField(
  grid: Grid,
  acquisition: Acquisition,
  dipole: Dipole,
  { frequency, sliceThickness }: { frequency: number; sliceThickness: number },
): FieldMap {
  const { nLines, samplesPerLine, lineStride, sampleStride } = linesOf(grid, acquisition);
  const hertz = new Float64Array(nLines * samplesPerLine);
  const acrossSlice = new Float64Array(nLines * samplesPerLine);
  if (dipole.radius === 0) return { hertz, acrossSlice };
  const { along, across } = places(grid, acquisition, dipole);
  const law = dipole.shape === 'ball' ? ballLaw(dipole, hertz, acrossSlice) : rodLaw(dipole, hertz);
  for (let line = 0; line < nLines; line++) {
    for (let sample = 0; sample < samplesPerLine; sample++) {
      law(along[line] as number, across[sample] as number, line * lineStride + sample * sampleStride);
    }
  }
  for (let i = 0; i < hertz.length; i++) {
    hertz[i] = (hertz[i] as number) * frequency;
    acrossSlice[i] = (acrossSlice[i] as number) * frequency * sliceThickness;
  }
  return { hertz, acrossSlice };
}

/** The part of each pixel that lies outside the body of `dipole`, 0 to 1, with an edge one pixel wide: inside there is no signal. */
export function outsideBody(grid: Grid, acquisition: Acquisition, dipole: Dipole): Float64Array {
  const { nLines, samplesPerLine, lineStride, sampleStride } = linesOf(grid, acquisition);
  const { along, across } = places(grid, acquisition, dipole);
  const outside = new Float64Array(nLines * samplesPerLine).fill(1);
  const cut = dipole.shape === 'ball' ? dipole.radius ** 2 - dipole.height ** 2 : dipole.radius ** 2;
  if (cut <= 0) return outside;
  const radius = Math.sqrt(cut);
  const pixel = Math.sqrt(grid.spacing[0] * grid.spacing[1]);
  for (let line = 0; line < nLines; line++) {
    for (let sample = 0; sample < samplesPerLine; sample++) {
      const [p, q] = [along[line] as number, across[sample] as number];
      const beyond = (Math.sqrt(p * p + q * q) - radius) / pixel + 0.5;
      outside[line * lineStride + sample * sampleStride] = Math.min(1, Math.max(0, beyond));
    }
  }
  return outside;
}
