/** The numbers that hold a simulated image against another one, which is laid over it in millimetres first. */
import type { Acquisition, PhaseEncode } from '../recon/acquisition';
import type { Grid, Plane } from '../recon/grid';
import { ghostRatio, type GhostRatio } from '../recon/metrics/ghost-ratio';
import { leastSquaresGain, nrmse } from '../recon/metrics/nrmse';
import { ssim, ssimReference, type SsimReference } from '../recon/metrics/ssim';
import { resample } from '../recon/resample';
import type { SimulationNumbers } from './job';

/** Grids that agree to a thousandth of a pixel are the same: positions are read from decimal strings. */
const pixelTolerance = 1e-3;
/** The side of the window of `ssim`. */
const ssimWindow = 11;

const nothingToCompare = { nrmse: null, gain: null, ssim: null, ghostRatioOfBad: null };

/** An image to compare with; `key` names it, so that what was worked out about it is kept while a slider moves. */
export interface Reference {
  readonly key: string;
  readonly plane: () => Plane;
}

/** A reference on the grid of the simulated image, with what stays of it while the simulation changes. */
interface LaidOver {
  readonly key: string;
  readonly plane: Plane;
  readonly ghostRatio: number | null;
  /** Undefined where a side is shorter than the window of `ssim`. */
  readonly forSsim: SsimReference | undefined;
}
let newest: LaidOver | undefined;

/** Numbers of `simulated` alone and against `bad`; null, with the reason, where one cannot be had. */
export function compareNumbers(simulated: Plane, bad: Reference | undefined, { phaseEncode }: Acquisition): SimulationNumbers {
  const ghost = ghostRatio(simulated, phaseEncode);
  const own = { ghostRatio: ghost.value, ghostRegions: regionsOf(ghost) };
  const because = ghost.because === undefined ? {} : { reason: ghost.because };
  if (bad === undefined) return { ...nothingToCompare, ...own, ...because };

  const laidOver = layOver(bad, simulated, phaseEncode);
  if (laidOver === undefined) return { ...nothingToCompare, ...own, reason: 'the two images have no part of space in common' };
  const error = nrmse(simulated, laidOver.plane);
  if (!Number.isFinite(error))
    return { ...nothingToCompare, ...own, reason: 'the image to compare with is empty where the simulated one lies' };
  return {
    ...own,
    ...because,
    nrmse: error,
    gain: leastSquaresGain(simulated, laidOver.plane),
    ssim: laidOver.forSsim ? ssim(simulated, laidOver.forSsim) : null,
    ghostRatioOfBad: laidOver.ghostRatio,
  };
}

/** The reference in the place of `grid`, in millimetres; the newest one is kept. Undefined where the two do not meet. */
function layOver({ key: image, plane }: Reference, grid: Plane, phaseEncode: PhaseEncode): LaidOver | undefined {
  const key = [image, phaseEncode, grid.rows, grid.columns, ...grid.spacing, ...grid.origin].join(' ');
  if (newest?.key === key) return newest;
  const original = plane();
  const laid = isSameGrid(grid, original) ? original : tryResample(original, grid);
  if (laid === undefined) return undefined;
  const isLargeEnough = Math.min(grid.rows, grid.columns) >= ssimWindow;
  newest = { key, plane: laid, ghostRatio: ghostRatio(laid, phaseEncode).value, forSsim: isLargeEnough ? ssimReference(laid) : undefined };
  return newest;
}

function regionsOf({ regions }: GhostRatio): NonNullable<SimulationNumbers['ghostRegions']> {
  const named = [
    { kind: 'object', region: regions.object },
    { kind: 'ghost', region: regions.ghost },
    { kind: 'air', region: regions.otherAir },
  ] as const;
  return named.flatMap(({ kind, region: { nPixels: pixels, mean } }) => (mean === null ? [] : [{ kind, pixels, mean }]));
}

function isSameGrid(a: Grid, b: Grid): boolean {
  if (a.rows !== b.rows || a.columns !== b.columns) return false;
  return ([0, 1] as const).every((axis) => {
    const pixel = a.spacing[axis];
    return Math.abs(pixel - b.spacing[axis]) < pixelTolerance * pixel && Math.abs(a.origin[axis] - b.origin[axis]) < pixelTolerance * pixel;
  });
}

function tryResample(plane: Plane, grid: Grid): Plane | undefined {
  try {
    return resample(plane, grid);
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}
