/** What a derived object is told about itself. All of it is the product's own, or a fact that came through the door. */
import type { PhaseEncode, ScanFacts } from '../../contract/facts';

export interface Derivation {
  /** The description in words: causes, parameters, reconstruction. */
  readonly description: string;
  /** Stands in the place of the patient: the number of the case, where there is one. */
  readonly caseNumber: number | null;
  readonly instanceNumber: number;
  /** Made for this object; none of them is of the exam. */
  readonly uids: { readonly study: string; readonly series: string; readonly image: string; readonly frameOfReference: string };
  readonly facts: ScanFacts;
  /** Of the first pixel of the source frame, millimetres in the patient; null where the header is silent. */
  readonly sourcePositionMm: readonly [number, number, number] | null;
  readonly sourceRows: number;
  readonly sourceColumns: number;
  readonly phaseEncode: PhaseEncode;
  /** Values drawn black and white. */
  readonly window: readonly [number, number];
  readonly productVersion: string;
}

/** The picture itself, in millimetres. */
export interface DerivedPicture {
  readonly width: number;
  readonly height: number;
  /** [row, column]; value = slope · level. */
  readonly levels: Uint16Array;
  readonly slope: number;
  /** Row, column. */
  readonly spacingMm: readonly [number, number];
  /** Of the first pixel, from the centre sample of the source frame. */
  readonly originMm: readonly [number, number];
}
