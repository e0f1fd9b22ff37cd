/**
 * A C-STORE sender that sends whatever bytes it is given as a data set: real ones read a file before they send it, and so refuse to send
 * damaged ones. Units and messages: DICOM PS3.8 section 9.3, PS3.7 section 9.3.1 and annex E.
 */
import { connect, type Socket } from 'node:net';
import { once } from 'node:events';
import { joined } from '../../server/dicom/elements';

const mrImageStorage = '1.2.840.10008.5.1.4.1.1.4';
const applicationContext = '1.2.840.10008.3.1.1.1';
const longestUnit = 64 * 1024;
/** The status of a C-STORE; or that its transfer syntax was not agreed (PS3.8 table 9-18), or the association ended in its place. */
export type StoreAnswer = number | 'not-agreed' | 'aborted';

const ascii = (text: string): Uint8Array => new TextEncoder().encode(text);
function big(bytes: 2 | 4, value: number): Uint8Array {
  const view = new DataView(new ArrayBuffer(bytes));
  if (bytes === 2) view.setUint16(0, value);
  else view.setUint32(0, value);
  return new Uint8Array(view.buffer);
}
const little = (bytes: 2 | 4, value: number): Uint8Array => big(bytes, value).reverse();

const unit = (type: number, body: Uint8Array): Uint8Array => joined([Uint8Array.of(type, 0), big(4, body.length), body]);
const part = (type: number, body: Uint8Array): Uint8Array => joined([Uint8Array.of(type, 0), big(2, body.length), body]);

function associateRequest(calling: string, called: string, transferSyntax: string): Uint8Array {
  const context = [Uint8Array.of(1, 0, 0, 0), part(0x30, ascii(mrImageStorage)), part(0x40, ascii(transferSyntax))];
  return unit(
    1,
    joined([
      ...[big(2, 1), big(2, 0), ascii(called.padEnd(16)), ascii(calling.padEnd(16)), new Uint8Array(32)],
      ...[part(0x10, ascii(applicationContext)), part(0x20, joined(context))],
      part(0x50, joined([part(0x51, big(4, longestUnit)), part(0x52, ascii('2.25.1'))])),
    ]),
  );
}

function storeRequest(): Uint8Array {
  const element = (number: number, value: Uint8Array) => joined([little(2, 0), little(2, number), little(4, value.length), value]);
  const uid = (text: string) => ascii(text.length % 2 === 0 ? text : `${text}\0`);
  const elements = joined([
    ...[element(0x0002, uid(mrImageStorage)), element(0x0100, little(2, 1)), element(0x0110, little(2, 1)), element(0x0700, little(2, 0))],
    ...[element(0x0800, little(2, 1)), element(0x1000, uid('2.25.123'))],
  ]);
  return joined([element(0, little(4, elements.length)), elements]);
}

function* fragments(bytes: Uint8Array, flags: number): Generator<Uint8Array> {
  const most = longestUnit - 64;
  for (let at = 0; at === 0 || at < bytes.length; at += most) {
    const isLast = at + most >= bytes.length;
    const value = bytes.subarray(at, at + most);
    yield unit(4, joined([big(4, value.length + 2), Uint8Array.of(1, flags | (isLast ? 2 : 0)), value]));
  }
}

export interface Node {
  readonly port: number;
  readonly calling: string;
  readonly called: string;
}

/** Sends one data set in an association of its own and resolves to the status of the answer. */
export async function store({ port, calling, called }: Node, transferSyntax: string, dataSet: Uint8Array): Promise<StoreAnswer> {
  const socket = connect({ host: '127.0.0.1', port });
  const units = unitsOf(socket);
  try {
    await once(socket, 'connect');
    socket.write(associateRequest(calling, called, transferSyntax));
    const accepted = (await units.next()).value;
    if (accepted?.[0] !== 2) return 'aborted';
    if (!isAgreed(accepted)) return 'not-agreed';
    for (const fragment of [...fragments(storeRequest(), 1), ...fragments(dataSet, 0)]) socket.write(fragment);
    const answer = (await units.next()).value;
    return answer?.[0] === 4 ? statusIn(answer) : 'aborted';
  } finally {
    socket.destroy();
  }
}

/** The result of the only presentation context: items follow 74 bytes, and an item of type 21 has its result in byte 6. */
function isAgreed(accepted: Buffer): boolean {
  for (let at = 74; at + 8 <= accepted.length; at += 4 + accepted.readUInt16BE(at + 2)) {
    if (accepted[at] === 0x21) return accepted[at + 6] === 0;
  }
  return false;
}

/** Element (0000,0900) of the command set. */
function statusIn(answer: Buffer): number {
  const at = answer.indexOf(joined([little(2, 0), little(2, 0x0900), little(4, 2)]));
  return at < 0 ? NaN : answer.readUInt16LE(at + 8);
}

async function* unitsOf(socket: Socket): AsyncGenerator<Buffer> {
  let held: Buffer = Buffer.alloc(0);
  for await (const chunk of socket as AsyncIterable<Buffer>) {
    held = Buffer.concat([held, chunk]);
    while (held.length >= 6 && held.length >= 6 + held.readUInt32BE(2)) {
      const end = 6 + held.readUInt32BE(2);
      yield held.subarray(0, end);
      held = held.subarray(end);
    }
  }
}
