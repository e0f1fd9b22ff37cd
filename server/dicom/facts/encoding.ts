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
import { wordsFact } from './words';

type PartialFourier = NonNullable<ScanFacts['partialFourier']['value']>;

/** Lines in excess or missing by less than this are rounding of the scanner, not a technique (common practice). */
const ratioTolerance = 0.05;

export const phaseEncodingStepsFact = (header: Header): Fact<number> =>
  quantity(header, ['phaseEncodingSteps', 'phaseEncodingStepsInPlane'], { from: 1, to: 65_536, unit: 'lines' });
export const percentPhaseFieldOfViewFact = (header: Header): Fact<number> =>
  quantity(header, 'percentPhaseFieldOfView', { from: 1, to: 200, unit: '%' });

export function accelerationFactorFact(header: Header): Fact<number> {
  if (header.text('parallelAcquisition') === 'NO') return fromHeader(1);
  return quantity(header, 'parallelReductionFactor', { from: 1, to: 64, unit: '' });
}

export function acquisitionTypeFact(header: Header): Fact<'2D' | '3D'> {
  const text = header.text('acquisitionType');
  if (text === '2D' || text === '3D') return fromHeader(text);
  return text === undefined ? absent() : doubtful<'2D' | '3D'>(null, 'The header says neither 2D nor 3D.');
}

/** π/4 of the samples of a 3D scan: corners of k-space left out in both phase directions, not a coarser resolution in one. */
export function percentSamplingFact(header: Header): Fact<number> {
  const fact = quantity(header, 'percentSampling', { from: 1, to: 200, unit: '%' });
  if (fact.value === null || acquisitionTypeFact(header).value !== '3D') return fact;
  const named = header.text('coverageOfKspace') === 'ELLIPTICAL';
  if (!named && Math.abs(fact.value - 25 * Math.PI) >= 0.05) return fact;
  const why = named ? 'The header says that k-space was covered elliptically' : 'This is π/4: an elliptical coverage of k-space in 3D';
  return doubtful(fact.value, `${why}, not a reduced resolution along one axis.`);
}

export function echoPlanarFact(header: Header): Fact<boolean> {
  const sequence = header.texts('scanningSequence');
  const flag = header.text('echoPlanarPulseSequence');
  if (sequence.includes('EP') || flag === 'YES') return fromHeader(true);
  return sequence.length > 0 || flag === 'NO' ? fromHeader(false) : absent();
}

const echoes: Readonly<Record<string, readonly string[]>> = { SPIN: ['SE'], GRADIENT: ['GR'], BOTH: ['SE', 'GR'] };

/** Enhanced files name the echo instead: in the words of the classic attribute, so that the same fact reads the same. */
export function scanningSequenceFact(header: Header): Fact<string> {
  const fact = wordsFact(header, 'scanningSequence');
  const echo = echoes[header.text('echoPulseSequence') ?? ''];
  if (fact.value !== null || echo === undefined) return fact;
  const words = header.text('echoPlanarPulseSequence') === 'YES' ? [...echo, 'EP'] : echo;
  return workedOut(words.join('\\'), 'From the pulse sequence attributes of an enhanced file.');
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

const writtenDirections: Readonly<Record<string, PartialFourier>> = { PHASE: 'phase', FREQUENCY: 'readout', COMBINATION: 'both' };

/** As enhanced files write it (PS3.3 C.8.13.5.7). */
function writtenPartialFourier(written: string, direction: string | undefined): Fact<PartialFourier> {
  if (written === 'NO') return fromHeader<PartialFourier>('none');
  if (written === 'YES' && direction === 'SLICE_SELECT')
    return fromHeader<PartialFourier>('none', 'Partial Fourier along the slices only.');
  const value = written === 'YES' ? writtenDirections[direction ?? ''] : undefined;
  return value === undefined
    ? doubtful<PartialFourier>(null, 'The header says partial Fourier, and not along which axis.')
    : fromHeader(value);
}

export function partialFourierFact(header: Header): Fact<PartialFourier> {
  const written = header.text('partialFourier');
  if (written !== undefined) return writtenPartialFourier(written, header.text('partialFourierDirection'));
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
