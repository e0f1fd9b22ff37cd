/** Profiles through the cursor: worked out by hand. */
import { centredGrid } from '@/components/image/display-plane';
import { profilePath, profileThrough } from '@/components/image/profile';

const frame = centredGrid(2, 3, [1, 1]);
const plane = { ...frame, name: 'image', low: 0, high: 65535, samples: Uint16Array.of(1, 2, 3, 4, 5, 6) };

describe('a profile', () => {
  it('runs through the cursor along the axis that is asked for', () => {
    expect(profileThrough(plane, { row: 1, column: 2 }, 'columns', frame)).toEqual([4, 5, 6]);
    expect(profileThrough(plane, { row: 1, column: 2 }, 'rows', frame)).toEqual([3, 6]);
  });

  it('has a gap where a plane does not reach', () => {
    const narrow = { ...plane, ...centredGrid(2, 1, [1, 1]), samples: Uint16Array.of(7, 8) };
    expect(profileThrough(narrow, { row: 0, column: 0 }, 'columns', frame)).toEqual([null, 7, null]);
  });

  it('is drawn from left to right within its range, and lifted over gaps', () => {
    expect(profilePath([0, null, 5, 20], [0, 10], 40, 10)).toBe('M5.0 10.0M25.0 5.0L35.0 0.0');
  });
});
