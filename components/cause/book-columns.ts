/** Where swatches stand: how many beside each other in each column of a wide book, and how large they are in the list of a phone. */
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { alongs, type Along } from './cause-words';

/** The mat around a picture, and the two stitched lines of the selvedge beside it, pixels. */
export const mat = 3;
export const selvedge = 6;
/** What a swatch takes beside its picture. */
export const swatchEdges = 2 * mat + selvedge + mat;

/** A swatch with its mat and selvedge, and the gap to the next, pixels. */
export const swatchPitch = 116;

const least: Record<Along, number> = { 'phase-encode': 2, readout: 1, both: 1, none: 1 };
/** Columns that gain a swatch, one after the other, as the book gets wider. */
const gains: readonly Along[] = ['both', 'phase-encode', 'none', 'readout'];

/** `room`: pixels beside the names of the stages. */
export function bookColumns(room: number): Record<Along, number> {
  const across = { ...least };
  let free = Math.floor(room / swatchPitch) - alongs.reduce((sum, along) => sum + least[along], 0);
  for (let next = 0; free > 0; next++, free--) across[gains[next % gains.length] ?? 'phase-encode']++;
  return across;
}

/** Between swatches of the list. */
export const listGap = 8;
const leastPicture = 84;

/** Width of the pictures of which as many as possible, but at least `leastPicture` wide, stand beside each other in `room` pixels. */
export function pictureWidth(room: number): number {
  const across = Math.max(1, Math.floor((room + listGap) / (leastPicture + swatchEdges + listGap)));
  return Math.min(120, Math.floor((room + listGap) / across) - listGap - swatchEdges);
}

/** Titles in one sentence: small letters after the first, but not in an abbreviation. */
export const nameLine = (causes: readonly Pick<CatalogueEntry, 'title'>[]): string =>
  causes
    .map(({ title }, index) => (index === 0 || !/^.[a-z]/.test(title) ? title : title.charAt(0).toLowerCase() + title.slice(1)))
    .join(', ');
