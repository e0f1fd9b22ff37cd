/** Raw data files that tests/reference/raw/remake.py made, read on a worker thread as an upload is. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { transform } from '../../../recon/fourier';
import { centredGrid, type ComplexPlane } from '../../../recon/grid';
import type { AcceptedImage, Read } from '../../../server/dicom/read';
import { openWorkers, workersIn } from '../../../workers/pool';

export type RawName =
  'one-coil' | 'four-coils' | 'undersampled' | 'partial' | 'reversed' | 'asymmetric' | 'averages' | 'slices' | 'noise-only' | 'no-raw-data';

export const rawFile = (name: RawName): Uint8Array<ArrayBuffer> =>
  new Uint8Array(readFileSync(join(__dirname, '../../reference/raw', `${name}.h5`)));

/** The file with words of its header replaced by others, filled up with spaces to the same length. */
export function withHeader(name: RawName, from: string, to: string): Uint8Array<ArrayBuffer> {
  const bytes = Buffer.from(rawFile(name));
  const at = bytes.indexOf(from);
  if (at < 0 || to.length > from.length) throw new Error(`the header has no place for ${to}`);
  bytes.write(to.padEnd(from.length), at, 'latin1');
  return new Uint8Array(bytes);
}

const key = new Uint8Array(32).fill(7);

export function openReader() {
  const workers = openWorkers(workersIn(join(__dirname, '../../../workers'), '.ts'), 1);
  const read = (bytes: Uint8Array, limitMs = 30_000): Promise<Read | undefined> => workers.readDicom({ bytes, key }, limitMs);
  return {
    read,
    async accepted(bytes: Uint8Array): Promise<AcceptedImage> {
      const outcome = await read(bytes);
      const image = outcome && 'accepted' in outcome ? outcome.accepted[0] : undefined;
      if (image === undefined) throw new Error(`the file was not taken: ${JSON.stringify(outcome)}`);
      return image;
    },
    close: () => workers.close(),
  };
}

/** The k-space that the product shows of a frame, its power of two taken out again. */
export function kspaceOf({ values, rows, columns, warnings }: AcceptedImage, frame: number): ComplexPlane {
  const n = rows * columns;
  const part = (offset: number) => Float64Array.from({ length: n }, (_, i) => values[2 * (frame * n + i) + offset] ?? NaN);
  const kspace = transform({ ...centredGrid(rows, columns, [1, 1]), re: part(0), im: part(1) });
  const exponent = Number(/2\^(-?\d+)/.exec(warnings.find(({ code }) => code === 'raw')?.text ?? '')?.[1]);
  return { ...kspace, re: kspace.re.map((value) => value / 2 ** exponent), im: kspace.im.map((value) => value / 2 ** exponent) };
}
