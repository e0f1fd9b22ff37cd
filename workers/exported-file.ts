/**
 * The result of a recipe as a file: derived DICOM, PNG of 8 or 16 bits, .npy. Pictures carry the words that say what they are; arrays are
 * for computing, and their names say it. Levels of 16 bits stand for values by the slope that is written beside them.
 */
import { createHash } from 'node:crypto';
import { encode } from 'fast-png';
import type { Plane } from '../recon/grid';
import type { Simulation } from '../recon/simulate';
import type { Derivation } from '../server/dicom/derived/derivation';
import { writeDerived } from '../server/dicom/derived/derived-image';
import { logFloor } from './display-levels';
import { encodePlanes, kspaceWindow } from './encode-planes';
import { exportedWords, marked } from './exported-mark';
import type { ExportForm } from './job';
import type { Levels } from './mark-letters';
import { encodeNpy } from './npy';

const fullScale = 65_535;
const millimetresPerMetre = 1000;

const float32Of = (plane: Plane): Uint8Array => encodePlanes([{ name: 'image', domain: 'image', plane }], 'exact').bytes;

/** SHA-256 of the float32 image plane: the same recipe on the same image gives it again. */
export const digestOf = (image: Plane): string => createHash('sha256').update(float32Of(image)).digest('hex');

export function exportedFile({ image, kspace }: Simulation, form: ExportForm, about: Derivation): Uint8Array {
  switch (form) {
    case 'derived.dcm':
      return derivedFile(image, about);
    case 'image.png':
      return png(windowed(image, about.window), 8, about, `black ${about.window[0]}, white ${about.window[1]}`);
    case 'image16.png': {
      const { levels, slope } = scaled(image.values);
      return png({ ...sizeOf(image), levels }, 16, about, `value = ${slope} x level`);
    }
    case 'kspace.png':
      return png(decades(kspaceLevels(kspace)), 8, about, `log10 of magnitude over its maximum, black ${kspaceWindow[0]}, white 0`);
    case 'kspace16.png':
      return png(kspaceLevels(kspace), 16, about, `log10 of magnitude over its maximum, level 0 is ${logFloor}, ${fullScale} is 0`);
    case 'image.npy':
      return encodeNpy(float32Of(image), [image.rows, image.columns], '<f4');
    case 'kspace.npy': {
      const { bytes } = encodePlanes([{ name: 'kspace', domain: 'kspace', plane: kspace }], 'exact');
      return encodeNpy(bytes, [kspace.rows, kspace.columns], '<c8');
    }
  }
}

const sizeOf = ({ rows, columns }: Plane | Simulation['kspace']) => ({ width: columns, height: rows });

/**
 * Levels of 16 bits and the value of one of them. Whole numbers that fit stay as they are; else the largest value takes the largest level,
 * and no value is off by more than half a slope. Nine digits: a decimal string of DICOM has room for them.
 */
export function scaled(values: Float64Array): { levels: Uint16Array; slope: number } {
  const largest = values.reduce((most, value) => Math.max(most, value), 0);
  const isWhole = largest <= fullScale && values.every(Number.isInteger);
  const slope = isWhole || largest === 0 ? 1 : roundedUp(largest / fullScale);
  return { levels: Uint16Array.from(values, (value) => Math.round(value / slope)), slope };
}

function roundedUp(value: number): number {
  const nearest = Number(value.toPrecision(9));
  return nearest >= value ? nearest : Number((value * (1 + 1e-8)).toPrecision(9));
}

function derivedFile(image: Plane, about: Derivation): Uint8Array {
  const { levels, slope } = scaled(image.values);
  // The words are as bright as the brightest pixel, so that no window is spoilt by them.
  const white = levels.reduce((most, level) => Math.max(most, level), 0) || fullScale;
  const { enlargement, ...picture } = marked({ ...sizeOf(image), levels }, white);
  const inMillimetres = (metres: number) => Number((metres * millimetresPerMetre).toPrecision(12));
  const [row, column] = [inMillimetres(image.spacing[0]), inMillimetres(image.spacing[1])];
  // The first of the smaller pixels lies nearer to the corner.
  const shift = (pixel: number) => (pixel * (1 / enlargement - 1)) / 2;
  return writeDerived(about, {
    ...picture,
    slope,
    spacingMm: [row / enlargement, column / enlargement],
    originMm: [inMillimetres(image.origin[0]) + shift(row), inMillimetres(image.origin[1]) + shift(column)],
  });
}

function windowed(image: Plane, [low, high]: readonly [number, number]): Levels & { levels: Uint8Array } {
  const factor = 255 / (high > low ? high - low : 1);
  const levels = Uint8Array.from(image.values, (value) => Math.max(0, Math.min(255, Math.round((value - low) * factor))));
  return { ...sizeOf(image), levels };
}

/** Log magnitude, level 0 at the floor. */
function kspaceLevels(kspace: Simulation['kspace']): Levels & { levels: Uint16Array } {
  const { planes, bytes } = encodePlanes([{ name: 'kspace', domain: 'kspace', plane: kspace }], 'display');
  const nPixels = kspace.rows * kspace.columns;
  if (planes[0]?.name !== 'kspace.log') throw new Error('the log magnitude must be the first plane of the display form');
  return { ...sizeOf(kspace), levels: new Uint16Array(bytes.buffer, bytes.byteOffset, nPixels) };
}

/** The decades that a small picture of k-space shows. */
function decades({ levels, ...size }: Levels): Levels & { levels: Uint8Array } {
  const [low, high] = kspaceWindow;
  const value = (level: number) => logFloor * (1 - level / fullScale);
  return { ...size, levels: Uint8Array.from(levels, (level) => Math.max(0, Math.round((255 * (value(level) - low)) / (high - low)))) };
}

function png<L extends Uint8Array | Uint16Array>(
  picture: Levels & { levels: L },
  depth: 8 | 16,
  about: Derivation,
  scale: string,
): Uint8Array {
  const { width, height, levels } = marked(picture, depth === 8 ? 255 : fullScale);
  const text = { Title: exportedWords, Software: `Pickglass ${about.productVersion}`, Comment: scale };
  return encode({ width, height, data: levels, channels: 1, depth, text });
}
