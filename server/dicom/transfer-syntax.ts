/**
 * Transfer syntaxes by UID, in the words of a technologist. Source: DICOM PS3.5 sections 8 and 10 and annex A; PS3.6 annex A.
 */

export const implicitLittleEndian = '1.2.840.10008.1.2';
export const explicitLittleEndian = '1.2.840.10008.1.2.1';
export const explicitBigEndian = '1.2.840.10008.1.2.2';

/** The whole data set is deflated: even the header is not readable as it stands. */
export const deflated = '1.2.840.10008.1.2.1.99';
/** Deflated, and without pixels. */
export const deflatedReference = '1.2.840.10008.1.2.4.95';

/** Those whose pixels stand as they are, once a deflated file is inflated. */
export const uncompressed: ReadonlySet<string> = new Set([implicitLittleEndian, explicitLittleEndian, explicitBigEndian]);

/** Whether the pixels of this transfer syntax come in items, one or more a frame. */
export const encapsulated = (transferSyntax: string): boolean =>
  transferSyntax.startsWith('1.2.840.10008.1.2.4.') || transferSyntax === '1.2.840.10008.1.2.5';

const written: Readonly<Record<string, string>> = {
  '1.2.840.10008.1.2.4.50': 'compressed as lossy 8-bit JPEG',
  '1.2.840.10008.1.2.4.51': 'compressed as lossy 12-bit JPEG',
  '1.2.840.10008.1.2.4.57': 'compressed as lossless JPEG',
  '1.2.840.10008.1.2.4.70': 'compressed as lossless JPEG',
  '1.2.840.10008.1.2.4.80': 'compressed as lossless JPEG-LS',
  '1.2.840.10008.1.2.4.81': 'compressed as near-lossless JPEG-LS',
  '1.2.840.10008.1.2.4.90': 'compressed as lossless JPEG 2000',
  '1.2.840.10008.1.2.4.91': 'compressed as JPEG 2000',
  '1.2.840.10008.1.2.4.92': 'compressed as lossless multi-component JPEG 2000',
  '1.2.840.10008.1.2.4.93': 'compressed as multi-component JPEG 2000',
  '1.2.840.10008.1.2.4.201': 'compressed as lossless high-throughput JPEG 2000',
  '1.2.840.10008.1.2.4.202': 'compressed as lossless high-throughput JPEG 2000',
  '1.2.840.10008.1.2.4.203': 'compressed as high-throughput JPEG 2000',
  '1.2.840.10008.1.2.5': 'compressed by run lengths (RLE)',
};

const families: readonly (readonly [prefix: string, words: string])[] = [
  ['1.2.840.10008.1.2.4.94', 'a reference to pixels kept elsewhere (JPIP)'],
  ['1.2.840.10008.1.2.4.95', 'a reference to pixels kept elsewhere (JPIP)'],
  ['1.2.840.10008.1.2.4.10', 'compressed as video'],
  ['1.2.840.10008.1.2.4.', 'compressed by a method of the JPEG family'],
];

/** The reason why pixels in this transfer syntax are not read. The UID itself is not repeated: a file may put anything there. */
export function whyNotRead(transferSyntax: string): string {
  const words = written[transferSyntax] ?? families.find(([prefix]) => transferSyntax.startsWith(prefix))?.[1];
  return `${words ?? 'written in an unknown transfer syntax'}: not read yet; export it uncompressed (explicit little endian)`;
}
