/** Enhanced files for these tests: frames of 16 × 16 pixels with shared and per-frame functional groups (DICOM PS3.3 C.7.6.16). */
import { functionalGroups, allowList, type AttributeName } from '../../../server/dicom/allow-list';
import type { ElementToWrite, ElementValue } from '../../../server/dicom/elements';
import type { Attributes, ImageToWrite } from '../../../server/dicom/write';
import { readDicom, type AcceptedImage } from '../../../server/dicom/read';
import { key, madeFile, side } from './made-image';

const enhancedMr = '1.2.840.10008.5.1.4.1.1.4.1';
const spelled = (tag: string): string => `${tag.slice(1, 5)},${tag.slice(5)}`;

/** Attributes in the functional groups where the standard wants them. */
export function groupsOf(attributes: Attributes): ElementToWrite[] {
  const byGroup = new Map<string, ElementToWrite[]>();
  for (const [name, value] of Object.entries(attributes) as [AttributeName, ElementValue][]) {
    const { tag, vr, group } = allowList[name] as { tag: string; vr: string; group?: string };
    if (group === undefined) throw new RangeError(`${name} must belong to a functional group`);
    byGroup.set(group, [...(byGroup.get(group) ?? []), { tag: spelled(tag), vr, value }]);
  }
  return [...byGroup].map(([tag, elements]) => ({ tag: spelled(tag), vr: 'SQ', value: [elements] }));
}

export interface Enhanced {
  readonly shared?: Attributes;
  readonly perFrame?: readonly Attributes[];
  readonly attributes?: Attributes;
  readonly extra?: readonly ElementToWrite[];
  /** As many as there are values in `pixels`, where left out. */
  readonly frames?: number;
  readonly pixels?: Uint16Array | Int16Array;
  readonly vrEncoding?: ImageToWrite['vrEncoding'];
}

/** Frame f holds 1 to 256, plus 1000 · f. */
export const rampedFrames = (frames: number): Uint16Array =>
  Uint16Array.from({ length: frames * side * side }, (_, i) => 1 + (i % (side * side)) + 1000 * Math.floor(i / (side * side)));

export function enhancedFile({
  shared,
  perFrame,
  attributes,
  extra = [],
  frames = perFrame?.length ?? 2,
  pixels,
  vrEncoding,
}: Enhanced): Uint8Array {
  const sequences: ElementToWrite[] = [];
  if (shared !== undefined) sequences.push({ tag: '5200,9229', vr: 'SQ', value: [groupsOf(shared)] });
  if (perFrame !== undefined) sequences.push({ tag: '5200,9230', vr: 'SQ', value: perFrame.map(groupsOf) });
  return madeFile({
    pixels: pixels ?? rampedFrames(frames),
    attributes: { sopClass: enhancedMr, numberOfFrames: frames, ...attributes },
    extra: [...sequences, ...extra],
    ...(vrEncoding === undefined ? {} : { vrEncoding }),
  });
}

export function acceptedAll(bytes: Uint8Array): readonly AcceptedImage[] {
  const read = readDicom(bytes, key);
  if ('refused' in read) throw new Error(`refused: ${read.refused.code}, ${read.refused.reason}`);
  return read.accepted;
}

export const groupTag = (name: keyof typeof functionalGroups): string => spelled(functionalGroups[name]);
