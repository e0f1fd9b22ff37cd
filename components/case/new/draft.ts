/**
 * The draft of a case, kept in this browser until it is filed, so that a lost connection loses nothing. It holds what a person
 * typed and the ids of images that are already at the server: never a file, and never a file's name, which may be a patient's.
 */
import { z } from 'zod';
import { directions, frequencies, imageCosts, type NewCase } from '@/server/contract/cases';
import { sightings } from '@/server/contract/sighting';

const draftSchema = z.object({
  images: z.array(z.uuid()).max(64),
  scannerId: z.uuid().nullable(),
  coilId: z.uuid().nullable(),
  /** Null until somebody typed one: until then the title is worked out from what is known. */
  title: z.string().nullable(),
  seen: z.array(z.enum(sightings)),
  direction: z.enum(directions),
  howOften: z.enum(frequencies),
  cost: z.enum(imageCosts),
  bodyRegion: z.string().nullable(),
  protocol: z.string().nullable(),
  description: z.string(),
  tried: z.string(),
  seenOn: z.iso.date().nullable(),
});
export type Draft = z.infer<typeof draftSchema>;

export const emptyDraft: Draft = {
  images: [],
  scannerId: null,
  coilId: null,
  title: null,
  seen: [],
  direction: 'unknown',
  howOften: 'unknown',
  cost: 'unknown',
  bodyRegion: null,
  protocol: null,
  description: '',
  tried: '',
  seenOn: null,
};

const keptSchema = z.object({ keptAt: z.number(), draft: draftSchema });
export type KeptDraft = z.infer<typeof keptSchema>;

/** One draft for each member: on a console several people share a browser. */
const keyOf = (memberId: string): string => `pickglass.draft.${memberId}`;

/** The kept draft, or null where there is none or what is there cannot be read. */
export function readDraft(storage: Pick<Storage, 'getItem'>, memberId: string): KeptDraft | null {
  const text = storage.getItem(keyOf(memberId));
  if (text === null) return null;
  const kept = keptSchema.safeParse(parse(text));
  return kept.success ? kept.data : null;
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    // Somebody else's value under our key: as good as no draft.
    return null;
  }
}

export const keepDraft = (storage: Pick<Storage, 'setItem'>, memberId: string, draft: Draft, keptAt: number): void =>
  storage.setItem(keyOf(memberId), JSON.stringify({ keptAt, draft }));

export const forgetDraft = (storage: Pick<Storage, 'removeItem'>, memberId: string): void => storage.removeItem(keyOf(memberId));

/** What the header suggests for the fields that nobody touched. */
export interface Suggestion {
  readonly title: string;
  readonly bodyRegion: string;
  readonly protocol: string;
}

export const newCaseFrom = (draft: Draft, suggestion: Suggestion): NewCase => ({
  title: (draft.title ?? suggestion.title).trim(),
  scannerId: draft.scannerId,
  coilId: draft.coilId,
  seen: draft.seen,
  direction: draft.direction,
  howOften: draft.howOften,
  cost: draft.cost,
  bodyRegion: draft.bodyRegion ?? suggestion.bodyRegion,
  protocol: draft.protocol ?? suggestion.protocol,
  description: draft.description,
  tried: draft.tried,
  seenOn: draft.seenOn,
  images: draft.images.map((imageId) => ({ imageId, role: 'bad' as const })),
});
