/**
 * What the list of cases shows, as it stands in the address: words, state, scanner, what was seen, the order, how many. An address
 * that was typed wrong falls back to what it can still say.
 */
import { caseOrders, caseStates } from '@/server/contract/cases';
import { sightings } from '@/server/contract/sighting';
import type { CaseQuery } from '@/components/api/cases';

export const pageSize = 50;

export type CaseOrder = (typeof caseOrders)[number];
export interface CaseFilters {
  readonly q: string;
  readonly state: 'open' | (typeof caseStates)[number];
  readonly scannerId: string;
  readonly seen: (typeof sightings)[number] | '';
  readonly order: CaseOrder;
  readonly descending: boolean;
  readonly limit: number;
}

export type Params = Readonly<Record<string, string | string[] | undefined>>;

const one = (params: Params, name: string): string => {
  const value = params[name];
  return (Array.isArray(value) ? value[0] : value) ?? '';
};
const oneOf = <Value extends string>(values: readonly Value[], text: string): Value | undefined => values.find((value) => value === text);
const uuid = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

export function readFilters(params: Params): CaseFilters {
  const scannerId = one(params, 'scanner');
  const limit = Number(one(params, 'limit'));
  return {
    q: one(params, 'q').slice(0, 200),
    state: oneOf(['open', ...caseStates], one(params, 'state')) ?? 'open',
    scannerId: uuid.test(scannerId) ? scannerId : '',
    seen: oneOf(sightings, one(params, 'seen')) ?? '',
    order: oneOf(caseOrders, one(params, 'order')) ?? 'age',
    descending: one(params, 'down') === 'true',
    limit: Number.isInteger(limit) && limit > pageSize && limit <= 200 ? limit : pageSize,
  };
}

/** The address of these filters; what is as usual is left out of it. */
export const paramsOf = (filters: CaseFilters): Record<string, string | undefined> => ({
  q: filters.q || undefined,
  state: filters.state === 'open' ? undefined : filters.state,
  scanner: filters.scannerId || undefined,
  seen: filters.seen || undefined,
  order: filters.order === 'age' ? undefined : filters.order,
  down: filters.descending ? 'true' : undefined,
  limit: filters.limit === pageSize ? undefined : String(filters.limit),
});

export const queryOf = (filters: CaseFilters): CaseQuery => ({
  q: filters.q || undefined,
  state: filters.state,
  scannerId: filters.scannerId || undefined,
  seen: filters.seen || undefined,
  order: filters.order,
  descending: filters.descending ? 'true' : 'false',
  limit: filters.limit,
});

/** Whether anything but the state narrows the list. */
export const isNarrowed = (filters: CaseFilters): boolean => Boolean(filters.q || filters.scannerId || filters.seen);

/** Pressing the head of a column orders by it; pressing it again turns the order round. */
export const orderedBy = (filters: CaseFilters, order: CaseOrder): CaseFilters => ({
  ...filters,
  order,
  descending: filters.order === order ? !filters.descending : false,
});
