/** What these tests use of daikon, an independent DICOM reader that ships no types. */
declare module 'daikon' {
  export interface Image {
    getRows(): number;
    getCols(): number;
    /** Rescaled values. */
    getInterpretedData(asArray: false, asObject: false, frame?: number): Float32Array;
    getTag(group: number, element: number): { value: readonly unknown[] | null } | undefined;
  }
  export const Series: { parseImage(data: DataView): Image | null };
}
