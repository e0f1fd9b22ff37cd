/** What a refusal says in one line. Why, and what helps, comes from the server with each file. */
import type { RefusalCode } from '@/server/contract/images';

export const refusalTitles: Record<RefusalCode, string> = {
  empty: 'This file is empty.',
  'not-dicom': 'This is not a DICOM file.',
  truncated: 'This file ends too early.',
  'too-large': 'This file is too large.',
  'transfer-syntax': 'This file is packed in a way that is not read here.',
  'not-mr': 'This is not an MR image.',
  'no-pixels': 'There is no picture in this file.',
  'multi-frame': 'The frames of this file are no images of one scan.',
  mosaic: 'This mosaic cannot be cut into its slices.',
  'not-magnitude': 'This file does not say which of its images are magnitudes.',
  colour: 'This picture is in colour.',
  'bit-depth': 'The depth of these pixels is not read here.',
  size: 'A picture of this size is not read here.',
  'burned-in-text': 'This file says that identity is burned into its pixels.',
  'too-slow': 'This file took too long to read.',
  unreadable: 'This file cannot be read.',
  encrypted: 'This file is encrypted.',
  archive: 'This archive, or a file in it, is not opened.',
  'not-cartesian': 'These raw data are not on a Cartesian grid.',
  'raw-kind': 'Raw data of this kind are not read here.',
};
