/**
 * Which presentation contexts are agreed (DICOM PS3.8 section 9.3.3): verification, and storage of whatever is an image or not, for the
 * door says better why an object is not taken than a context that was turned down.
 */
import type { association } from 'dcmjs-dimse';
import { protocol } from './protocol';

const verification = '1.2.840.10008.1.1';
/** The root of the storage SOP classes (PS3.4 annex B.5), and of those that were retired. */
const storageRoot = '1.2.840.10008.5.1.4.1.1.';
/** Verification has no data set; every implementation may propose this one for it. */
const implicitLittleEndian = '1.2.840.10008.1.2';

/** Answers every context that was proposed; `transferSyntaxes` in the order in which they are preferred. Returns the ids agreed. */
export function agreeContexts(requested: association.Association, transferSyntaxes: readonly string[]): Set<number> {
  const { Accept, RejectAbstractSyntaxNotSupported, RejectTransferSyntaxesNotSupported } = protocol.constants.PresentationContextResult;
  const agreed = new Set<number>();
  for (const { id } of requested.getPresentationContexts()) {
    const context = requested.getPresentationContext(id);
    const abstract = context.getAbstractSyntaxUid();
    const isStorage = abstract.startsWith(storageRoot);
    const proposed = context.getTransferSyntaxUids();
    const chosen = (isStorage ? transferSyntaxes : [...transferSyntaxes, implicitLittleEndian]).find((uid) => proposed.includes(uid));
    if (!isStorage && abstract !== verification) context.setResult(RejectAbstractSyntaxNotSupported);
    else if (chosen === undefined) context.setResult(RejectTransferSyntaxesNotSupported);
    else {
      context.setResult(Accept, chosen);
      agreed.add(id);
    }
  }
  return agreed;
}
