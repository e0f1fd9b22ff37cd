/**
 * Numbers that hold a simulated image s against a bad image b on the same grid, both real [row, column].
 * The gain g = ⟨s, b⟩/⟨s, s⟩ is taken out first: images are in arbitrary units.
 */
import type { Plane } from '../grid';

function requireSameSize(s: Plane, b: Plane): void {
  if (s.rows === b.rows && s.columns === b.columns) return;
  throw RangeError(`planes must have the same size, got ${s.rows}×${s.columns} and ${b.rows}×${b.columns}`);
}

/** Least-squares gain g = ⟨s, b⟩/⟨s, s⟩, 0 for an empty s. */
export function leastSquaresGain(s: Plane, b: Plane): number {
  requireSameSize(s, b);
  let cross = 0;
  let own = 0;
  for (let i = 0; i < s.values.length; i++) {
    const value = s.values[i] as number;
    cross += value * (b.values[i] as number);
    own += value * value;
  }
  return own === 0 ? 0 : cross / own;
}

/** ‖g·s − b‖/‖b‖. NaN where b is empty: there is nothing to compare with. */
export function nrmse(s: Plane, b: Plane): number {
  const g = leastSquaresGain(s, b);
  let difference = 0;
  let size = 0;
  for (let i = 0; i < s.values.length; i++) {
    const reference = b.values[i] as number;
    const d = g * (s.values[i] as number) - reference;
    difference += d * d;
    size += reference * reference;
  }
  return Math.sqrt(difference / size);
}
