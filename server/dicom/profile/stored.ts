/**
 * The same care for what the door keeps. Twice: the allow-list itself may name no attribute of table E.1-1 as stored, but the device's
 * identity, the time of day, and identifiers of which a hash is kept; and what was read from a file is looked at once more before it is
 * handed on. It fails closed: an image that does not pass is not kept.
 */
import type { Attribute } from '../allow-list';
import { looksLikeSomebody } from '../facts/names';
import type { AcceptedImage, Read } from '../read';
import { isRefused, refuse } from '../refusal';
import { actionOf } from './actions';
import { ProfileViolation } from './audit';

const tagOf = ({ tag }: Attribute): string => `${tag.slice(1, 5)},${tag.slice(5)}`.toUpperCase();

/** Throws ProfileViolation unless the profile permits what the list says is stored. */
export function auditAllowList(list: Readonly<Record<string, Attribute>>): void {
  for (const attribute of Object.values(list)) {
    const tag = tagOf(attribute);
    const action = parseInt(tag.slice(0, 4), 16) % 2 === 1 ? privateAction(attribute) : actionOf(tag);
    const isPermitted =
      action === undefined ||
      attribute.use === 'checked' ||
      (attribute.use === 'stored' && action === 'K') ||
      (attribute.use === 'replaced' && (action === 'U' || action === 'C-dates'));
    if (!isPermitted) throw new ProfileViolation(tag, 'must not be stored');
  }
}

/** Numbers and words of private groups may become facts of our own, as what is made of them; never as they stand. */
const privateAction = ({ use }: Attribute) => (use === 'stored' ? ('X' as const) : undefined);

/** What was read, or a refusal where something of it must not be kept. */
export function auditedRead(read: Read): Read {
  if (isRefused(read)) return read;
  try {
    read.accepted.forEach(auditStored);
    return read;
  } catch (error) {
    if (!(error instanceof ProfileViolation)) throw error;
    return refuse(
      'unreadable',
      'Something in the header may name a patient where nothing of the kind belongs, so nothing of the file was kept.',
    );
  }
}

/** Throws ProfileViolation where a text that is about to be kept looks like a name, a date, a number of a person, or an identifier. */
export function auditStored({ facts, frameFacts, warnings, identifiers }: AcceptedImage): void {
  for (const text of textsIn([Object.values(facts).map(({ value }) => value), frameFacts])) {
    if (looksLikeSomebody(text)) throw new ProfileViolation('0000,0000', 'a fact looks like a name, a date or a number of a person');
  }
  for (const { text } of warnings) {
    if (identifierPattern.test(text)) throw new ProfileViolation('0000,0000', 'a warning repeats an identifier');
  }
  for (const uid of textsIn(identifiers)) {
    if (!/^2\.25\.(0|[1-9]\d{0,38})$/.test(uid)) throw new ProfileViolation('0000,0000', 'an identifier was not replaced');
  }
}

/** Four numbers with points between them, and more: no version of software, no measure. */
const identifierPattern = /\d+(\.\d+){5,}/;

function textsIn(value: unknown): string[] {
  if (typeof value === 'string') return [value];
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(textsIn) : [];
}
