import { orderedBy, paramsOf, queryOf, readFilters } from '@/components/case/list/filters';

const scanner = '3f0c9a52-6d0b-4c57-9a2e-0b8f3f1d2c11';

describe('the filters of the list', () => {
  test('come from the address and go back into it', () => {
    const params = { q: 'ghost', state: 'closed', scanner, seen: 'ghosts', order: 'number', down: 'true', limit: '100' };
    expect(paramsOf(readFilters(params))).toEqual(params);
  });

  test('leave the address bare when all is as usual', () => {
    expect(Object.values(paramsOf(readFilters({}))).filter((value) => value !== undefined)).toEqual([]);
  });

  test('fall back where the address was typed wrong', () => {
    const filters = readFilters({ state: 'burning', scanner: "' or 1=1", seen: 'unicorns', order: 'colour', limit: '9999' });
    expect(filters).toEqual(readFilters({}));
  });

  test('ask the server in its own words', () => {
    expect(queryOf(readFilters({ scanner, down: 'true' }))).toMatchObject({
      state: 'open',
      scannerId: scanner,
      order: 'age',
      descending: 'true',
    });
  });

  test('turn the order round when the same head is pressed again, and start upwards with another', () => {
    const byNumber = orderedBy(readFilters({}), 'number');
    expect([byNumber.order, byNumber.descending]).toEqual(['number', false]);
    expect(orderedBy(byNumber, 'number').descending).toBe(true);
    expect(orderedBy(orderedBy(byNumber, 'number'), 'title').descending).toBe(false);
  });
});
