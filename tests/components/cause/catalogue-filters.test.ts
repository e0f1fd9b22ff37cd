/** Filters of the sample book: what fits, how many, and how they stand in the address. */
import { fits, isNarrowed, paramsOf, readFilters, seenCounts } from '@/components/cause/catalogue-filters';
import { causeWith } from './causes';

const motion = causeWith({
  id: 'motion',
  title: 'Periodic motion',
  seen: ['ghosts'],
  runsAlong: 'phase-encode',
  drivers: [{ fact: 'TR', does: 'sets the distance of the ghosts' }],
  remedies: [{ change: 'Use respiratory gating', who: 'technologist', price: 'Longer', moves: {} }],
});
const wrap = causeWith({
  id: 'wrap',
  title: 'Wrap-around',
  seen: ['fold-in', 'ghosts'],
  runsAlong: 'phase-encode',
  looks: { image: 'Anatomy of one side on the other', kspace: '' },
  remedies: [{ change: 'Larger field of view', who: 'technologist', price: 'Resolution', moves: {} }],
});
const spike = causeWith({
  id: 'spike',
  title: 'Spike',
  seen: ['lines'],
  runsAlong: 'both',
  remedies: [{ change: 'Find the loose part', who: 'licensed service', price: 'Downtime', moves: {} }],
});
const causes = [motion, wrap, spike];
const any = readFilters({});
const fitting = (part: Partial<typeof any>) => causes.filter((cause) => fits(cause, { ...any, ...part })).map(({ id }) => id);

describe('What fits', () => {
  test('without filters everything does', () => expect(fitting({})).toEqual(['motion', 'wrap', 'spike']));

  test('words are looked for in title, looks, scan facts and remedies, in any case of letters, as parts of words', () => {
    expect(fitting({ q: 'SPIK' })).toEqual(['spike']);
    expect(fitting({ q: 'anatomy' })).toEqual(['wrap']);
    expect(fitting({ q: 'distance of' })).toEqual(['motion']);
    expect(fitting({ q: 'gating' })).toEqual(['motion']);
  });

  test('every word must occur, not necessarily beside the others', () => {
    expect(fitting({ q: 'ghosts larger' })).toEqual(['wrap']);
    expect(fitting({ q: 'ghosts owl' })).toEqual([]);
  });

  test('is seen, runs in the direction and has a remedy for who is asked for', () => {
    expect(fitting({ seen: 'ghosts' })).toEqual(['motion', 'wrap']);
    expect(fitting({ along: 'both' })).toEqual(['spike']);
    expect(fitting({ who: 'licensed service' })).toEqual(['spike']);
    expect(fitting({ seen: 'ghosts', who: 'physicist' })).toEqual([]);
  });
});

test('Counts are those under the other filters, and what no cause shows is not offered', () => {
  expect(seenCounts(causes, { ...any, seen: 'lines', along: 'phase-encode' })).toEqual([
    { seen: '', count: 2 },
    { seen: 'ghosts', count: 2 },
    { seen: 'fold-in', count: 1 },
    { seen: 'lines', count: 0 },
  ]);
});

describe('The address', () => {
  test('leaves out what is any, and gives back what was put in', () => {
    const filters = { q: 'gating', seen: 'ghosts', along: 'phase-encode', who: 'technologist' } as const;
    expect(readFilters(paramsOf(filters))).toEqual(filters);
    expect(paramsOf(any)).toEqual({ q: undefined, seen: undefined, along: undefined, who: undefined });
  });

  test('typed wrong says what it still can', () => {
    const filters = readFilters({ seen: 'owls', along: 'both', who: ['physicist', 'technologist'] });
    expect(filters).toEqual({ q: '', seen: '', along: 'both', who: 'physicist' });
    expect(isNarrowed(filters)).toBe(true);
    expect(isNarrowed(readFilters({ seen: 'owls' }))).toBe(false);
  });
});
