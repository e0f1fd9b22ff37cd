/** The facts of a scan, each from the header or worked out or doubtful. Every rule stands in a file of `facts/`. */
import type { ScanFacts } from '../contract/facts';
import { bandwidthFact } from './facts/bandwidth';
import { deviceFact } from './facts/device';
import * as encoding from './facts/encoding';
import { quantity } from './facts/fact';
import { fieldStrengthFact, imagingFrequencyFact } from './facts/field';
import * as geometry from './facts/geometry';
import { nameFact } from './facts/names';
import { acquiredFacts, phaseEncodeFact } from './facts/phase-encode';
import { timeOfDayFact } from './facts/time-of-day';
import * as timing from './facts/timing';
import { wordsFact } from './facts/words';
import type { Header } from './header';

/** Numbers of series and images are small; a longer one may be somebody's own number. */
const orderNumber = { from: 0, to: 99_999, unit: '' };

export function factsOf(header: Header): ScanFacts {
  return {
    phaseEncode: phaseEncodeFact(header),
    repetitionTimeMs: timing.repetitionTimeFact(header),
    echoTimeMs: timing.echoTimeFact(header),
    inversionTimeMs: timing.inversionTimeFact(header),
    flipAngleDegrees: timing.flipAngleFact(header),
    echoTrainLength: timing.echoTrainLengthFact(header),
    averages: timing.averagesFact(header),
    fieldStrengthTesla: fieldStrengthFact(header),
    imagingFrequencyMHz: imagingFrequencyFact(header),
    bandwidthPerPixelHz: bandwidthFact(header),
    ...acquiredFacts(header),
    phaseEncodingSteps: encoding.phaseEncodingStepsFact(header),
    percentPhaseFieldOfView: encoding.percentPhaseFieldOfViewFact(header),
    percentSampling: encoding.percentSamplingFact(header),
    partialFourier: encoding.partialFourierFact(header),
    phaseOversampling: encoding.phaseOversamplingFact(header),
    accelerationFactor: encoding.accelerationFactorFact(header),
    echoPlanar: encoding.echoPlanarFact(header),
    scanningSequence: encoding.scanningSequenceFact(header),
    sequenceVariant: wordsFact(header, 'sequenceVariant'),
    scanOptions: wordsFact(header, 'scanOptions'),
    acquisitionType: encoding.acquisitionTypeFact(header),
    pixelSpacingMm: geometry.pixelSpacingFact(header),
    sliceThicknessMm: geometry.sliceThicknessFact(header),
    sliceSpacingMm: geometry.sliceSpacingFact(header),
    imagePositionMm: geometry.imagePositionFact(header),
    imageOrientation: geometry.imageOrientationFact(header),
    patientPosition: wordsFact(header, 'patientPosition'),
    heartRatePerMinute: timing.heartRateFact(header),
    manufacturer: nameFact(header, 'manufacturer'),
    model: nameFact(header, 'model'),
    softwareVersions: nameFact(header, 'softwareVersions'),
    receiveCoil: nameFact(header, 'receiveCoil'),
    transmitCoil: nameFact(header, 'transmitCoil'),
    bodyPart: wordsFact(header, 'bodyPart'),
    imageType: wordsFact(header, 'imageType'),
    seriesNumber: quantity(header, 'seriesNumber', orderNumber),
    instanceNumber: quantity(header, 'instanceNumber', orderNumber),
    timeOfDay: timeOfDayFact(header),
    deviceSerial: deviceFact(header, 'deviceSerial'),
    stationName: deviceFact(header, 'stationName'),
  };
}
