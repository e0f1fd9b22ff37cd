/** Deflated data sets, inflated up to a limit: a bomb of a few kilobytes ends there. Source: DICOM PS3.5 annex A.5, RFC 1951. */
import { inflateRawSync } from 'node:zlib';
import { cut, refuse, type Refused } from './refusal';

/** As much as a file may have that is not deflated (the default of UPLOAD_FILE_MIB). */
const longestDataSet = 64 * 1024 * 1024;

export function inflated(deflated: Uint8Array): Uint8Array | Refused {
  try {
    return new Uint8Array(inflateRawSync(deflated, { maxOutputLength: longestDataSet }));
  } catch (error) {
    const code = typeof error === 'object' && error !== null && 'code' in error ? error.code : undefined;
    if (code === 'Z_BUF_ERROR') return cut;
    if (code === 'ERR_BUFFER_TOO_LARGE') {
      return refuse('too-large', `Inflated, the file is larger than ${longestDataSet >> 20} MB, the most that one file may have.`);
    }
    return refuse('unreadable', 'The file says that it is deflated, but cannot be inflated: it is damaged. Export it again.');
  }
}
