/**
 * Scan facts: what the header says about how an image was acquired, each with where it came from. A fact that a person
 * corrected keeps what stood in the header beside it.
 */
import { z } from 'zod';

/** `header`: as read. `worked-out`: derived from other attributes. `doubtful`: read, but its value is not plausible as it
 *  stands; `note` says why. `member`: typed by a person. `absent`: the header is silent. */
export const factOrigins = ['header', 'worked-out', 'doubtful', 'member', 'absent'] as const;

const fact = <T extends z.ZodType>(value: T) =>
  z.object({
    value: value.nullable(),
    origin: z.enum(factOrigins),
    /** What the header said, where a member replaced it. */
    headerValue: value.nullable().optional(),
    note: z.string().optional(),
  });

export const phaseEncodeSchema = z.enum(['row', 'column']);
/** `column`: phase encoded along the column direction, so ghosts and wrap move up and down; `row`: left and right. */
export type PhaseEncode = z.infer<typeof phaseEncodeSchema>;

const number = z.number();
const text = z.string();

export const scanFactsSchema = z.object({
  phaseEncode: fact(phaseEncodeSchema),
  repetitionTimeMs: fact(number),
  echoTimeMs: fact(number),
  inversionTimeMs: fact(number),
  flipAngleDegrees: fact(number),
  echoTrainLength: fact(number),
  averages: fact(number),
  fieldStrengthTesla: fact(number),
  imagingFrequencyMHz: fact(number),
  bandwidthPerPixelHz: fact(number),
  acquiredReadout: fact(number),
  acquiredPhase: fact(number),
  phaseEncodingSteps: fact(number),
  percentPhaseFieldOfView: fact(number),
  percentSampling: fact(number),
  partialFourier: fact(z.enum(['none', 'phase', 'readout', 'both'])),
  phaseOversampling: fact(z.boolean()),
  accelerationFactor: fact(number),
  echoPlanar: fact(z.boolean()),
  scanningSequence: fact(text),
  sequenceVariant: fact(text),
  scanOptions: fact(text),
  acquisitionType: fact(z.enum(['2D', '3D'])),
  pixelSpacingMm: fact(z.tuple([number, number])),
  sliceThicknessMm: fact(number),
  sliceSpacingMm: fact(number),
  imagePositionMm: fact(z.tuple([number, number, number])),
  imageOrientation: fact(z.array(number).length(6)),
  patientPosition: fact(text),
  heartRatePerMinute: fact(number),
  manufacturer: fact(text),
  model: fact(text),
  softwareVersions: fact(text),
  receiveCoil: fact(text),
  transmitCoil: fact(text),
  bodyPart: fact(text),
  imageType: fact(text),
  seriesNumber: fact(number),
  instanceNumber: fact(number),
  timeOfDay: fact(text),
  /** The device that a case is about: its identity is no patient's. */
  deviceSerial: fact(text).default({ value: null, origin: 'absent' }),
  stationName: fact(text).default({ value: null, origin: 'absent' }),
});
export type ScanFacts = z.infer<typeof scanFactsSchema>;
export type FactName = keyof ScanFacts;

/** Facts that a member may set where the header is silent, doubtful or wrong. */
export const correctableFactsSchema = z
  .object({
    phaseEncode: phaseEncodeSchema,
    repetitionTimeMs: z.number().positive().max(60_000),
    averages: z.number().positive().max(64),
    bandwidthPerPixelHz: z.number().positive().max(20_000),
    echoTimeMs: z.number().positive().max(5_000),
  })
  .partial();
export type CorrectableFacts = z.infer<typeof correctableFactsSchema>;

/** What one frame of an image has for itself. Positions in the patient's millimetres (x to the left, y to the back, z to the head). */
export const frameFactsSchema = z.object({
  positionMm: z.tuple([number, number, number]).nullable(),
  timeOfDay: text.nullable(),
  triggerDelayMs: number.nullable(),
  echoTimeMs: number.nullable(),
  /** What tells this frame from its neighbours, where it is not its place: a coil element, an echo, a repetition. */
  label: text.nullable(),
});
export type FrameFacts = z.infer<typeof frameFactsSchema>;
