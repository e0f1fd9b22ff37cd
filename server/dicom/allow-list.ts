/**
 * The only attributes of a DICOM file that are ever looked at, besides the pixels. An allow-list and no block-list: whatever is
 * not named here (patient, people, places, dates, UIDs, free text, private groups but one number) cannot be read by the rest of
 * this folder.
 * Tags, names and VRs: DICOM PS3.6. None of those marked `stored` is in the list of identifying attributes, PS3.15 table E.1-1,
 * but the times, of which only the time of day is kept, and the coil and software texts are screened besides.
 */

/** `stored`: becomes a fact of the scan. `replaced`: only something less telling that was made of it is stored.
 *  `checked`: decides whether and how the file is read, and is not stored as such. */
export type Use = 'stored' | 'replaced' | 'checked';

export interface Attribute {
  /** As the parser spells it: x, group, element. */
  readonly tag: `x${string}`;
  /** The VR that the standard gives; it decodes values where the file does not say. */
  readonly vr: 'CS' | 'DS' | 'FD' | 'IS' | 'LO' | 'SH' | 'SS' | 'TM' | 'DT' | 'UI' | 'US';
  readonly use: Use;
}

const stored = (tag: `x${string}`, vr: Attribute['vr']): Attribute => ({ tag, vr, use: 'stored' });
const replaced = (tag: `x${string}`, vr: Attribute['vr']): Attribute => ({ tag, vr, use: 'replaced' });
const checked = (tag: `x${string}`, vr: Attribute['vr']): Attribute => ({ tag, vr, use: 'checked' });

export const allowList = {
  // What kind of image it is.
  sopClass: checked('x00080016', 'UI'),
  modality: checked('x00080060', 'CS'),
  conversionType: checked('x00080064', 'CS'),
  complexImageComponent: checked('x00089208', 'CS'),
  geParametersCreator: checked('x00430010', 'LO'),
  geImageKind: checked('x0043102f', 'SS'),
  burnedInAnnotation: checked('x00280301', 'CS'),
  imageType: stored('x00080008', 'CS'),

  // Identifiers, of which only a keyed hash is stored.
  sopInstance: replaced('x00080018', 'UI'),
  studyInstance: replaced('x0020000d', 'UI'),
  seriesInstance: replaced('x0020000e', 'UI'),
  frameOfReference: replaced('x00200052', 'UI'),

  // Time of day.
  acquisitionDateTime: replaced('x0008002a', 'DT'),
  acquisitionTime: replaced('x00080032', 'TM'),
  contentTime: replaced('x00080033', 'TM'),

  // Equipment.
  manufacturer: stored('x00080070', 'LO'),
  model: stored('x00081090', 'LO'),
  softwareVersions: stored('x00181020', 'LO'),
  receiveCoil: stored('x00181250', 'SH'),
  transmitCoil: stored('x00181251', 'SH'),

  deviceSerial: stored('x00181000', 'LO'),
  stationName: stored('x00081010', 'SH'),

  // Acquisition.
  bodyPart: stored('x00180015', 'CS'),
  scanningSequence: stored('x00180020', 'CS'),
  sequenceVariant: stored('x00180021', 'CS'),
  scanOptions: stored('x00180022', 'CS'),
  acquisitionType: stored('x00180023', 'CS'),
  sliceThickness: stored('x00180050', 'DS'),
  repetitionTime: stored('x00180080', 'DS'),
  echoTime: stored('x00180081', 'DS'),
  inversionTime: stored('x00180082', 'DS'),
  averages: stored('x00180083', 'DS'),
  imagingFrequency: stored('x00180084', 'DS'),
  imagedNucleus: checked('x00180085', 'SH'),
  fieldStrength: stored('x00180087', 'DS'),
  sliceSpacing: stored('x00180088', 'DS'),
  phaseEncodingSteps: stored('x00180089', 'IS'),
  echoTrainLength: stored('x00180091', 'IS'),
  percentSampling: stored('x00180093', 'DS'),
  percentPhaseFieldOfView: stored('x00180094', 'DS'),
  pixelBandwidth: stored('x00180095', 'DS'),
  heartRate: stored('x00181088', 'IS'),
  acquisitionMatrix: stored('x00181310', 'US'),
  phaseEncodingDirection: stored('x00181312', 'CS'),
  flipAngle: stored('x00181314', 'DS'),
  patientPosition: stored('x00185100', 'CS'),
  echoPlanarPulseSequence: stored('x00189018', 'CS'),
  oversamplingPhase: stored('x00189029', 'CS'),
  parallelReductionFactor: stored('x00189069', 'FD'),

  // Place and order.
  seriesNumber: stored('x00200011', 'IS'),
  instanceNumber: stored('x00200013', 'IS'),
  imagePosition: stored('x00200032', 'DS'),
  imageOrientation: stored('x00200037', 'DS'),
  pixelSpacing: stored('x00280030', 'DS'),

  // How the pixels are written.
  samplesPerPixel: checked('x00280002', 'US'),
  photometricInterpretation: checked('x00280004', 'CS'),
  numberOfFrames: checked('x00280008', 'IS'),
  rows: stored('x00280010', 'US'),
  columns: stored('x00280011', 'US'),
  bitsAllocated: checked('x00280100', 'US'),
  bitsStored: checked('x00280101', 'US'),
  highBit: checked('x00280102', 'US'),
  pixelRepresentation: checked('x00280103', 'US'),
  pixelPaddingValue: checked('x00280120', 'SS'),
  rescaleIntercept: checked('x00281052', 'DS'),
  rescaleSlope: checked('x00281053', 'DS'),
} as const satisfies Record<string, Attribute>;

export type AttributeName = keyof typeof allowList;

export const pixelDataTag = 'x7fe00010';
