/**
 * What a model may know of how an image was acquired. SI units throughout; what the header did not say is undefined, and a
 * model that needs it says what it assumed.
 */

/** `column`: phase encoded along the column direction (the row index varies): ghosts and wrap move up and down. */
export type PhaseEncode = 'row' | 'column';

export interface Acquisition {
  readonly phaseEncode: PhaseEncode;
  /** Seconds. */
  readonly repetitionTime?: number;
  /** Seconds. */
  readonly echoTime?: number;
  /** Radians. */
  readonly flipAngle?: number;
  readonly echoTrainLength?: number;
  readonly averages?: number;
  /** Hertz. */
  readonly imagingFrequency?: number;
  /** Tesla. */
  readonly fieldStrength?: number;
  /** Hertz per pixel along the readout. */
  readonly bandwidthPerPixel?: number;
  /** Lines acquired along the phase encoding before any zero-filling. */
  readonly acquiredPhase?: number;
  readonly acquiredReadout?: number;
  /** 0 to 1. */
  readonly phaseFieldOfViewFraction?: number;
  readonly partialFourierFraction?: number;
  readonly accelerationFactor?: number;
  readonly echoPlanar?: boolean;
  readonly acquisitionType?: '2D' | '3D';
  /** Metres. */
  readonly sliceThickness?: number;
  /** Unit vector of the main field along growing row index, growing column index and the slice normal; its sign does not matter. */
  readonly fieldDirection?: readonly [row: number, column: number, normal: number];
}

/** The axis along which lines are counted: 0 where the row index varies (`column`), 1 where the column index does. */
export const phaseEncodeAxis = (phaseEncode: PhaseEncode): 0 | 1 => (phaseEncode === 'column' ? 0 : 1);
