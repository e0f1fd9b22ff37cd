/**
 * How k-space was covered: steps, partial Fourier, oversampling, acceleration, echo planar. The number of phase encoding steps
 * counts acquired lines, oversampling included, and goes down with partial Fourier and with acceleration alike; so the scan
 * options are the evidence of partial Fourier, and the ratio of lines is a hint at most.
 * Sources: DICOM PS3.3 C.8.3.1 (Scan Options, Sequence Variant), C.8.13.5 (attributes that enhanced MR brought).
 */
import type { ScanFacts } from '../../contract/facts';
import type { Header } from '../header';
import { absent, doubtful, fromHeader, quantity, workedOut, type Fact } from './fact';
import { acquisitionMatrix } from './phase-encode';

type PartialFourier = NonNullable<ScanFacts['partialFourier']['value']>;

/** Lines in excess or missing by less than this are rounding of the scanner, not a technique (common practice). */
const ratioTolerance = 0.05;

export const phaseEncodingStepsFact = (header: Header): Fact<number> =>
  quantity(header, 'phaseEncodingSteps', { from: 1, to: 65_536, unit: 'lines' });
export const percentPhaseFieldOfViewFact = (header: Header): Fact<number> =>
  quantity(header, 'percentPhaseFieldOfView', { from: 1, to: 200, unit: '%' });
export const accelerationFactorFact = (header: Header): Fact<number> =>
  quantity(header, 'parallelReductionFactor', { from: 1, to: 64, unit: '' });

export function acquisitionTypeFact(header: Header): Fact<'2D' | '3D'> {
  const text = header.text('acquisitionType');
  if (text === '2D' || text === '3D') return fromHeader(text);
  return text === undefined ? absent() : doubtful<'2D' | '3D'>(null, 'The header says neither 2D nor 3D.');
}

/** π/4 of the samples of a 3D scan: corners of k-space left out in both phase directions, not a coarser resolution in one. */
export function percentSamplingFact(header: Header): Fact<number> {
  const fact = quantity(header, 'percentSampling', { from: 1, to: 200, unit: '%' });
  const elliptical = fact.value !== null && Math.abs(fact.value - 25 * Math.PI) < 0.05;
  if (!elliptical || acquisitionTypeFact(header).value !== '3D') return fact;
  return doubtful(fact.value, 'This is π/4: an elliptical coverage of k-space in 3D, not a reduced resolution along one axis.');
}

export function echoPlanarFact(header: Header): Fact<boolean> {
  const sequence = header.texts('scanningSequence');
  const flag = header.text('echoPlanarPulseSequence');
  if (sequence.includes('EP') || flag === 'YES') return fromHeader(true);
  return sequence.length > 0 || flag === 'NO' ? fromHeader(false) : absent();
}

export function phaseOversamplingFact(header: Header): Fact<boolean> {
  if (header.texts('sequenceVariant').includes('OSP')) return fromHeader(true);
  const attribute = header.text('oversamplingPhase');
  if (attribute !== undefined) return fromHeader(attribute !== 'NONE');
  const ratio = acquiredRatio(header);
  if (ratio !== undefined && ratio > 1 + ratioTolerance) {
    return workedOut(
      true,
      `${header.number('phaseEncodingSteps')} lines were acquired for a matrix of ${acquisitionMatrix(header)?.phase}.`,
    );
  }
  return absent('Not every scanner writes whether phase was oversampled.');
}

const partialFourierOf = (options: readonly string[]): PartialFourier => {
  const phase = options.includes('PFP');
  const readout = options.includes('PFF');
  if (phase && readout) return 'both';
  if (phase) return 'phase';
  return readout ? 'readout' : 'none';
};

export function partialFourierFact(header: Header): Fact<PartialFourier> {
  const options = header.texts('scanOptions');
  const value = partialFourierOf(options);
  if (value !== 'none') return fromHeader(value);
  const hint = fewerLinesHint(header);
  if (hint !== undefined) return doubtful(options.length > 0 ? value : null, hint);
  return options.length > 0 ? workedOut(value, 'The scan options name no partial Fourier.') : absent();
}

/** Words for lines that are missing without a reason in the header. */
function fewerLinesHint(header: Header): string | undefined {
  const ratio = acquiredRatio(header);
  const explained = phaseOversamplingFact(header).value === true || (accelerationFactorFact(header).value ?? 1) > 1;
  if (ratio === undefined || explained || ratio >= 1 - ratioTolerance) return undefined;
  const lines = `${header.number('phaseEncodingSteps')} of ${acquisitionMatrix(header)?.phase} lines were acquired`;
  return `${lines}: partial Fourier or parallel imaging, which the header does not name.`;
}

/** Acquired lines over lines of the matrix. */
function acquiredRatio(header: Header): number | undefined {
  const steps = phaseEncodingStepsFact(header).value;
  const matrix = acquisitionMatrix(header);
  return steps === null || !matrix ? undefined : steps / matrix.phase;
}
