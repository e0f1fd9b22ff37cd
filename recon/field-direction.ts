/**
 * Which way the main field points in a picture. B0 runs along the bore; of a patient who lies supine or prone, head or feet first, that
 * is the patient's z axis. For other positions, and for open magnets with a vertical field, nothing is concluded.
 * Source: DICOM PS3.3 C.7.6.2.1.1 (direction cosines of rows and columns, x to the left, y to the back, z to the head) and C.7.3.1.1.2.
 */
import type { Acquisition } from './acquisition';

const alongBore: readonly string[] = ['HFS', 'HFP', 'FFS', 'FFP'];

/** `orientation`: six direction cosines, of a row (growing column index) and of a column (growing row index). */
export function fieldDirectionOf(orientation: readonly number[], patientPosition: string): Acquisition['fieldDirection'] {
  const [xx, xy, xz, yx, yy, yz] = orientation;
  if (xx === undefined || xy === undefined || xz === undefined) return undefined;
  if (yx === undefined || yy === undefined || yz === undefined) return undefined;
  return alongBore.includes(patientPosition) ? [yz, xz, xx * yy - xy * yx] : undefined;
}

/** Degrees, 0 to 90, from the slice normal to the field. */
export function angleToNormal({ fieldDirection }: Acquisition): number | undefined {
  if (!fieldDirection) return undefined;
  const [row, column, normal] = fieldDirection;
  return (Math.atan2(Math.sqrt(row * row + column * column), Math.abs(normal)) * 180) / Math.PI;
}

/** Degrees, 0 to 180, of the part of the field in the plane from the phase-encode axis towards the readout; a field along the normal has none. */
export function angleInPlane({ fieldDirection, phaseEncode }: Acquisition): number | undefined {
  if (!fieldDirection) return undefined;
  const [row, column] = fieldDirection;
  if (row * row + column * column < 1e-12) return undefined;
  const degrees = ((phaseEncode === 'column' ? Math.atan2(column, row) : Math.atan2(row, column)) * 180) / Math.PI;
  return (degrees + 360) % 180;
}
