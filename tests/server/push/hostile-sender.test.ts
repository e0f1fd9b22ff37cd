/**
 * A sender that keeps to no rule, with a socket of our own. Whatever it sends, it is told so or cut off, the node goes on in the same
 * thread, and nothing is stored. What a unit must look like: DICOM PS3.8 section 9.3; how an association is refused or aborted: 9.3.4, 9.3.8.
 */
import { connect } from 'node:net';
import { uniformInt } from 'pure-rand/distribution/uniformInt';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import type { DicomNode } from '../../../server/push/dicom-node';
import { openApplication, type Application } from '../application';
import { headFile } from '../files';
import { allow, echo, openNode, pageOf, scannerTitle } from './scanner-tools';
import { associate, command, data, storeCommand } from './units';

let application: Application;
let node: DicomNode;
beforeAll(async () => {
  application = await openApplication({ variables: { UPLOAD_FILE_MIB: '1' } });
  node = await openNode(application);
  await allow(application);
});
afterAll(async () => {
  await node.close();
  await application.close();
});

/** Long enough for an answer on two busy cores. */
const patienceMs = 5_000;

/** Sends chunks and waits until the node closes the connection, or has had its time; returns the types of the units that came back. */
function talk(chunks: readonly Buffer[], { hangUp = false } = {}): Promise<number[]> {
  return new Promise((resolve) => {
    const received: Buffer[] = [];
    const socket = connect(node.port, '127.0.0.1', () => {
      for (const chunk of chunks) socket.write(chunk);
      if (hangUp) socket.end(() => socket.destroy());
    });
    const timer = setTimeout(() => socket.destroy(), patienceMs);
    socket.on('data', (chunk: Buffer) => received.push(chunk));
    // The node may cut the connection while this side still writes.
    socket.on('error', () => socket.destroy());
    socket.on('close', () => {
      clearTimeout(timer);
      resolve(typesOf(Buffer.concat(received)));
    });
  });
}

function typesOf(bytes: Buffer): number[] {
  const types: number[] = [];
  for (let at = 0; at + 6 <= bytes.length; at += 6 + bytes.readUInt32BE(at + 2)) types.push(bytes.readUInt8(at));
  return types;
}

const accepted = 2;
const dataUnit = 4;
const abort = 7;

/** The node answers a well-behaved scanner, and nothing lies in the inbox. */
async function goesOn(): Promise<void> {
  expect((await echo(node)).text).toContain('Received Echo Response (Success)');
  expect((await pageOf(application)).inbox.total).toBe(0);
  expect(application.logged()).not.toContain('started again');
}

const unit = (type: number, length: number, content = Buffer.alloc(0)): Buffer => {
  const header = Buffer.from([type, 0, 0, 0, 0, 0]);
  header.writeUInt32BE(length >>> 0, 2);
  return Buffer.concat([header, content]);
};

it.each<[string, Buffer[], number[]]>([
  ['a first unit that is data', [data(1, Buffer.alloc(8))], [abort]],
  ['an association request that claims 4 GB', [unit(1, 0xffffffff, Buffer.alloc(1000))], [abort]],
  ['a unit of an unknown type', [unit(99, 4, Buffer.alloc(4))], [abort]],
  ['an association request full of zeros', [unit(1, 68, Buffer.alloc(68))], [3]],
  ['data that claims 4 GB', [associate(scannerTitle), unit(4, 0xffffffff, Buffer.alloc(1000))], [accepted, abort]],
  ['a second association request', [associate(scannerTitle), associate(scannerTitle)], [accepted, abort]],
  ['data on a context that was not agreed', [associate(scannerTitle), data(77, Buffer.alloc(8))], [accepted, abort]],
  ['a fragment longer than its unit', [associate(scannerTitle), unit(4, 6, Buffer.from([0, 0, 255, 255, 1, 3]))], [accepted, abort]],
  ['a fragment of negative length', [associate(scannerTitle), unit(4, 6, Buffer.from([0, 0, 0, 1, 1, 3]))], [accepted, abort]],
  ['a data set without a command', [associate(scannerTitle), data(1, Buffer.alloc(64))], [accepted, abort]],
  [
    'a command that never ends',
    [associate(scannerTitle), ...Array.from({ length: 50 }, () => command(Buffer.alloc(200), false))],
    [accepted, abort],
  ],
  ['a command of garbage', [associate(scannerTitle), command(Buffer.from('not a command set at all'))], [accepted, abort]],
  ['a query, which is not what the node is for', [associate(scannerTitle), command(storeCommand(0x0020))], [accepted, abort]],
])('%s ends the association', async (_name, chunks, types) => {
  expect(await talk(chunks)).toEqual(types);
  await goesOn();
});

it('an object that goes on and on beyond the limit is not kept, and the sender is cut off', async () => {
  // The limit is 1 MB; past four times of it nobody can mean well.
  const fragments = Array.from({ length: 60 }, () => data(1, Buffer.alloc(100_000), false));
  expect(await talk([associate(scannerTitle), command(storeCommand()), ...fragments])).toEqual([accepted, abort]);
  await goesOn();
});

it.each([
  ['in the middle of its association request', () => [associate(scannerTitle).subarray(0, 40)]],
  ['in the middle of a command', () => [associate(scannerTitle), command(storeCommand()).subarray(0, 30)]],
  ['in the middle of an object', () => [associate(scannerTitle), command(storeCommand()), data(1, headFile().subarray(400, 9000), false)]],
])('a sender that hangs up %s leaves nothing', async (_name, chunks) => {
  await talk(chunks(), { hangUp: true });
  await goesOn();
});

it('an object that was cut off, though the sender says that it is whole, is refused as truncated', async () => {
  // The file meta information ends at byte 324 of this file; what follows is the data set.
  const cut = headFile().subarray(324, 60_000);
  const types = await talk([associate(scannerTitle), command(storeCommand()), data(1, cut), unit(5, 4, Buffer.alloc(4))]);
  expect(types).toEqual([accepted, dataUnit, 6]);
  expect((await pageOf(application)).push.refused.last).toBe('truncated');
  await goesOn();
});

it('random bytes, before and after the association, take nothing down', async () => {
  const random = xoroshiro128plus(20_261_201);
  const noise = (length: number) => Buffer.from(Array.from({ length }, () => uniformInt(random, 0, 255)));
  for (let i = 0; i < 20; i++) {
    await talk([noise(300)], { hangUp: true });
    await talk([associate(scannerTitle), unit(4, 120, noise(120)), noise(200)], { hangUp: true });
  }
  await goesOn();
});

it('an association request with any one byte changed is refused, aborted or accepted, and takes nothing down', async () => {
  const whole = associate(scannerTitle);
  for (let at = 6; at < whole.length; at += 7) {
    const changed = Buffer.from(whole);
    changed[at] = 255 - (changed[at] ?? 0);
    await talk([changed], { hangUp: true });
  }
  await goesOn();
});
