/**
 * Who a sender is: its AE title names the scanner, and its address must be one of that scanner's. Neither is proof of anything, for an AE
 * title can be typed and an address be taken; both together keep out whoever is not meant, which is what they are for.
 */
import { BlockList, isIPv4, isIPv6 } from 'node:net';
import type { Database } from '../../db/client';
import { listSenders } from '../../db/queries/push';
import type { Stranger } from './node/messages';
import type { SendingScanner } from './tokens';

interface Knock {
  readonly calling: string;
  readonly called: string;
  readonly address: string;
}

/** The scanner, or why nobody is let in; then `scanner` is the one that it was meant to be, if that can be told. */
export interface Recognised {
  readonly scanner: SendingScanner | undefined;
  readonly refused: Stranger | null;
}

export async function recognise(db: Database, ownTitle: string, { calling, called, address }: Knock): Promise<Recognised> {
  const senders = await listSenders(db);
  const byTitle = senders.find(({ aeTitle }) => aeTitle === calling.trim());
  const scanner = byTitle ?? senders.find(({ addresses }) => isAmong(addresses, address));
  if (called.trim() !== ownTitle) return { scanner, refused: 'called-title' };
  if (byTitle === undefined) return { scanner, refused: 'calling-title' };
  return { scanner, refused: isAmong(byTitle.addresses, address) ? null : 'address' };
}

const familyOf = (address: string): 'ipv4' | 'ipv6' => (isIPv6(address) ? 'ipv6' : 'ipv4');

/** A socket that hears both families gives an IPv4 address in the form ::ffff:10.1.2.3 (RFC 4291 section 2.5.5.2). */
const plain = (address: string): string => {
  const mapped = address.replace(/^::ffff:/i, '');
  return isIPv4(mapped) ? mapped : address;
};

/** Whether an address is one of a list of addresses and subnets. */
export function isAmong(allowed: readonly string[], address: string): boolean {
  const list = new BlockList();
  for (const entry of allowed) {
    const [network = '', bits] = entry.split('/');
    if (bits === undefined) list.addAddress(network, familyOf(network));
    else list.addSubnet(network, Number(bits), familyOf(network));
  }
  const candidate = plain(address);
  return list.check(candidate, familyOf(candidate));
}
