/** A simulation on a real slice or a made one, and its files as the worker writes them. */
import { asComplex, centredGrid } from '../../../recon/grid';
import type { Recipe } from '../../../recon/recipe';
import { completeRecipe } from '../../../recon/recipe-check';
import { simulate, type Simulation } from '../../../recon/simulate';
import type { Derivation } from '../../../server/dicom/derived/derivation';
import { readDicom, type AcceptedImage } from '../../../server/dicom/read';
import { replacedUid } from '../../../server/dicom/unique-identifiers';
import { recipeInWords, simulatedNotice } from '../../../server/services/recipe-in-words';
import { key } from '../dicom/made-image';

export interface Simulated {
  readonly image: AcceptedImage;
  readonly simulation: Simulation;
  readonly about: Derivation;
}

export const plain: Recipe = { steps: [], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 };

export const withCauses = (...steps: [cause: string, parameters: Record<string, number | string>][]): Recipe => ({
  ...plain,
  steps: steps.map(([cause, parameters]) => ({ cause, parameters })),
});

export function simulatedOn(file: Uint8Array, wanted: Recipe): Simulated {
  const read = readDicom(file, key);
  if ('refused' in read) throw new Error(read.refused.reason);
  const [image] = read.accepted;
  if (image === undefined) throw new Error('no image');
  const acquisition = { phaseEncode: 'row', repetitionTime: 2.3, averages: 1 } as const;
  const recipe = completeRecipe(wanted, acquisition);
  const [row, column] = image.spacingMm ?? [1, 1];
  const grid = centredGrid(image.rows, image.columns, [row / 1000, column / 1000]);
  const simulation = simulate(asComplex({ ...grid, values: Float64Array.from(image.values) }), recipe, acquisition);
  const made = (what: string) => replacedUid(key, what);
  const about: Derivation = {
    ...{ caseNumber: 42, instanceNumber: 3, facts: image.facts, sourceRows: image.rows, sourceColumns: image.columns },
    description: `${simulatedNotice}. ${recipeInWords(recipe)}.`,
    uids: { study: made('study'), series: made('series'), image: made('image'), frameOfReference: made('frame') },
    sourcePositionMm: image.facts.imagePositionMm.value,
    phaseEncode: acquisition.phaseEncode,
    window: image.range,
    productVersion: '0.1.0',
  };
  return { image, simulation, about };
}
