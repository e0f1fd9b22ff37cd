/** Numbers along a line of a plane, or of a region of it, in the units of the screen: millimetres along the line, cycles per metre. */
import type { Plane } from '../recon/grid';
import { lineProfile, profileSpectrum, strongestRepeat } from '../recon/profile';
import { statistics, valuesInEllipse, valuesInRectangle } from '../recon/statistics';
import type { MeasureJob, MeasureResult } from './job';

const millimetresPerMetre = 1000;

function measureLine(plane: Plane, { from, to }: MeasureJob): MeasureResult {
  if (from.row === to.row && from.column === to.column) return {};
  const profile = lineProfile(plane, from, to);
  const spectrum = profileSpectrum(profile);
  const strongest = strongestRepeat(profile, spectrum);
  return {
    profile: {
      distanceMm: Array.from(profile.distance, (metres) => metres * millimetresPerMetre),
      values: Array.from(profile.values),
      frequency: Array.from(spectrum.frequency),
      amplitude: Array.from(spectrum.amplitude),
      strongest: strongest ? { ...strongest, periodMm: millimetresPerMetre / strongest.frequency } : null,
    },
  };
}

/** What lies under a line or in a region; empty where no pixel does. */
export function measure(plane: Plane, job: MeasureJob): MeasureResult {
  if (job.shape === 'line') return measureLine(plane, job);
  const values = (job.shape === 'ellipse' ? valuesInEllipse : valuesInRectangle)(plane, job.from, job.to);
  if (values.length === 0) return {};
  const { n: pixels, ...rest } = statistics(values);
  return { statistics: { pixels, ...rest } };
}
