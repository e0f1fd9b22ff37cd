/**
 * Times, angles and counts of the pulse sequence. Ranges are what a scanner can do (common practice); a value outside is not
 * repeated. Source of the attributes and their units: DICOM PS3.3 C.8.3.1, and C.8.13.5 for
 * those of enhanced files.
 */
import type { Header } from '../header';
import { doubtful, quantity, quantityOrNone, type Fact } from './fact';
import { echoPlanarFact } from './encoding';

export const repetitionTimeFact = (header: Header): Fact<number> =>
  quantity(header, 'repetitionTime', { from: 0.5, to: 60_000, unit: 'ms' });
export const echoTimeFact = (header: Header): Fact<number> =>
  quantity(header, ['echoTime', 'effectiveEchoTime'], { from: 0.005, to: 5_000, unit: 'ms' });
export const inversionTimeFact = (header: Header): Fact<number> =>
  quantityOrNone(header, ['inversionTime', 'inversionTimes'], { from: 0.5, to: 20_000, unit: 'ms' });
export const flipAngleFact = (header: Header): Fact<number> => quantityOrNone(header, 'flipAngle', { from: 0.1, to: 360, unit: 'degrees' });
export const averagesFact = (header: Header): Fact<number> => quantity(header, 'averages', { from: 0.1, to: 256, unit: '' });
export const heartRateFact = (header: Header): Fact<number> =>
  quantityOrNone(header, 'heartRate', { from: 10, to: 300, unit: 'per minute' });

/** Echo planar files of some scanners say 1, whatever the train; others say 0 for any sequence. */
export function echoTrainLengthFact(header: Header): Fact<number> {
  const value = header.numbers('echoTrainLength')[0];
  if (value === 0) return doubtful(0, 'A train of 0 echoes cannot be: the header does not tell the echo train length.');
  if (value === 1 && echoPlanarFact(header).value === true) {
    return doubtful(1, 'The sequence is echo planar, so one echo cannot be: the header does not tell the echo train length.');
  }
  return quantity(header, 'echoTrainLength', { from: 1, to: 4096, unit: 'echoes' });
}
