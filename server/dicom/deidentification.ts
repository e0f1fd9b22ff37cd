/**
 * What was left behind when a file was read: every tag in it, at every depth, private groups included, that is not stored.
 * Reading is by allow-list, so this is an account for the person who uploads and not the means of removal (DICOM PS3.15
 * annex E asks for such a record). Values are never looked at, let alone repeated.
 */
import type { DataSet, Element } from 'dicom-parser';
import type { Image } from '../contract/images';
import { allowList, pixelDataTag, type Attribute } from './allow-list';
import { deviceNames, screenedDevice } from './facts/device';
import { namesNames, screenedName } from './facts/names';
import { timeSource } from './facts/time-of-day';
import { screenedWords, wordsNames } from './facts/words';
import { groupsOfFile, groupTags, itemOf } from './functional-groups';
import type { Header } from './header';
import { identifierNames } from './unique-identifiers';

export type Deidentification = Image['deidentification'];

/** A file with more different tags than this is listed up to here: the list is read by people. */
export const longestList = 800;

const attributes: readonly Attribute[] = Object.values(allowList);

type Elements = Readonly<DataSet['elements']>;

/** @param dataSet the elements up to the pixel data
 *  @param after those behind it, as far as they could be read; none of them is stored, whatever its tag */
export function deidentificationOf(dataSet: DataSet, after: Elements, header: Header): Deidentification {
  const before: Elements = dataSet.elements;
  const grouped = groupedTags(dataSet);
  const { stored, replaced } = fates(new Set([...Object.keys(before), ...grouped]), header);
  const isUsed = (tag: string): boolean => stored.has(tag) || replaced.has(tag) || groupTags.has(tag);
  const top = Object.keys(before).filter((tag) => !isUsed(tag));
  const inItems = tagsInItems(before).filter((tag) => !groupTags.has(tag) && !(grouped.has(tag) && isUsed(tag)));
  const removed = [...top, ...inItems, ...Object.keys(after), ...tagsInItems(after)];
  return { removed: listed(removed), replaced: listed([...replaced]) };
}

/** Attributes of the allow-list that stand in the functional group where they belong. */
function groupedTags(dataSet: DataSet): ReadonlySet<string> {
  const groups = groupsOfFile(dataSet);
  const isIn = ({ tag, group }: Attribute): boolean =>
    group !== undefined && groups.some((item) => itemOf(item, group, 0)?.elements[tag] !== undefined);
  return new Set(attributes.filter(isIn).map(({ tag }) => tag));
}

/** The tags of this file that are stored as they are, and those of which something else is stored. */
function fates(present: ReadonlySet<string>, header: Header): { stored: ReadonlySet<string>; replaced: ReadonlySet<string> } {
  const stored = new Set<string>(attributes.filter(({ use, tag }) => use === 'stored' && present.has(tag)).map(({ tag }) => tag));
  stored.add(pixelDataTag);
  const replaced = new Set<string>();
  const time = timeSource(header);
  if (time !== undefined) replaced.add(allowList[time].tag);
  for (const name of namesNames) if (screenedName(header, name).withheld) stored.delete(allowList[name].tag);
  for (const name of deviceNames) if (screenedDevice(header, name).withheld) stored.delete(allowList[name].tag);
  for (const name of identifierNames) if (header.text(name) !== undefined) replaced.add(allowList[name].tag);
  for (const name of wordsNames) {
    const { kept, nWithheld } = screenedWords(header, name);
    if (nWithheld === 0) continue;
    stored.delete(allowList[name].tag);
    if (kept.length > 0) replaced.add(allowList[name].tag);
  }
  return { stored, replaced };
}

/** Every tag inside the sequences of a data set, at every depth. */
function tagsInItems(elements: Elements): string[] {
  const tags = new Set<string>();
  const waiting: Element[] = Object.values(elements);
  for (let next = waiting.pop(); next !== undefined; next = waiting.pop()) {
    for (const item of next.items ?? []) {
      for (const inner of Object.values(item.dataSet?.elements ?? {})) {
        tags.add(inner.tag);
        waiting.push(inner);
      }
    }
  }
  return [...tags];
}

/** Item and sequence delimiters are no attributes, nor are the zeros with which some files end. */
const isDelimiter = (tag: string): boolean => tag.startsWith('xfffee') || tag === 'x00000000';

const listed = (tags: readonly string[]): string[] =>
  [...new Set(tags)]
    .filter((tag) => !isDelimiter(tag))
    .map((tag) => `${tag.slice(1, 5)},${tag.slice(5)}`.toUpperCase())
    .sort()
    .slice(0, longestList);
