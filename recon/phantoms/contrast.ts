/**
 * How bright a material is: the signal of a sequence at its echo, with TR, TE and flip angle α, E1 = exp(−TR/T1).
 *   spin echo (90°–180°)     S = ρ·(1 − 2·exp(−(TR − TE/2)/T1) + E1)·exp(−TE/T2)
 *   spoiled gradient echo    S = ρ·sin α·(1 − E1)/(1 − E1·cos α)·exp(−TE/T2*),  1/T2* = 1/T2 + R2′
 * Fat is one line 3.5 ppm from water: refocused by the spin echo, turned by 2π·Δf·TE in the gradient echo, S·(1 − f + f·exp(iφ)).
 * Sources: Bernstein, King & Zhou, Handbook of MRI Pulse Sequences, 2004, chapter 14 (from memory); Ernst & Anderson, Rev Sci
 * Instrum 1966;37:93, doi 10.1063/1.1719961 (from memory); Dixon, Radiology 1984;153:189. Ideal pulses, steady state.
 */
import { fatShift, gyromagneticRatio } from '../encoding';
import type { FieldStrength, Material } from './material';

export interface SpinEcho {
  readonly kind: 'spin-echo';
  /** Seconds, the repetition time longer than the echo time. */
  readonly repetitionTime: number;
  readonly echoTime: number;
}

export interface SpoiledGradientEcho {
  readonly kind: 'spoiled-gradient-echo';
  readonly repetitionTime: number;
  readonly echoTime: number;
  /** Radians, 0 to π. */
  readonly flipAngle: number;
  /** R2′, decay by an uneven field, 1/s; left out, the shim is perfect. */
  readonly reversibleDecayRate?: number;
}

export type Sequence = SpinEcho | SpoiledGradientEcho;

export interface Signal {
  readonly re: number;
  readonly im: number;
}

/** Flip angle of the strongest steady state, cos α = exp(−TR/T1), radians. */
export const ernstAngle = (repetitionTime: number, t1: number): number => Math.acos(Math.exp(-repetitionTime / t1));

/** Hertz between water and the main peak of fat. */
export const fatWaterDifference = (fieldStrength: number): number => fatShift * gyromagneticRatio * fieldStrength;

/** Echo times in seconds at which fat and water first point apart, and first agree again. */
export function phaseTimes(fieldStrength: number): { opposed: number; inPhase: number } {
  const inPhase = 1 / fatWaterDifference(fieldStrength);
  return { opposed: inPhase / 2, inPhase };
}

function checkTimes({ repetitionTime, echoTime }: Sequence): void {
  if (!(echoTime >= 0 && repetitionTime > echoTime)) {
    throw RangeError(`repetitionTime must be above echoTime and echoTime at least 0, got ${repetitionTime} and ${echoTime} s`);
  }
}

/** S of `material` at the echo, relative to fully recovered water at no echo time. Throws where TE is not within TR. */
export function signalOf({ protonDensity, fatFraction, t1, t2 }: Material, sequence: Sequence, fieldStrength: FieldStrength): Signal {
  checkTimes(sequence);
  const { repetitionTime, echoTime } = sequence;
  const recovery = Math.exp(-repetitionTime / t1[fieldStrength]);
  const decay = Math.exp(-echoTime / t2[fieldStrength]);
  if (sequence.kind === 'spin-echo') {
    const sinceRefocusing = Math.exp(-(repetitionTime - echoTime / 2) / t1[fieldStrength]);
    return { re: protonDensity * (1 - 2 * sinceRefocusing + recovery) * decay, im: 0 };
  }
  const { flipAngle, reversibleDecayRate = 0 } = sequence;
  const steadyState = (Math.sin(flipAngle) * (1 - recovery)) / (1 - recovery * Math.cos(flipAngle));
  const size = protonDensity * steadyState * decay * Math.exp(-echoTime * reversibleDecayRate);
  const turn = 2 * Math.PI * fatWaterDifference(fieldStrength) * echoTime;
  return { re: size * (1 - fatFraction + fatFraction * Math.cos(turn)), im: size * fatFraction * Math.sin(turn) };
}
