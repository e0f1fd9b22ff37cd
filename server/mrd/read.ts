/**
 * The door for raw data: an ISMRMRD file in, one complex image out, whose k-space is what the scanner sampled; or the reason why not. A plane of
 * one coil element is one frame. Of several elements there is one frame of all together first, then each by itself: the samples as they
 * were are those of the single elements. Values are multiplied by a power of two, so that no digit of a sample changes.
 * Files: ISMRMRD (Inati et al., Magn Reson Med 2017;77:411), a group with the XML header `xml` and the acquisitions `data`.
 */
import { createHash } from 'node:crypto';
import type { FrameFacts } from '../contract/facts';
import type { AcceptedImage, Read } from '../dicom/read';
import { fileKeyOf } from '../dicom/unique-identifiers';
import { rangeOf } from '../dicom/value-range';
import { magnitudeOf } from '../../recon/complex-image';
import { eachAcquisition } from './acquisitions';
import { combine, sensitivitiesOf, transformInPlace } from './coil-images';
import { factsOf, planeOf } from './facts';
import { broken, MrdFault } from './fault';
import { typeClass, type Hdf5, type Hdf5File } from './hdf5';
import { readHeader, type MrdHeader } from './header';
import { counters, framesPerPlane, kspaceOf, type Kspace, type KspaceFrame } from './kspace';
import { warningsOf } from './warnings';

/** No superblock is shorter: less is not worth the library's breakdown over it. */
const shortest = 48;

/** Reads one file; `key` is the department's. Its name is no input. */
export function readMrd(bytes: Uint8Array, key: Uint8Array, hdf5: Hdf5): Read {
  if (bytes.length < shortest) return cutFile.refusal;
  try {
    const { header, kspace } = hdf5.read(bytes, collect);
    return { accepted: [imageOf(header, kspace)], fileKey: fileKeyOf(key, createHash('sha256').update(bytes).digest('hex')) };
  } catch (error) {
    // What the library throws over a damaged file is of many kinds, and says nothing to a technologist.
    return error instanceof MrdFault ? error.refusal : cutFile.refusal;
  }
}

const cutFile = broken('it cannot be read to its end');

function collect(file: Hdf5File): { header: MrdHeader; kspace: Kspace } {
  const group = groupOf(file);
  const header = readHeader(xmlOf(file, `${group}/xml`));
  const kspace = kspaceOf(header);
  eachAcquisition(file, `${group}/data`, kspace.take);
  return { header, kspace: kspace.finish() };
}

/** The group of the measurement: `dataset` as a rule. Its name goes no further. */
function groupOf(file: Hdf5File): string {
  const names = [...file.names('/')].sort((one, other) => Number(other === 'dataset') - Number(one === 'dataset')).slice(0, mostGroups);
  const group = names.find((name) => holdsMeasurement(file, name));
  if (group !== undefined) return group;
  throw new MrdFault('not-mr', 'The file is HDF5, but no raw data of MR: it holds no ISMRMRD header and acquisitions.');
}

const mostGroups = 8;

function holdsMeasurement(file: Hdf5File, group: string): boolean {
  try {
    const names = file.names(group);
    return names.includes('xml') && names.includes('data');
  } catch {
    // A name at the top may be that of a dataset, which has no names below it.
    return false;
  }
}

const longestHeader = 1 << 20;

function xmlOf(file: Hdf5File, path: string): string {
  const dataset = file.describe(path);
  if (dataset.type !== typeClass.string || dataset.size > longestHeader) throw broken('its header is no text');
  let text = '';
  file.readRows(path, dataset, 0, 1, ({ memory, address }) => {
    const view = new DataView(memory.buffer, memory.byteOffset);
    const from = dataset.vlen ? view.getUint32(address, true) : address;
    const most = dataset.vlen ? longestHeader : dataset.size;
    const end = memory.subarray(from, from + most).indexOf(0);
    if (end < 0 && dataset.vlen) throw broken('its header is too long');
    text = new TextDecoder('utf-8').decode(memory.slice(from, from + (end < 0 ? most : end)));
  });
  return text;
}

function imageOf(header: MrdHeader, kspace: Kspace): AcceptedImage {
  const { rows, columns, channels, frames } = kspace;
  const perFrame = 2 * rows * columns;
  const values = new Float32Array(frames.length * framesPerPlane(channels) * perFrame);
  let at = 0;
  for (const { samples } of frames) {
    const sensitivities = channels > 1 ? sensitivitiesOf(samples, kspace) : undefined;
    transformInPlace(samples, kspace);
    if (sensitivities !== undefined) {
      values.set(combine(samples, sensitivities, kspace), at);
      at += perFrame;
    }
    values.set(samples, at);
    at += samples.length;
  }
  const exponent = scale(values);
  const facts = factsOf(header, kspace);
  return {
    ...{ rows, columns, values, facts },
    frames: frames.length * framesPerPlane(channels),
    ...{ component: 'complex', kspace: 'raw', use: 'measured', confirmedNoText: null },
    spacingMm: facts.pixelSpacingMm.value,
    range: [...rangeOf(magnitudeOf(values.subarray(0, perFrame)))] as [number, number],
    frameFacts: frames.flatMap((frame) => factsOfFrames(header, kspace, frame)),
    identifiers: { study: null, series: null, frameOfReference: null, image: null },
    warnings: warningsOf(header, kspace, exponent),
    deidentification: { removed: [...header.removed], replaced: [] },
  };
}

/** The largest part of a value lies between 512 and 1024 after this: as large as the grey values that people know. */
const largestExponent = 10;

/** Multiplies by a power of two, whose exponent it gives back. */
function scale(values: Float32Array): number {
  let largest = 0;
  for (const value of values) {
    if (!Number.isFinite(value)) throw broken('it holds samples that are no numbers');
    largest = Math.max(largest, Math.abs(value));
  }
  if (largest === 0) throw new MrdFault('no-pixels', 'All samples of the raw data are zero.');
  const exponent = largestExponent - 1 - Math.floor(Math.log2(largest));
  const factor = 2 ** exponent;
  for (let i = 0; i < values.length; i++) values[i] = (values[i] as number) * factor;
  return exponent;
}

/** `combined`, `coil 3 (H3)`, behind what else tells the frame from others: `slice` is told by its place. */
function factsOfFrames(header: MrdHeader, { channels, frames }: Kspace, frame: KspaceFrame): FrameFacts[] {
  const plane = planeOf(header, frame);
  const told = counters
    .filter((counter) => frames.some((other) => other.counters[counter] !== frame.counters[counter]))
    .map((counter) => `${counter} ${frame.counters[counter] + 1}`);
  const coil = (channel: number): string => {
    const name = header.coilNames.get(channel);
    return name === undefined ? `coil ${channel + 1}` : `coil ${channel + 1} (${name})`;
  };
  const elements = Array.from({ length: channels }, (_, channel) => coil(channel));
  const labels = channels === 1 ? [undefined] : ['combined', ...elements];
  return labels.map((label) => ({
    positionMm: plane ? [plane.corner[0], plane.corner[1], plane.corner[2]] : null,
    timeOfDay: null,
    triggerDelayMs: null,
    echoTimeMs: header.echoTimesMs[frame.counters.contrast] ?? null,
    label: [...told, ...(label === undefined ? [] : [label])].join(', ') || null,
  }));
}
