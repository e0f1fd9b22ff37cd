/** Scan facts to the SI values that the models work on. */
import { acquisitionOf } from '../../../server/dicom/acquisition';
import { readMade } from './made-image';

const facts = readMade({
  phaseEncodingDirection: 'COL',
  acquisitionMatrix: [256, 0, 0, 192],
  repetitionTime: 2300,
  echoTime: 22,
  flipAngle: 90,
  echoTrainLength: 8,
  averages: 2,
  imagingFrequency: 63.86,
  fieldStrength: 15000,
  pixelBandwidth: 130,
  percentPhaseFieldOfView: 75,
  parallelReductionFactor: 2,
  scanningSequence: 'SE',
  acquisitionType: '2D',
  sliceThickness: 5,
}).facts;

test('milliseconds, degrees, megahertz, millimetres and per cent become SI', () => {
  const { imagingFrequency, ...others } = acquisitionOf(facts);
  expect(others).toEqual({
    phaseEncode: 'column',
    repetitionTime: 2.3,
    echoTime: 0.022,
    flipAngle: Math.PI / 2,
    echoTrainLength: 8,
    averages: 2,
    fieldStrength: 1.5,
    bandwidthPerPixel: 130,
    acquiredPhase: 192,
    acquiredReadout: 256,
    phaseFieldOfViewFraction: 0.75,
    accelerationFactor: 2,
    echoPlanar: false,
    acquisitionType: '2D',
    sliceThickness: 0.005,
  });
  // One rounding of a double.
  expect(imagingFrequency).toBeCloseTo(63.86e6, 6);
});

test('what is absent or doubtful is left out', () => {
  const silent = readMade({ pixelBandwidth: 31.25, manufacturer: 'GE MEDICAL SYSTEMS', phaseEncodingDirection: 'ROW' }).facts;
  expect(acquisitionOf(silent)).toEqual({ phaseEncode: 'row' });
});

test('what a member set counts', () => {
  expect(acquisitionOf({ ...facts, bandwidthPerPixelHz: { value: 244.14, origin: 'member', headerValue: 31.25 } }).bandwidthPerPixel).toBe(
    244.14,
  );
});

test('without a phase encoding axis there is none to simulate along', () => {
  const { phaseEncode, repetitionTime } = acquisitionOf({ ...facts, phaseEncode: { value: null, origin: 'doubtful' } });
  expect(phaseEncode).toBeUndefined();
  expect(repetitionTime).toBe(2.3);
});

test('orientation and patient position say which way the main field points in the picture', () => {
  // Coronal, head first supine: rows run along x, columns towards the feet, so that B0 (the z of the patient) lies up the columns.
  const coronal = { imageOrientation: [1, 0, 0, 0, 0, -1], patientPosition: 'HFS', phaseEncodingDirection: 'ROW' };
  expect(acquisitionOf(readMade(coronal).facts).fieldDirection).toEqual([-1, 0, 0]);
  expect(acquisitionOf(readMade({ ...coronal, patientPosition: 'HFDL' }).facts).fieldDirection).toBeUndefined();
});
