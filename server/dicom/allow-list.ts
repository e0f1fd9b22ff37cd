/**
 * The only attributes of a DICOM file that are ever looked at, besides the pixels. An allow-list and no block-list: whatever is
 * not named here (patient, people, places, dates, UIDs, free text, private groups but a few numbers) cannot be read by the rest of
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
  readonly vr: 'CS' | 'DS' | 'FD' | 'IS' | 'LO' | 'OB' | 'SH' | 'SS' | 'TM' | 'DT' | 'UI' | 'UL' | 'US';
  readonly use: Use;
  /** The sequence that holds it in the functional groups of an enhanced file (PS3.3 C.7.6.16 and C.8.13.5). */
  readonly group?: GroupTag;
}

/** Functional groups that are looked into, by the names of their sequences. */
export const functionalGroups = {
  mrTiming: 'x00189112',
  mrEcho: 'x00189114',
  mrModifier: 'x00189115',
  mrImagingModifier: 'x00189006',
  mrReceiveCoil: 'x00189042',
  mrTransmitCoil: 'x00189049',
  mrDiffusion: 'x00189117',
  cardiacSynchronization: 'x00189118',
  mrAverages: 'x00189119',
  mrGeometry: 'x00189125',
  mrImageFrameType: 'x00189226',
  frameContent: 'x00209111',
  planePosition: 'x00209113',
  planeOrientation: 'x00209116',
  pixelMeasures: 'x00289110',
  pixelValues: 'x00289145',
} as const satisfies Record<string, `x${string}`>;
type GroupTag = (typeof functionalGroups)[keyof typeof functionalGroups];
const groups = functionalGroups;

type Shorthand = (tag: `x${string}`, vr: Attribute['vr'], group?: GroupTag) => Attribute;
const attribute =
  (use: Use): Shorthand =>
  (tag, vr, group) =>
    group === undefined ? { tag, vr, use } : { tag, vr, use, group };
const stored = attribute('stored');
const replaced = attribute('replaced');
const checked = attribute('checked');

export const allowList = {
  // What kind of image it is.
  sopClass: checked('x00080016', 'UI'),
  modality: checked('x00080060', 'CS'),
  conversionType: checked('x00080064', 'CS'),
  complexImageComponent: checked('x00089208', 'CS', groups.mrImageFrameType),
  geParametersCreator: checked('x00430010', 'LO'),
  geImageKind: checked('x0043102f', 'SS'),
  siemensCreator: checked('x00190010', 'LO'),
  siemensTileCount: checked('x0019100a', 'US'),
  siemensSeriesCreator: checked('x00290010', 'LO'),
  siemensImageHeader: checked('x00291010', 'OB'),
  frameType: checked('x00089007', 'CS', groups.mrImageFrameType),
  burnedInAnnotation: checked('x00280301', 'CS'),
  imageType: stored('x00080008', 'CS'),

  // Identifiers, of which only a keyed hash is stored.
  sopInstance: replaced('x00080018', 'UI'),
  studyInstance: replaced('x0020000d', 'UI'),
  seriesInstance: replaced('x0020000e', 'UI'),
  frameOfReference: replaced('x00200052', 'UI'),

  // Time of day.
  frameAcquisitionDateTime: replaced('x00189074', 'DT', groups.frameContent),
  acquisitionDateTime: replaced('x0008002a', 'DT'),
  acquisitionTime: replaced('x00080032', 'TM'),
  contentTime: replaced('x00080033', 'TM'),

  // Equipment.
  manufacturer: stored('x00080070', 'LO'),
  model: stored('x00081090', 'LO'),
  softwareVersions: stored('x00181020', 'LO'),
  receiveCoil: stored('x00181250', 'SH', groups.mrReceiveCoil),
  transmitCoil: stored('x00181251', 'SH', groups.mrTransmitCoil),

  deviceSerial: stored('x00181000', 'LO'),
  stationName: stored('x00081010', 'SH'),

  // Acquisition.
  bodyPart: stored('x00180015', 'CS'),
  scanningSequence: stored('x00180020', 'CS'),
  sequenceVariant: stored('x00180021', 'CS'),
  scanOptions: stored('x00180022', 'CS'),
  acquisitionType: stored('x00180023', 'CS'),
  sliceThickness: stored('x00180050', 'DS', groups.pixelMeasures),
  repetitionTime: stored('x00180080', 'DS', groups.mrTiming),
  echoTime: stored('x00180081', 'DS'),
  inversionTime: stored('x00180082', 'DS'),
  averages: stored('x00180083', 'DS', groups.mrAverages),
  imagingFrequency: stored('x00180084', 'DS'),
  imagedNucleus: checked('x00180085', 'SH'),
  fieldStrength: stored('x00180087', 'DS'),
  sliceSpacing: stored('x00180088', 'DS', groups.pixelMeasures),
  phaseEncodingSteps: stored('x00180089', 'IS'),
  echoTrainLength: stored('x00180091', 'IS', groups.mrTiming),
  percentSampling: stored('x00180093', 'DS', groups.mrGeometry),
  percentPhaseFieldOfView: stored('x00180094', 'DS', groups.mrGeometry),
  pixelBandwidth: stored('x00180095', 'DS', groups.mrImagingModifier),
  effectiveEchoTime: stored('x00189082', 'FD', groups.mrEcho),
  inversionTimes: stored('x00189079', 'FD', groups.mrModifier),
  readoutSteps: stored('x00189058', 'US', groups.mrGeometry),
  phaseEncodingStepsInPlane: stored('x00189231', 'US', groups.mrGeometry),
  transmitterFrequency: stored('x00189098', 'FD', groups.mrImagingModifier),
  resonantNucleus: checked('x00189100', 'CS'),
  echoPulseSequence: checked('x00189008', 'CS'),
  partialFourier: checked('x00189081', 'CS', groups.mrModifier),
  partialFourierDirection: checked('x00189036', 'CS', groups.mrModifier),
  parallelAcquisition: checked('x00189077', 'CS', groups.mrModifier),
  coverageOfKspace: checked('x00189094', 'CS'),
  diffusionWeighting: stored('x00189087', 'FD', groups.mrDiffusion),
  triggerTime: stored('x00181060', 'DS'),
  triggerDelay: stored('x00209153', 'FD', groups.cardiacSynchronization),
  frameTime: stored('x00181063', 'DS'),
  frameTimeVector: stored('x00181065', 'DS'),
  heartRate: stored('x00181088', 'IS'),
  acquisitionMatrix: stored('x00181310', 'US'),
  phaseEncodingDirection: stored('x00181312', 'CS', groups.mrGeometry),
  flipAngle: stored('x00181314', 'DS', groups.mrTiming),
  patientPosition: stored('x00185100', 'CS'),
  echoPlanarPulseSequence: stored('x00189018', 'CS'),
  oversamplingPhase: stored('x00189029', 'CS'),
  parallelReductionFactor: stored('x00189069', 'FD', groups.mrModifier),

  // Place and order.
  seriesNumber: stored('x00200011', 'IS'),
  instanceNumber: stored('x00200013', 'IS'),
  temporalPosition: stored('x00209128', 'UL', groups.frameContent),
  imagePosition: stored('x00200032', 'DS', groups.planePosition),
  imageOrientation: stored('x00200037', 'DS', groups.planeOrientation),
  pixelSpacing: stored('x00280030', 'DS', groups.pixelMeasures),

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
  rescaleType: checked('x00281054', 'LO', groups.pixelValues),
  pixelPaddingValue: checked('x00280120', 'SS'),
  rescaleIntercept: checked('x00281052', 'DS', groups.pixelValues),
  rescaleSlope: checked('x00281053', 'DS', groups.pixelValues),
} as const satisfies Record<string, Attribute>;

export type AttributeName = keyof typeof allowList;

export const pixelDataTag = 'x7fe00010';
