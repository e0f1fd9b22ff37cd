/**
 * Functional groups of an enhanced file: what belongs to one frame, and what all frames share. Sequences may be missing, empty, shorter than
 * there are frames, or no sequences at all: then there is no such place, and the attribute is looked for elsewhere.
 * Source: DICOM PS3.3 C.7.6.16 (Multi-frame Functional Groups).
 */
import type { DataSet } from 'dicom-parser';
import { functionalGroups } from './allow-list';

const shared = 'x52009229';
const perFrame = 'x52009230';

/** Tags of sequences that are looked into: nothing is stored of them but what the allow-list names. */
export const groupTags: ReadonlySet<string> = new Set([shared, perFrame, ...Object.values(functionalGroups)]);

export const itemOf = (dataSet: DataSet, tag: string, index: number): DataSet | undefined => dataSet.elements[tag]?.items?.[index]?.dataSet;

/** Where the functional groups of a frame stand, in the order in which they count. */
export const groupsOfFrame = (dataSet: DataSet, frame: number): readonly DataSet[] =>
  [itemOf(dataSet, perFrame, frame), itemOf(dataSet, shared, 0)].filter((item) => item !== undefined);

/** Every set of functional groups in a file. */
export const groupsOfFile = (dataSet: DataSet): readonly DataSet[] =>
  [shared, perFrame]
    .flatMap((tag) => dataSet.elements[tag]?.items ?? [])
    .flatMap(({ dataSet: item }) => (item === undefined ? [] : [item]));
