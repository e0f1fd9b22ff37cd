/**
 * Acquisitions, one a readout: a fixed head, and samples of every coil element, re and im in turn. They are read in batches and handed on one
 * after the other; a record is taken from memory by the offsets that the file itself gives.
 * Record and flags: ISMRMRD, ismrmrd.h (AcquisitionHeader, EncodingCounters, ISMRMRD_AcquisitionFlags).
 */
import { broken, MrdFault } from './fault';
import { typeClass, type Hdf5Dataset, type Hdf5File, type Hdf5Member, type InMemory } from './hdf5';

export type Vector = readonly [number, number, number];

export interface Acquisition {
  readonly flags: bigint;
  readonly samples: number;
  readonly channels: number;
  readonly discardPre: number;
  readonly discardPost: number;
  readonly centreSample: number;
  readonly encodingSpace: number;
  readonly dwellTimeUs: number;
  readonly position: Vector;
  readonly readoutDirection: Vector;
  readonly phaseDirection: Vector;
  readonly line: number;
  readonly partition: number;
  readonly slice: number;
  readonly contrast: number;
  readonly phase: number;
  readonly repetition: number;
  readonly set: number;
  /** [channel, sample] re, im: valid until the next acquisition. */
  readonly data: Float32Array;
}

const flag = (position: number): bigint => 1n << BigInt(position - 1);
/** Noise, calibration apart from the image, navigators, phase correction, feedback, dummies, surface coil correction, phase stabilisation. */
const notOfTheImage = [19, 20, 23, 24, 26, 27, 28, 29, 30, 31].map(flag).reduce((all, one) => all | one, 0n);
const reversed = flag(22);

export const isOfTheImage = ({ flags, encodingSpace }: Acquisition): boolean => (flags & notOfTheImage) === 0n && encodingSpace === 0;
export const isReversed = ({ flags }: Acquisition): boolean => (flags & reversed) !== 0n;

/** More readouts than this are no file of pictures (common practice: a long dynamic series has some ten thousand). */
const mostAcquisitions = 1 << 20;
const mostChannels = 128;
const batch = 32;

/** Calls `take` with every acquisition of the dataset. */
export function eachAcquisition(file: Hdf5File, path: string, take: (acquisition: Acquisition) => void): void {
  const dataset = file.describe(path);
  const count = dataset.shape?.[0] ?? 0;
  if (dataset.shape?.length !== 1 || count < 1) throw broken('it holds no acquisitions');
  if (count > mostAcquisitions) throw new MrdFault('size', 'The raw data hold more acquisitions than are read from one file.');
  if ((dataset.chunks?.[0] ?? 1) > mostAcquisitions) throw broken('its acquisitions lie in chunks of an impossible size');
  const recordOf = layoutOf(dataset);
  for (let from = 0; from < count; from += batch) {
    const rows = Math.min(batch, count - from);
    file.readRows(path, dataset, from, rows, ({ memory, address }) => {
      for (let row = 0; row < rows; row++) take(recordOf({ memory, address: address + row * dataset.size }));
    });
  }
}

/** A reader of records, by the names of their members. */
function layoutOf(dataset: Hdf5Dataset): (record: InMemory) => Acquisition {
  const head = memberOf(dataset.compound_type?.members, 'head');
  const data = memberOf(dataset.compound_type?.members, 'data');
  const { vlen_type: sample } = data;
  if (data.type !== typeClass.variable || sample?.type !== typeClass.float || sample.size !== 4 || !sample.littleEndian) {
    throw broken('its samples are no single precision numbers');
  }
  const fields = head.compound_type?.members;
  const counters = memberOf(fields, 'idx');
  const place = (members: readonly Hdf5Member[] | undefined, base: number) => (name: string, size: number) => {
    const member = memberOf(members, name);
    if (member.size !== size || !member.littleEndian) throw broken(`its field ${name} is of another size`);
    return base + member.offset;
  };
  const inHead = place(fields, head.offset);
  const inCounters = place(counters.compound_type?.members, head.offset + counters.offset);
  const at = {
    ...{ flags: inHead('flags', 8), samples: inHead('number_of_samples', 2), channels: inHead('active_channels', 2) },
    ...{ discardPre: inHead('discard_pre', 2), discardPost: inHead('discard_post', 2), centreSample: inHead('center_sample', 2) },
    ...{ encodingSpace: inHead('encoding_space_ref', 2), dwellTimeUs: inHead('sample_time_us', 4) },
    ...{ position: inHead('position', 12), readout: inHead('read_dir', 12), phaseDirection: inHead('phase_dir', 12) },
    ...{ line: inCounters('kspace_encode_step_1', 2), partition: inCounters('kspace_encode_step_2', 2), slice: inCounters('slice', 2) },
    ...{
      contrast: inCounters('contrast', 2),
      phase: inCounters('phase', 2),
      repetition: inCounters('repetition', 2),
      set: inCounters('set', 2),
    },
  };
  return ({ memory, address }) => {
    const view = new DataView(memory.buffer, memory.byteOffset + address, dataset.size);
    const short = (offset: number) => view.getUint16(offset, true);
    const vector = (offset: number): Vector => [0, 4, 8].map((step) => view.getFloat32(offset + step, true)) as [number, number, number];
    return {
      ...{ flags: view.getBigUint64(at.flags, true), samples: short(at.samples), channels: short(at.channels) },
      ...{ discardPre: short(at.discardPre), discardPost: short(at.discardPost), centreSample: short(at.centreSample) },
      ...{ encodingSpace: short(at.encodingSpace), dwellTimeUs: view.getFloat32(at.dwellTimeUs, true) },
      ...{ position: vector(at.position), readoutDirection: vector(at.readout), phaseDirection: vector(at.phaseDirection) },
      ...{ line: short(at.line), partition: short(at.partition), slice: short(at.slice), contrast: short(at.contrast) },
      ...{ phase: short(at.phase), repetition: short(at.repetition), set: short(at.set) },
      data: samplesOf(memory, view, data.offset, short(at.samples) * short(at.channels) * 2, short(at.channels)),
    };
  };
}

function memberOf(members: readonly Hdf5Member[] | undefined, name: string): Hdf5Member {
  const member = members?.find((one) => one.name === name);
  if (member === undefined) throw broken(`its acquisitions have no field ${name}`);
  return member;
}

/** What a variable length points to: how many, and where. */
function samplesOf(memory: Uint8Array, view: DataView, offset: number, expected: number, channels: number): Float32Array {
  const length = view.getUint32(offset, true);
  const address = view.getUint32(offset + 4, true);
  if (length !== expected) throw broken('an acquisition does not have as many samples as it says');
  if (channels > mostChannels) throw new MrdFault('size', `The raw data have more coil elements than are read here (${mostChannels}).`);
  if (address % 4 !== 0 || address + 4 * length > memory.length) throw broken('an acquisition lies outside the file');
  return new Float32Array(memory.buffer, memory.byteOffset + address, length);
}
