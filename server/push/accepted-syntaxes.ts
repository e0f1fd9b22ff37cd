/**
 * Transfer syntaxes that a sender may choose, in the order in which they are preferred: those that need no decoder first, then those that
 * lose nothing, then the lossy ones, which a sender offers alone where it has nothing else. UIDs: DICOM PS3.6 annex A.
 */
import { deflated, explicitBigEndian, explicitLittleEndian, implicitLittleEndian } from '../dicom/transfer-syntax';

const jpegFamily = '1.2.840.10008.1.2.4';
/** JPEG lossless, JPEG-LS, JPEG 2000 and its high-throughput form, each where nothing is lost; run lengths. */
const lossless = ['.70', '.57', '.80', '.90', '.201', '.202'].map((end) => jpegFamily + end).concat('1.2.840.10008.1.2.5');
const lossy = ['.50', '.81', '.91', '.203'].map((end) => jpegFamily + end);

export const acceptedTransferSyntaxes: readonly string[] = [
  ...[explicitLittleEndian, implicitLittleEndian, explicitBigEndian, deflated],
  ...lossless,
  ...lossy,
];
