/**
 * Transfer syntaxes that a sender may choose, in the order in which they are preferred: those that the door reads, and first those that
 * need no decoder.
 */
import { explicitLittleEndian, implicitLittleEndian } from '../dicom/transfer-syntax';

export const acceptedTransferSyntaxes: readonly string[] = [explicitLittleEndian, implicitLittleEndian];
