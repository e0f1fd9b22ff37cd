/**
 * A cause of a bad image: one file each in `causes/`, one `defineCause` each. The stage fixes what `apply` works on and when it
 * acts: causes combine in the order of the signal chain, never in the order of clicks.
 */
import type { Acquisition } from './acquisition';
import type { ComplexPlane } from './grid';
import type { Parameters, ValuesOf } from './parameter';
import type { Random } from './random';

export interface Source {
  readonly citation: string;
  readonly year?: number;
  readonly doi?: string;
  readonly equation?: string;
  readonly standing: 'confirmed' | 'from memory' | 'common practice';
}

export interface Remedy {
  /** What to change, in the trade's words. */
  readonly change: string;
  readonly who: 'technologist' | 'physicist' | 'licensed service';
  /** Time, SNR, contrast; SAR, nerve stimulation or implant conditions where they change. */
  readonly price: string;
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

interface Described<P extends Parameters> {
  readonly id: string;
  readonly title: string;
  readonly parameters: P;
  /** One plain sentence each; where k-space does not show the cause, `kspace` says so. */
  readonly looks: { readonly image: string; readonly kspace: string };
  readonly sources: readonly Source[];
}

interface CauseBase<P extends Parameters> extends Described<P> {
  readonly remedies: readonly Remedy[];
  /** The bench starts this cause with a synthetic object phase: without one the model looks better than it is. */
  readonly needsObjectPhase?: boolean;
  /** The result may have another number of lines. Left out: the shape stays. */
  readonly changesMatrix?: boolean;
  /** Parameter values at which the cause does nothing, where there are such. */
  readonly identity?: ValuesOf<P>;
}

/** Acts on the object before encoding, [row, column] complex image. */
export interface ObjectCause<P extends Parameters = Parameters> extends CauseBase<P> {
  readonly stage: 'object';
  apply(object: ComplexPlane, parameters: ValuesOf<P>, context: Context): ComplexPlane;
}

/** Acts on k-space while or after it is sampled. */
export interface SamplingCause<P extends Parameters = Parameters> extends CauseBase<P> {
  readonly stage: 'encoding' | 'receive';
  apply(kspace: Encoded, parameters: ValuesOf<P>, context: Context): Encoded;
}

export type Cause<P extends Parameters = Parameters> = ObjectCause<P> | SamplingCause<P>;

/** Reconstruction: k-space as acquired to a complex image. */
export interface Reconstruction<P extends Parameters = Parameters> extends Described<P> {
  reconstruct(kspace: Encoded, parameters: ValuesOf<P>, context: Context): ComplexPlane;
}

/** Checks the type of a cause against its own parameters and forgets them for the list. */
export const defineCause = <const P extends Parameters>(cause: Cause<P>): Cause => cause as unknown as Cause;
export const defineReconstruction = <const P extends Parameters>(method: Reconstruction<P>): Reconstruction =>
  method as unknown as Reconstruction;
