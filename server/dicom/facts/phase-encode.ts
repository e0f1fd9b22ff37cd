/**
 * Along which axis phase was encoded, and how many samples were acquired. Two attributes tell the axis, and they must agree;
 * where they do not, or both are silent, a person is asked: nothing is assumed.
 * Sources: DICOM PS3.3 C.8.3.1.1, In-plane Phase Encoding Direction (0018,1312) and Acquisition Matrix (0018,1310), which holds
 * frequency rows, frequency columns, phase rows, phase columns, two of them zero.
 */
import type { PhaseEncode } from '../../contract/facts';
import type { Header } from '../header';
import { absent, doubtful, fromHeader, quantity, workedOut, type Fact } from './fact';

interface AcquisitionMatrix {
  readonly phaseEncode: PhaseEncode;
  readonly readout: number;
  readonly phase: number;
}

/** No scanner acquires more samples than this along one axis (common practice). */
const largestMatrix = 4096;

/** The acquisition matrix where it makes sense; `null` where the header holds something else under its tag. */
export function acquisitionMatrix(header: Header): AcquisitionMatrix | null | undefined {
  const values = header.numbers('acquisitionMatrix');
  if (values.length === 0) return undefined;
  const [frequencyRows, frequencyColumns, phaseRows, phaseColumns] = values;
  if (values.length !== 4 || !values.every((value) => value >= 0 && value <= largestMatrix)) return null;
  if (frequencyRows && phaseColumns && frequencyColumns === 0 && phaseRows === 0) {
    return { phaseEncode: 'column', readout: frequencyRows, phase: phaseColumns };
  }
  if (frequencyColumns && phaseRows && frequencyRows === 0 && phaseColumns === 0) {
    return { phaseEncode: 'row', readout: frequencyColumns, phase: phaseRows };
  }
  return null;
}

const directions: Readonly<Record<string, PhaseEncode>> = { ROW: 'row', COL: 'column', COLUMN: 'column' };

export function phaseEncodeFact(header: Header): Fact<PhaseEncode> {
  const text = header.text('phaseEncodingDirection');
  const direction = text === undefined ? undefined : directions[text];
  const matrix = acquisitionMatrix(header);
  if (direction === undefined) {
    if (text !== undefined)
      return doubtful<PhaseEncode>(null, 'The header’s phase encoding direction is neither ROW nor COL: say which axis it is.');
    if (!matrix) return absent('The header is silent about the phase encoding direction: say which axis it is.');
    return workedOut(matrix.phaseEncode, 'The header names no direction; the acquisition matrix tells it.');
  }
  if (matrix === undefined) return fromHeader(direction, 'The header holds no acquisition matrix that would confirm it.');
  if (matrix === null) return fromHeader(direction, 'The acquisition matrix in the header makes no sense and does not confirm it.');
  if (matrix.phaseEncode === direction) return fromHeader(direction);
  const said = `The direction says ${direction}, the acquisition matrix ${matrix.phaseEncode}`;
  return doubtful<PhaseEncode>(null, `${said}: say which axis it is. An image that was rotated after the scan can do this.`);
}

/** Enhanced files count steps instead of holding a matrix (PS3.3 C.8.13.5.3). */
const acquiredSteps = (header: Header): { acquiredReadout: Fact<number>; acquiredPhase: Fact<number> } => ({
  acquiredReadout: quantity(header, 'readoutSteps', { from: 1, to: largestMatrix, unit: 'samples' }),
  acquiredPhase: quantity(header, 'phaseEncodingStepsInPlane', { from: 1, to: largestMatrix, unit: 'lines' }),
});

export function acquiredFacts(header: Header): { acquiredReadout: Fact<number>; acquiredPhase: Fact<number> } {
  const matrix = acquisitionMatrix(header);
  if (matrix === undefined) return acquiredSteps(header);
  if (matrix !== null) return { acquiredReadout: fromHeader(matrix.readout), acquiredPhase: fromHeader(matrix.phase) };
  const nValues = header.numbers('acquisitionMatrix').length;
  const why = nValues === 4 ? 'is not two counts and two zeros' : `has ${nValues} values instead of 4`;
  const none = doubtful<number>(null, `The acquisition matrix in the header ${why}.`);
  return { acquiredReadout: none, acquiredPhase: none };
}
