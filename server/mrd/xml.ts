/**
 * The elements of the XML header that are asked for, and nothing else: everything beside the allow-list passes by unread. A header of ISMRMRD
 * has no document type, so that one with a document type (and its entities) is refused.
 */
import { broken } from './fault';

/** Texts by path below the root, `encoding/trajectory`, in the order of the document. */
export type Elements = ReadonlyMap<string, readonly string[]>;

const deepest = 16;
const entities: Readonly<Record<string, string>> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'" };
const decoded = (text: string): string => text.trim().replace(/&(amp|lt|gt|quot|apos);/g, (_, name: string) => entities[name] ?? '');

/** `isAsked` says of a path whether its text is kept. Of repeated groups in `firstOnly` the first one counts. */
export function readElements(xml: string, isAsked: (path: string) => boolean, firstOnly: readonly string[] = []): Elements {
  const found = new Map<string, string[]>();
  const opened = new Map<string, number>();
  const names: string[] = [];
  let textFrom = 0;
  for (let at = xml.indexOf('<'); at >= 0; at = xml.indexOf('<', at)) {
    if (xml.startsWith('<!--', at)) {
      at = after(xml, '-->', at);
      continue;
    }
    if (xml.startsWith('<!', at)) throw broken('its header declares a document type');
    const end = after(xml, '>', at);
    const tag = xml.slice(at + 1, end - 1);
    const path = names.slice(1).join('/');
    if (tag.startsWith('/')) {
      const isFirst = firstOnly.every((group) => !path.startsWith(group) || opened.get(group) === 1);
      if (isFirst && isAsked(path)) found.set(path, [...(found.get(path) ?? []), decoded(xml.slice(textFrom, at))]);
      if (names.pop() !== localName(tag.slice(1))) throw broken('the elements of its header do not close');
    } else if (!tag.startsWith('?') && !tag.endsWith('/')) {
      names.push(localName(tag));
      if (names.length > deepest) throw broken('its header is nested too deeply');
      const inside = names.slice(1).join('/');
      if (firstOnly.includes(inside)) opened.set(inside, (opened.get(inside) ?? 0) + 1);
    }
    textFrom = end;
    at = end;
  }
  if (names.length > 0) throw broken('its header ends too early');
  return found;
}

/** Where what begins at `from` is over. */
function after(xml: string, closing: string, from: number): number {
  const at = xml.indexOf(closing, from);
  if (at < 0) throw broken('its header ends too early');
  return at + closing.length;
}

/** The name of an element without prefix and attributes. */
const localName = (tag: string): string => tag.trim().split(/\s/, 1)[0]?.split(':').at(-1) ?? '';
