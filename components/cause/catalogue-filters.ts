/**
 * What the sample book shows, as it stands in the address: words, what is seen, the direction, who can act. Filtering picks, it never
 * sorts. An address that was typed wrong falls back to what it can still say.
 */
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { sightings, type Sighting } from '@/server/contract/sighting';
import { sightingWords } from '../case/words';
import { actors, alongs, alongWords, type Actor, type Along } from './cause-words';
import { stageWords } from './stage-words';

/** Empty means any. */
export interface CatalogueFilters {
  readonly q: string;
  readonly seen: Sighting | '';
  readonly along: Along | '';
  readonly who: Actor | '';
}

export type Params = Readonly<Record<string, string | string[] | undefined>>;

const one = (params: Params, name: string): string => {
  const value = params[name];
  return (Array.isArray(value) ? value[0] : value) ?? '';
};
const oneOf = <Value extends string>(values: readonly Value[], text: string): Value | '' => values.find((value) => value === text) ?? '';

export const readFilters = (params: Params): CatalogueFilters => ({
  q: one(params, 'q').slice(0, 200),
  seen: oneOf(sightings, one(params, 'seen')),
  along: oneOf(alongs, one(params, 'along')),
  who: oneOf(actors, one(params, 'who')),
});

/** The address of these filters; what is any is left out of it. */
export const paramsOf = ({ q, seen, along, who }: CatalogueFilters): Record<string, string | undefined> => ({
  q: q || undefined,
  seen: seen || undefined,
  along: along || undefined,
  who: who || undefined,
});

export const isNarrowed = ({ q, seen, along, who }: CatalogueFilters): boolean => Boolean(q || seen || along || who);

/** Everything that is written about a cause. */
const writtenOf = ({ title, stage, seen, runsAlong, looks, drivers, remedies, parameters, sources }: CatalogueEntry): string =>
  [
    title,
    stageWords[stage],
    alongWords[runsAlong],
    ...seen.map((sighting) => sightingWords[sighting]),
    looks.image,
    looks.kspace,
    ...drivers.flatMap(({ fact, does }) => [fact, does]),
    ...remedies.flatMap(({ change, who, price }) => [change, who, price]),
    ...parameters.map(({ label }) => label),
    ...sources.map(({ citation }) => citation),
  ]
    .join('\n')
    .toLowerCase();

/** Whether every word occurs somewhere in what is written: parts of words count, so that a search works while it is being typed. */
const says = (cause: CatalogueEntry, q: string): boolean => {
  const written = writtenOf(cause);
  return q
    .toLowerCase()
    .split(/\s+/)
    .every((word) => written.includes(word));
};

export const fits = (cause: CatalogueEntry, { q, seen, along, who }: CatalogueFilters): boolean =>
  (seen === '' || cause.seen.includes(seen)) &&
  (along === '' || cause.runsAlong === along) &&
  (who === '' || cause.remedies.some((remedy) => remedy.who === who)) &&
  says(cause, q);

/** How many causes show each thing under the other filters; things that no cause of the catalogue shows are left out. */
export function seenCounts(causes: readonly CatalogueEntry[], filters: CatalogueFilters): { seen: Sighting | ''; count: number }[] {
  const countOf = (seen: Sighting | ''): number => causes.filter((cause) => fits(cause, { ...filters, seen })).length;
  const shown = sightings.filter((seen) => causes.some((cause) => cause.seen.includes(seen)));
  return (['', ...shown] as const).map((seen) => ({ seen, count: countOf(seen) }));
}
