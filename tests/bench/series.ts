/**
 * A series of 200 slices of 512² through the whole path: asked after, sent in batches as the client sends them, read on the worker thread, stored
 * and described, over HTTP from the production server. Goal: 40 slices/s, so that a series is there in five seconds. And whether memory stays
 * flat: the most that the server holds during the second hundred slices, less the most during the first. Their values alone are 100 MB.
 */
import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { headGrid, headImage } from '../../recon/phantoms/head';
import { writeDicom } from '../../server/dicom/write';
import type { Figure } from './figure';
import { withRealServer, type RealServer } from './real-server';

const side = 512;
const slices = 200;
/** As the client does (components/case/intake/batches.ts). */
const batch = 16;
const warmUp = 32;

export async function seriesFigures(): Promise<Figure[]> {
  const object = headImage(headGrid(side));
  const files = Array.from({ length: warmUp + slices }, (_, i) => sliceFile(object.values, i));
  return withRealServer(async (server) => {
    await sendAll(server, files.slice(0, warmUp));
    const memory = watchMemory(server.processId);
    const before = performance.now();
    await sendAll(server, files.slice(warmUp, warmUp + slices / 2));
    const first = memory.peak();
    await sendAll(server, files.slice(warmUp + slices / 2));
    const seconds = (performance.now() - before) / 1000;
    const second = memory.peak();
    memory.stop();
    return [
      {
        id: 'series-200-slices',
        value: slices / seconds,
        unit: 'slices/s',
        goal: 40,
        better: 'higher',
        note: `${side}², batches of ${batch}`,
      },
      {
        id: 'series-memory-growth',
        value: Math.max(0, second - first),
        unit: 'MB',
        // A quarter of what would be held if nothing were let go: garbage comes and goes in steps of that size.
        goal: 25,
        better: 'lower',
        note: `most resident: ${first.toFixed(0)} MB in the first hundred, ${second.toFixed(0)} MB in the second`,
      },
    ];
  });
}

/** The head, a little brighter from slice to slice, so that no two objects are the same. */
function sliceFile(values: Float64Array, slice: number): Uint8Array<ArrayBuffer> {
  const pixels = Uint16Array.from(values, (value) => Math.max(0, value) * (1000 + slice));
  const written = writeDicom({
    rows: side,
    columns: side,
    pixels,
    uids: { study: '2.25.900', series: '2.25.901', image: `2.25.902${slice}` },
    attributes: {
      ...{ phaseEncodingDirection: 'COL', repetitionTime: 500, echoTime: 12, pixelSpacing: [0.5, 0.5], instanceNumber: slice + 1 },
      ...{ imageOrientation: [1, 0, 0, 0, 1, 0], imagePosition: [0, 0, 3 * slice] },
    },
  });
  return new Uint8Array(written);
}

async function sendAll({ origin, cookie }: RealServer, files: readonly Uint8Array<ArrayBuffer>[]): Promise<void> {
  for (let at = 0; at < files.length; at += batch) {
    const lot = files.slice(at, at + batch);
    const digests = lot.map((file) => createHash('sha256').update(file).digest('hex'));
    await fetch(`${origin}/api/images/sent`, {
      method: 'POST',
      headers: { cookie, 'Content-Type': 'application/json' },
      body: JSON.stringify({ digests }),
    });
    const form = new FormData();
    for (const [i, file] of lot.entries()) form.append('files', new File([file], `${at + i}.dcm`));
    const response = await fetch(`${origin}/api/images`, { method: 'POST', headers: { cookie, Accept: 'application/json' }, body: form });
    if (response.status !== 201) throw new Error(`the server answered a batch with ${response.status}`);
    await response.arrayBuffer();
  }
}

/** The most memory that a process held since the last question, in MB, as Linux counts it. */
function watchMemory(processId: number) {
  let most = 0;
  const look = (): void => {
    const kilobytes = /^VmRSS:\s+(\d+)/m.exec(readFileSync(`/proc/${processId}/status`, 'utf8'))?.[1];
    most = Math.max(most, Number(kilobytes) / 1024);
  };
  const timer = setInterval(look, 50);
  return {
    peak(): number {
      look();
      const peak = most;
      most = 0;
      return peak;
    },
    stop: () => clearInterval(timer),
  };
}
