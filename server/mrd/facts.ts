/** Scan facts of raw data: of the XML header's numbers, of the readouts, and of where the lines lie. */
import { scanFactsSchema, type ScanFacts } from '../contract/facts';
import { absent, fromHeader, workedOut, type Fact, type Plausible } from '../dicom/facts/fact';
import type { Vector } from './acquisitions';
import type { MrdHeader } from './header';
import type { Kspace, KspaceFrame } from './kspace';

const quantity = (value: number | undefined, { from, to }: Omit<Plausible, 'unit'>): Fact<number> =>
  value !== undefined && value >= from && value <= to ? fromHeader(value) : absent();

const silent = (): Record<string, Fact<never>> =>
  Object.fromEntries(Object.keys(scanFactsSchema.shape).map((name) => [name, absent<never>()]));

export function factsOf(header: MrdHeader, kspace: Kspace): ScanFacts {
  const { rows, columns, frames } = kspace;
  const [first] = frames;
  const [readoutMm, phaseMm, sliceMm] = header.encoded.fieldOfViewMm;
  const plane = first && planeOf(header, first);
  const isOnePlane = frames.every(({ directions }) => directions.every((one, i) => isSameDirection(one, first?.directions[i])));
  const known: Partial<ScanFacts> = {
    phaseEncode: workedOut('column', 'Lines of the raw data are the rows of the picture.'),
    repetitionTimeMs: quantity(header.repetitionTimesMs[0], { from: 0.1, to: 60_000 }),
    echoTimeMs: quantity(header.echoTimesMs[0], { from: 0.01, to: 5_000 }),
    inversionTimeMs: quantity(header.inversionTimesMs[0], { from: 0.1, to: 20_000 }),
    flipAngleDegrees: quantity(header.flipAnglesDegrees[0], { from: 0.1, to: 360 }),
    averages: workedOut(Math.max(1, ...(first?.acquired ?? [])), 'How often the same line was acquired.'),
    fieldStrengthTesla: quantity(header.fieldStrengthTesla, { from: 0.01, to: 50 }),
    imagingFrequencyMHz: quantity(header.imagingFrequencyMHz, { from: 0.05, to: 1000 }),
    bandwidthPerPixelHz: bandwidthFact(kspace),
    acquiredReadout: workedOut(kspace.sampledColumns[1] - kspace.sampledColumns[0], 'Samples of a readout.'),
    acquiredPhase: workedOut(rows, 'Lines of the encoded space.'),
    phaseEncodingSteps: workedOut(linesOf(first), 'Lines that were acquired.'),
    partialFourier: partialFourierFact(kspace),
    accelerationFactor: quantity(header.accelerationFactor, { from: 1, to: 64 }),
    acquisitionType: fromHeader('2D'),
    pixelSpacingMm: workedOut([phaseMm / rows, readoutMm / columns], 'Field of view over matrix of the encoded space.'),
    sliceThicknessMm: quantity(sliceMm, { from: 0.01, to: 500 }),
    imagePositionMm:
      plane && isOnePlane ? workedOut([...plane.corner] as [number, number, number], 'Of the centre of the slice.') : absent(),
    imageOrientation: plane && isOnePlane ? fromHeader([...plane.cosines]) : absent(),
    manufacturer: header.manufacturer === undefined ? absent() : fromHeader(header.manufacturer),
    model: header.model === undefined ? absent() : fromHeader(header.model),
  };
  return scanFactsSchema.parse({ ...silent(), ...known });
}

export const linesOf = (frame: KspaceFrame | undefined): number => [...(frame?.acquired ?? [])].filter((times) => times > 0).length;

/** One pixel is 1/(number of samples · dwell time) wide, of the whole encoded field of view. */
function bandwidthFact({ columns, dwellTimeUs }: Kspace): Fact<number> {
  const bandwidth = 1e6 / (columns * dwellTimeUs);
  if (!(bandwidth >= 1 && bandwidth <= 20_000)) return absent();
  return workedOut(Number(bandwidth.toPrecision(6)), 'Of the dwell time and the samples of a readout.');
}

/** More than this many lines or samples missing at one side, and not at the other, is asymmetry and no rounding (common practice). */
const leastAsymmetry = 3;

function partialFourierFact({ frames, columns, sampledColumns: [from, to] }: Kspace): Fact<'none' | 'phase' | 'readout' | 'both'> {
  const acquired = frames[0]?.acquired ?? new Uint16Array(0);
  const firstLine = acquired.findIndex((times) => times > 0);
  const lastLine = acquired.findLastIndex((times) => times > 0);
  const isOneSided = (before: number, behind: number): boolean => Math.abs(before - behind) > leastAsymmetry;
  // Undersampling moves the ends by less than its own step.
  const step = Math.max(1, Math.round(acquired.length / Math.max(1, linesOf(frames[0]))));
  const phase = isOneSided(firstLine, acquired.length - 1 - lastLine) && Math.abs(firstLine - (acquired.length - 1 - lastLine)) > step;
  const readout = isOneSided(from, columns - to);
  const value = phase ? (readout ? 'both' : 'phase') : readout ? 'readout' : 'none';
  return workedOut(value, 'Of where samples are missing.');
}

const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
/** Direction cosines are written with six digits or so (common practice). */
const cosineTolerance = 1e-3;
const isUnit = (vector: Vector): boolean => Math.abs(dot(vector, vector) - 1) < cosineTolerance;
const isSameDirection = (a: Vector, b: Vector | undefined): boolean =>
  b !== undefined && (Math.abs(dot(a, b) - 1) < cosineTolerance || (!isUnit(a) && !isUnit(b)));

/** Orientation and first pixel of a plane whose centre the acquisitions give; undefined where their directions are none. */
export function planeOf({ encoded }: MrdHeader, { position, directions: [readout, phase] }: KspaceFrame) {
  if (!isUnit(readout) || !isUnit(phase) || Math.abs(dot(readout, phase)) > cosineTolerance || !position.every(Number.isFinite))
    return undefined;
  const [columns, rows] = encoded.matrix;
  const [readoutMm, phaseMm] = encoded.fieldOfViewMm;
  const across = (Math.floor(columns / 2) * readoutMm) / columns;
  const down = (Math.floor(rows / 2) * phaseMm) / rows;
  const corner = ([0, 1, 2] as const).map((i) => position[i] - across * readout[i] - down * phase[i]);
  return { corner: corner as unknown as Vector, cosines: [...readout, ...phase] };
}
