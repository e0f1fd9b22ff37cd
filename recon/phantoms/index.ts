/** Every phantom of materials. */
import { abdomenPhantom } from './abdomen';
import { headPhantom } from './head';
import type { Phantom, PhantomId } from './phantom';
import { resolutionPhantom } from './resolution';
import { vialPhantom } from './vials';

export const phantoms: readonly Phantom[] = [headPhantom, abdomenPhantom, resolutionPhantom, vialPhantom];

export const phantomOf = (id: PhantomId): Phantom => phantoms.find((phantom) => phantom.id === id) ?? headPhantom;
