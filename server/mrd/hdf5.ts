/**
 * HDF5 through the C library in WebAssembly (h5wasm). One instance serves the files of a thread; it is opened when the first HDF5 file comes,
 * and a new one takes its place where it broke down over a file or grew large, since memory of WebAssembly never shrinks.
 * Its file system is a map in memory: a file has no name in it, and links to other files lead nowhere.
 * Only the functions that are needed are declared here; records are read as they lie in memory, which is many times faster than objects.
 */
import { existsSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { MrdFault } from './fault';

/** A type in memory, as h5wasm describes it. */
export interface Hdf5Type {
  readonly type: number;
  readonly size: number;
  readonly vlen: boolean;
  readonly littleEndian: boolean;
  readonly compound_type?: { readonly members: readonly Hdf5Member[] };
  readonly array_type?: Hdf5Type & { readonly total_size: number };
  readonly vlen_type?: Hdf5Type;
}

export interface Hdf5Member extends Hdf5Type {
  readonly name: string;
  readonly offset: number;
}

export interface Hdf5Dataset extends Hdf5Type {
  readonly shape: readonly number[] | null;
  readonly chunks: readonly number[] | null;
}

/** Classes of types: H5T_class_t of the HDF5 C library. */
export const typeClass = { integer: 0, float: 1, string: 3, compound: 6, variable: 9, array: 10 } as const;

/** The memory of the library, and where in it something lies. */
export interface InMemory {
  readonly memory: Uint8Array;
  readonly address: number;
}

export interface Hdf5File {
  names(group: string): readonly string[];
  describe(dataset: string): Hdf5Dataset;
  /** Rows of a one-dimensional dataset; `take` sees them where they lie and copies what it keeps. */
  readRows(dataset: string, type: Hdf5Type, from: number, count: number, take: (rows: InMemory) => void): void;
}

export interface Hdf5 {
  /** Throws whatever the library throws over a damaged file. */
  read<Result>(bytes: Uint8Array, look: (file: Hdf5File) => Result): Result;
  worn(): boolean;
}

interface H5wasm {
  readonly FS: { writeFile(path: string, bytes: Uint8Array): void; unlink(path: string): void };
  /** Another view after the memory has grown. */
  readonly HEAPU8: Uint8Array;
  readonly H5F_ACC_RDONLY: number;
  _malloc(size: number): number;
  _free(address: number): void;
  open(path: string, mode: number, trackOrder: boolean, lowest: number, highest: number): bigint;
  close_file(file: bigint): number;
  get_names(file: bigint, group: string, recursive: boolean): string[];
  get_dataset_metadata(file: bigint, dataset: string): Hdf5Dataset;
  get_dataset_data(file: bigint, dataset: string, count: bigint[], offset: bigint[], strides: bigint[], address: bigint): number;
  reclaim_vlen_memory_count(file: bigint, dataset: string, attribute: string, address: bigint, count: bigint[]): number;
}
type OpenH5wasm = (options: { noInitialRun: true; print: () => void; printErr: () => void }) => Promise<H5wasm>;

const path = 'file';
const mebibyte = 1 << 20;
/** What reading may add to the memory beside the file itself: a batch of acquisitions, and chunks that are inflated. */
const mostGrowth = 192 * mebibyte;
const wornSize = 256 * mebibyte;

/** The package itself opens one instance for all of its life. The module inside it opens as many as are asked for, and prints nothing. */
function libraryFile(): string {
  const folders = createRequire(import.meta.url).resolve.paths('h5wasm') ?? [];
  const file = folders.map((folder) => join(folder, 'h5wasm', 'dist', 'esm', 'hdf5_util.js')).find(existsSync);
  if (file === undefined) throw new Error('the package h5wasm is not installed');
  return file;
}

export async function openHdf5(): Promise<Hdf5> {
  const { default: open } = (await import(pathToFileURL(libraryFile()).href)) as { default: OpenH5wasm };
  const library = await open({ noInitialRun: true, print: () => undefined, printErr: () => undefined });
  let brokeDown = false;
  return {
    worn: () => brokeDown || library.HEAPU8.length > wornSize,
    read(bytes, look) {
      const release = limitGrowth(mostGrowth);
      brokeDown = true;
      try {
        library.FS.writeFile(path, bytes);
        const id = library.open(path, library.H5F_ACC_RDONLY, false, -1, -1);
        if (id < 0n) throw new Error('the library does not open the file');
        const result = outcomeOf(() => look(fileOf(library, id)));
        library.close_file(id);
        brokeDown = false;
        if (result instanceof MrdFault) throw result;
        return result;
      } finally {
        release();
        library.FS.unlink(path);
      }
    },
  };
}

/** A file that is refused has done no harm to the library, other than one over which the library itself throws. */
function outcomeOf<Result>(look: () => Result): Result | MrdFault {
  try {
    return look();
  } catch (error) {
    if (error instanceof MrdFault) return error;
    throw error;
  }
}

function fileOf(library: H5wasm, id: bigint): Hdf5File {
  return {
    names: (group) => library.get_names(id, group, false),
    describe: (dataset) => library.get_dataset_metadata(id, dataset),
    readRows(dataset, { size }, from, count, take) {
      const address = library._malloc(size * count);
      if (address === 0) throw new Error('no memory for a batch');
      const counts = [BigInt(count)];
      library.HEAPU8.fill(0, address, address + size * count);
      const status = library.get_dataset_data(id, dataset, counts, [BigInt(from)], [1n], BigInt(address));
      // What a read that failed has left behind goes with the instance.
      if (status < 0) throw new Error('a batch cannot be read');
      try {
        take({ memory: library.HEAPU8, address });
      } finally {
        library.reclaim_vlen_memory_count(id, dataset, '', BigInt(address), counts);
        library._free(address);
      }
    },
  };
}

const pageSize = 65_536;

/**
 * The library may take up to 2 GB by its own rules, and a few bytes of a file can ask for that. WebAssembly offers no limit from outside, so for
 * the time of a synchronous read this thread's memories refuse to grow beyond `most` bytes, which the library takes as memory that ran out.
 */
function limitGrowth(most: number): () => void {
  const { prototype } = WebAssembly.Memory;
  const { grow } = prototype;
  let left = most;
  prototype.grow = function (this: WebAssembly.Memory, pages: number) {
    left -= pages * pageSize;
    if (left < 0) throw new RangeError('the memory may not grow any further');
    return grow.call(this, pages);
  };
  return () => {
    prototype.grow = grow;
  };
}
