/** What a refusal says in one line, and what a technologist can do about it. The reason itself comes from the server. */
import type { RefusalCode } from '@/server/contract/images';

const fromTheConsole = 'send the original image from the console, not a screenshot or a converted copy.';

export const refusalWords: Record<RefusalCode, { title: string; helps: string }> = {
  empty: { title: 'This file is empty.', helps: 'copy it again; the transfer was cut off.' },
  'not-dicom': { title: 'This is not a DICOM file.', helps: fromTheConsole },
  truncated: { title: 'This file ends too early.', helps: 'copy it again; the transfer was cut off.' },
  'too-large': { title: 'This file is too large.', helps: 'send single slices instead of the whole volume.' },
  'transfer-syntax': {
    title: 'This file is packed in a way that is not read here.',
    helps: 'send it uncompressed: explicit VR little endian.',
  },
  'not-mr': { title: 'This is not an MR image.', helps: 'choose an image of the MR series.' },
  'no-pixels': { title: 'There is no picture in this file.', helps: 'choose an image, not a report or a presentation state.' },
  'multi-frame': { title: 'This file holds several frames.', helps: 'send the slices as single images.' },
  mosaic: { title: 'This file is a mosaic of slices.', helps: 'send the slices as single images.' },
  'not-magnitude': { title: 'This is not a magnitude image.', helps: 'choose the magnitude image of the series.' },
  colour: { title: 'This picture is in colour.', helps: 'choose the grey image, not a colour map or a screenshot.' },
  'bit-depth': { title: 'The depth of these pixels is not read here.', helps: fromTheConsole },
  size: { title: 'The size of this picture is not read here.', helps: 'choose an image between 16 and 2048 pixels a side.' },
  'burned-in-text': {
    title: 'This file says that identity is burned into its pixels.',
    helps: 'send the series again from the console without text on the image, or send another slice.',
  },
  'too-slow': { title: 'This file took too long to read.', helps: fromTheConsole },
  unreadable: { title: 'This file cannot be read.', helps: fromTheConsole },
};
