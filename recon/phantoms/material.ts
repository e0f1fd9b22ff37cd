/**
 * What a phantom is made of, as far as a sequence can tell. Relaxation times are those measured of the material as a whole: water and
 * fat within it share them, and the fat fraction only says how much of the signal turns with the chemical shift.
 */

/** Tesla; the two for which relaxation times are tabulated. */
export type FieldStrength = 1.5 | 3;

export interface Material {
  readonly name: string;
  /** Relative to pure water. */
  readonly protonDensity: number;
  /** Part of the signal at short echo time and full recovery that comes from fat, 0 to 1. */
  readonly fatFraction: number;
  /** Seconds. */
  readonly t1: Readonly<Record<FieldStrength, number>>;
  readonly t2: Readonly<Record<FieldStrength, number>>;
  /** Where the relaxation times come from. Proton density and fat fraction are from memory unless it says otherwise. */
  readonly source: string;
}

interface Values {
  readonly protonDensity: number;
  readonly fatFraction?: number;
  /** Milliseconds at 1.5 T and at 3 T. */
  readonly t1Ms: readonly [number, number];
  readonly t2Ms: readonly [number, number];
  readonly source: string;
}

export function material(name: string, { protonDensity, fatFraction = 0, t1Ms, t2Ms, source }: Values): Material {
  const seconds = ([at1T5, at3T]: readonly [number, number]) => ({ 1.5: at1T5 / 1000, 3: at3T / 1000 });
  return { name, protonDensity, fatFraction, t1: seconds(t1Ms), t2: seconds(t2Ms), source };
}
