/** Why raw data are not taken, thrown from wherever it is seen; `readMrd` hands it on as a refusal. */
import type { RefusalCode } from '../contract/images';
import { refuse, type Refused } from '../dicom/refusal';

export class MrdFault extends Error {
  override readonly name = 'MrdFault';
  readonly refusal: Refused;

  constructor(code: RefusalCode, reason: string) {
    super(reason);
    this.refusal = refuse(code, reason);
  }
}

export const broken = (what: string) => new MrdFault('unreadable', `The raw data file is damaged or cut: ${what}. Export it again.`);
