/** Which causes show what was seen. */
import type { Cause } from '@/server/contract/catalogue';
import type { Sighting } from '@/server/contract/sighting';

/** Causes that show at least one of the things seen; all of them where nothing was said or none fits. */
export function fittingCauses(causes: readonly Cause[], seen: readonly Sighting[]): Cause[] {
  const shown = causes.filter((cause) => cause.seen.some((sighting) => seen.includes(sighting)));
  return shown.length > 0 ? shown : [...causes];
}
