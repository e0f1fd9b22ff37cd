/**
 * A cause of a bad image: one file each in `causes/`, one `defineCause` each. `domain` fixes what `apply` works on; the order of
 * the list in `causes/index.ts` is that of the signal chain and fixes when it acts, never the order of clicks.
 */
import type { Acquisition } from './acquisition';
import type { ComplexPlane } from './grid';
import type { Parameters, ValuesOf } from './parameter';
import type { PhantomId } from './phantoms/phantom';
import type { Random } from './random';

export interface Source {
  readonly citation: string;
  readonly year?: number;
  readonly doi?: string;
  readonly equation?: string;
  readonly standing: 'confirmed' | 'from memory' | 'common practice';
}

/** `changes`: up or down, as it is done. */
export type Move = 'rises' | 'falls' | 'changes';

/** What a remedy moves besides the fault; what is left out stays as it is. */
export interface Moves {
  /** Of the scan; `once` at the table or for an adjustment, after which the scan is as long as before. */
  readonly time?: Move | 'once';
  readonly snr?: Move;
  readonly contrast?: 'changes';
  readonly sar?: Move;
  readonly nerveStimulation?: Move;
  /** What the implant of a patient was cleared for may no longer hold. */
  readonly implantConditions?: 'changes';
}

export interface Remedy {
  /** What to change, in the trade's words. */
  readonly change: string;
  readonly who: 'technologist' | 'physicist' | 'licensed service';
  /** In a sentence: all that `moves` names, how much, and what else is paid. */
  readonly price: string;
  readonly moves: Moves;
}

export interface Context {
  readonly acquisition: Acquisition;
  readonly random: Random;
}

/** k-space as acquired: complex samples and, line by line along the phase encoding, whether they were taken. */
export interface Encoded extends ComplexPlane {
  /** One byte a sample, [row, column]: 1 taken, 0 not. Samples not taken are zero. */
  readonly taken: Uint8Array;
}

/** What a user sees; the words of a report. */
export type Sighting = 'ghosts' | 'fold-in' | 'lines' | 'shading' | 'distortion' | 'blur' | 'noise' | 'signal-loss' | 'other';

/** A scan fact that drives the cause, and how. */
export interface Driver {
  readonly fact: string;
  readonly does: string;
}

/** The values of a quantity at which a swatch is mild and strong. */
export type Ends = readonly [mild: number, strong: number];

/** What the catalogue says of a cause and of a reconstruction alike. */
interface Described<P extends Parameters> {
  readonly id: string;
  readonly title: string;
  readonly seen: readonly Sighting[];
  readonly runsAlong: 'phase-encode' | 'readout' | 'both' | 'none';
  /** The model, in TeX. */
  readonly formula: string;
  readonly drivers: readonly Driver[];
  readonly parameters: P;
  /** One plain sentence each; where k-space does not show it, `kspace` says so. */
  readonly looks: { readonly image: string; readonly kspace: string };
  readonly remedies: readonly Remedy[];
  readonly sources: readonly Source[];
  /** The bench starts it with a synthetic object phase: without one the model looks better than it is. */
  readonly needsObjectPhase?: boolean;
  /** The result may have another matrix. Left out: the shape stays. */
  readonly changesMatrix?: boolean;
  /** Parameter values at which a cause does nothing, and a reconstruction restores an object of which all samples were taken. */
  readonly identity?: ValuesOf<P>;
  /** The phantom on which the swatch shows it best. Left out: the head. */
  readonly phantom?: PhantomId;
  /** Quantities that the swatch moves, each [mild, strong], where the line from identity through the initial value does not suit. Two equal
   *  ends hold a quantity at another value than its initial one. */
  readonly strength?: { readonly [K in keyof P]?: Ends };
}

interface CauseBase<P extends Parameters> extends Described<P> {
  /** Where in the signal chain the cause belongs, as a user reads it. */
  readonly stage: 'object' | 'encoding' | 'receive';
}

/** Acts on the complex image before it is encoded, [row, column]. */
export interface ImageCause<P extends Parameters = Parameters> extends CauseBase<P> {
  readonly domain: 'image';
  apply(object: ComplexPlane, parameters: ValuesOf<P>, context: Context): ComplexPlane;
}

/** Acts on k-space, line by line or as a whole, while or after it is sampled: also what moves between lines. */
export interface KspaceCause<P extends Parameters = Parameters> extends CauseBase<P> {
  readonly domain: 'kspace';
  apply(kspace: Encoded, parameters: ValuesOf<P>, context: Context): Encoded;
}

export type Cause<P extends Parameters = Parameters> = ImageCause<P> | KspaceCause<P>;

/** A step of which a reconstruction has to make an image; quantities that its swatch moves, each [mild, strong]. */
export interface ShownStep {
  readonly cause: Cause;
  readonly strength?: Readonly<Record<string, Ends>>;
}

/** Reconstruction: k-space as acquired to a complex image. It is the last stage of the signal chain. */
export interface Reconstruction<P extends Parameters = Parameters> extends Described<P> {
  /** What its swatch is made of; the bench starts it with the same steps. */
  readonly shownOn: {
    readonly steps: readonly ShownStep[];
    /** Values of the method itself that differ from the initial ones. */
    readonly parameters?: { readonly [K in keyof P]?: ValuesOf<P>[K] };
    /** Samples of the phantom along a side, as a part of the pixels of the picture. Left out: as many. */
    readonly samples?: number;
  };
  reconstruct(kspace: Encoded, parameters: ValuesOf<P>, context: Context): ComplexPlane;
}

/** Checks the type of a cause against its own parameters and forgets them for the list. */
export const defineCause = <const P extends Parameters>(cause: Cause<P>): Cause => cause as unknown as Cause;
export const defineReconstruction = <const P extends Parameters>(method: Reconstruction<P>): Reconstruction =>
  method as unknown as Reconstruction;
