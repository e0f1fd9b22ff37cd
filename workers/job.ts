/** Messages between the server and its worker threads. Image values are shared memory; what comes back is moved, never copied. */
import type { Acquisition } from '../recon/acquisition';
import type { Parts } from '../recon/complex-image';
import type { Recipe } from '../recon/recipe';
import type { Derivation } from '../server/dicom/derived/derivation';

/** One frame of a stored image: float32 values, [frame, row, column], where `isComplex` re and im in turn. */
export interface ImageSource {
  readonly imageId: string;
  readonly frame: number;
  readonly rows: number;
  readonly columns: number;
  /** Row, column; null where the header is silent, and then 1 mm is assumed. */
  readonly spacingMm: readonly [number, number] | null;
  readonly isComplex: boolean;
  readonly values: SharedArrayBuffer;
}

export type PlaneName = 'image' | 'kspace' | 'kspaceOfImage';
export type PlaneForm = 'exact' | 'display';
export type Domain = 'image' | 'kspace';

/** A plane as it travels: what the bytes of an answer are. Spacing and origin in mm, or cycles per metre for k-space. */
export interface PlaneDescription {
  readonly name: string;
  readonly rows: number;
  readonly columns: number;
  readonly type: 'float32' | 'complex64' | 'uint16';
  readonly spacing: [number, number];
  readonly origin: [number, number];
  readonly low?: number;
  readonly high?: number;
}

export interface Planes {
  readonly planes: PlaneDescription[];
  readonly bytes: Uint8Array;
}

export interface SimulationNumbers {
  readonly nrmse: number | null;
  readonly gain: number | null;
  readonly ssim: number | null;
  readonly ghostRatio: number | null;
  readonly ghostRatioOfBad: number | null;
  readonly ghostRegions?: { kind: 'object' | 'ghost' | 'air'; pixels: number; mean: number }[];
  readonly reason?: string;
  readonly computedInMs?: number;
}

/** Runs a recipe: planes back, and numbers against another image where one is named. */
export interface SimulateJob {
  readonly kind: 'simulate';
  readonly source: ImageSource;
  readonly recipe: Recipe;
  readonly acquisition: Acquisition;
  readonly outputs: readonly PlaneName[];
  readonly compareWith?: ImageSource;
  readonly form: PlaneForm;
}
export interface SimulateResult extends Planes {
  readonly numbers: SimulationNumbers;
}

/** Runs a recipe to keep it: digest of the image plane, numbers, and two small pictures marked as simulated. */
export interface TrialJob {
  readonly kind: 'trial';
  readonly source: ImageSource;
  readonly recipe: Recipe;
  readonly acquisition: Acquisition;
  readonly compareWith?: ImageSource;
  /** Values drawn black and white in the picture: those of the source, so that a case's pictures can be held against each other. */
  readonly window: readonly [number, number];
}
export interface TrialResult {
  readonly digest: string;
  readonly numbers: SimulationNumbers;
  readonly imageThumbnail: Uint8Array;
  readonly kspaceThumbnail: Uint8Array;
}

export type ExportForm = 'derived.dcm' | 'image.png' | 'image16.png' | 'kspace.png' | 'kspace16.png' | 'image.npy' | 'kspace.npy';

/** Runs a recipe to hand its result out as a file that says it is simulated. */
export interface ExportJob {
  readonly kind: 'export';
  readonly form: ExportForm;
  readonly source: ImageSource;
  readonly recipe: Recipe;
  readonly acquisition: Acquisition;
  readonly about: Derivation;
}
export interface ExportResult {
  readonly bytes: Uint8Array;
  /** SHA-256 of the float32 image plane, as of a trial. */
  readonly digest: string;
}

/** The stored values of an image, their transform, or that of their magnitude, which a complex image is held against a simulation by. */
export interface PixelsJob {
  readonly kind: 'pixels';
  readonly source: ImageSource;
  readonly domain: Domain | 'kspaceOfImage';
  readonly form: PlaneForm;
}

/** Makes a complex image of two stored ones; values are all frames of each, the result re and im in turn. */
export interface PairJob {
  readonly kind: 'pair';
  readonly parts: Parts;
  readonly first: SharedArrayBuffer;
  readonly second: SharedArrayBuffer;
}
export interface PairResult {
  /** Float32 values as bytes. */
  readonly values: Uint8Array;
  /** Of the magnitude, for the first window. */
  readonly range: readonly [number, number];
}

/** A small PNG of an image or of its log-magnitude k-space. `window`: the values drawn black and white. */
export interface ThumbnailJob {
  readonly kind: 'thumbnail';
  readonly source: ImageSource;
  readonly domain: Domain;
  readonly window: readonly [number, number];
}
export interface ThumbnailResult {
  readonly bytes: Uint8Array;
}

/** A small PNG of a cause on the phantom that shows it best. `strength` 0 mild to 1 strong; `side` in pixels, and samples of the phantom. */
export interface SwatchJob {
  readonly kind: 'swatch';
  readonly causeId: string;
  readonly strength: number;
  readonly domain: 'half' | Domain;
  readonly side: number;
}

/** A place in an image in pixels, [row, column]. */
export interface PixelPlace {
  readonly row: number;
  readonly column: number;
}

/** Numbers along a line, or of a region between two corners. */
export interface MeasureJob {
  readonly kind: 'measure';
  readonly source: ImageSource;
  readonly shape: 'line' | 'rectangle' | 'ellipse';
  readonly from: PixelPlace;
  readonly to: PixelPlace;
}
/** Undefined where no pixel lies in the region. */
export interface MeasureResult {
  readonly profile?: {
    readonly distanceMm: number[];
    readonly values: number[];
    readonly frequency: number[];
    readonly amplitude: number[];
    readonly strongest: { readonly frequency: number; readonly periodMm: number; readonly amplitude: number } | null;
  };
  readonly statistics?: {
    readonly pixels: number;
    readonly mean: number;
    readonly standardDeviation: number;
    readonly min: number;
    readonly max: number;
    readonly median: number;
  };
}
