/**
 * Refusals as DICOM says them: C-STORE status (PS3.4 table B.2-1; 0122 of PS3.7 annex C) and, with the same numbers, the failure reason of
 * STOW-RS (PS3.18 table I.2-2). The comment is the code alone: it may hold 64 characters, and nothing of the object.
 */
import type { PushRefusal } from '../contract/push';

export const success = 0x0000;
const outOfResources = 0xa700;
const sopClassNotSupported = 0x0122;
const cannotUnderstand = 0xc000;
/** PS3.7 annex C.5.5: something of ours went wrong. */
export const processingFailure = 0x0110;

const statuses: Partial<Record<PushRefusal, number>> = {
  'too-large': outOfResources,
  'too-slow': outOfResources,
  busy: outOfResources,
  'not-mr': sopClassNotSupported,
};

export const statusOf = (refused: PushRefusal): number => statuses[refused] ?? cannotUnderstand;

export const commentOf = (refused: PushRefusal): string => `refused: ${refused}`;
