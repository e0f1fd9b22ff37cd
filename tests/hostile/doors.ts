/**
 * The three doors of a running server, for one file each: the upload, STOW-RS and C-STORE. What comes back is checked against the contract:
 * anything but a refusal with its reason, or images whose values are all there, counts as a crash.
 */
import { z } from 'zod';
import { uploadResultSchema, type Image } from '../../server/contract/images';
import { problemSchema } from '../../server/contract/problem';
import { joined } from '../../server/dicom/elements';
import type { RealServer } from '../bench/real-server';
import type { Mutated } from './mutations';
import { store } from './store-sender';

export interface Outcome {
  /** A refusal code, a status, or `accepted`. */
  readonly code: string;
  readonly refused: boolean;
  /** What should not have happened. */
  readonly crash?: string;
}
export type Door = (file: Mutated) => Promise<Outcome>;

export const aeTitles = { calling: 'HOSTILE', called: 'PICKGLASS' } as const;
/** Larger pictures are checked by npm test, where they need no second way over the network. */
const mostChecked = 1 << 20;

export interface Doors {
  readonly upload: Door;
  readonly stow: Door;
  readonly store: Door;
}

/** Puts a scanner of the demo department on the list and draws a token for it. */
export async function openDoors(server: RealServer, dicomPort: number): Promise<Doors> {
  const cookie = await server.cookieOf('administrator');
  const call = async (method: string, path: string, body?: unknown): Promise<unknown> => {
    const headers = { cookie, 'Content-Type': 'application/json' };
    const response = await fetch(`${server.origin}${path}`, {
      method,
      headers,
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    });
    if (!response.ok) throw new Error(`${method} ${path} was answered with ${response.status}`);
    return response.json();
  };
  const [scanner] = z.array(z.object({ id: z.string() })).parse(await call('GET', '/api/scanners'));
  await call('PUT', `/api/scanners/${scanner?.id}/push`, { aeTitle: aeTitles.calling, addresses: ['127.0.0.1'] });
  const { token } = z.object({ token: z.string() }).parse(await call('POST', `/api/scanners/${scanner?.id}/tokens`));
  return {
    upload: (file) => uploaded(server, file),
    stow: (file) => stowed(server, token, file),
    store: (file) => stored(dicomPort, file),
  };
}

async function uploaded({ origin, cookie }: RealServer, { bytes, name = 'x.dcm' }: Mutated): Promise<Outcome> {
  const form = new FormData();
  form.append('files', new File([new Uint8Array(bytes)], name));
  const response = await fetch(`${origin}/api/images`, { method: 'POST', headers: { cookie, Accept: 'application/json' }, body: form });
  const answer: unknown = await response.json();
  const result = uploadResultSchema.safeParse(answer);
  if (!result.success) {
    // A name that breaks the framing of the request is an error of the whole request, with its reason.
    const problem = problemSchema.safeParse(answer);
    const isRefused =
      response.status === 400 && problem.success && (problem.data.detail ?? problem.data.issues?.[0]?.message) !== undefined;
    return { code: `HTTP ${response.status}`, refused: true, ...(isRefused ? {} : { crash: `answered with ${response.status}` }) };
  }
  const { images, refused } = result.data;
  if (images.length === 0) {
    const [first] = refused;
    const isRefused = response.status === 422 && first !== undefined && first.reason !== '';
    return { code: first?.code ?? 'none', refused: true, ...(isRefused ? {} : { crash: `${response.status} without a reason` }) };
  }
  const unsound = await firstUnsound(origin, cookie, images);
  return { code: 'accepted', refused: false, ...(unsound === undefined ? {} : { crash: unsound }) };
}

async function firstUnsound(origin: string, cookie: string, images: readonly Image[]): Promise<string | undefined> {
  for (const { id, rows, columns, frames, component } of images) {
    if (rows * columns * frames > mostChecked) continue;
    const response = await fetch(`${origin}/api/images/${id}/pixels`, { headers: { cookie } });
    const values = new Float32Array(await response.arrayBuffer());
    const expected = rows * columns * (component === 'complex' ? 2 : 1);
    if (!response.ok || values.length !== expected || !values.every(Number.isFinite)) return `the values of image ${id} are not sound`;
  }
  return undefined;
}

async function stowed({ origin }: RealServer, token: string, { bytes }: Mutated): Promise<Outcome> {
  const line = (text: string) => new TextEncoder().encode(text);
  const response = await fetch(`${origin}/api/dicomweb/studies`, {
    method: 'POST',
    headers: { Authorization: `Bearer ${token}`, 'Content-Type': 'multipart/related; type="application/dicom"; boundary=hostile' },
    body: new Uint8Array(joined([line('--hostile\r\nContent-Type: application/dicom\r\n\r\n'), bytes, line('\r\n--hostile--')])),
  });
  await response.arrayBuffer();
  const refused = response.status !== 200;
  return {
    code: `HTTP ${response.status}`,
    refused,
    ...(response.status === 200 || response.status === 409 ? {} : { crash: 'neither stored nor failed' }),
  };
}

/** PS3.4 table B.2-1 and PS3.7 annex C: success, out of resources, cannot understand, not supported. */
const honest = new Set([0, 0xa700, 0xc000, 0x0122]);

async function stored(port: number, { bytes, material }: Mutated): Promise<Outcome> {
  const answer = await store({ port, ...aeTitles }, material.transferSyntax, bytes.subarray(material.dataSetAt));
  const code = typeof answer === 'number' ? `status ${answer.toString(16).padStart(4, '0')}` : answer;
  const isHonest = answer === 'not-agreed' || (typeof answer === 'number' && honest.has(answer));
  return { code, refused: answer !== 0, ...(isHonest ? {} : { crash: 'no honest status' }) };
}
