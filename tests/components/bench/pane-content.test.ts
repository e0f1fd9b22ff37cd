/** What a pane shows under each compare mode; the words that keep k-space of an image apart from raw data. */
import { cautionOf, contentOf } from '@/components/bench/pane-content';
import { layersOf } from '@/components/image/layers';
import { greyTable } from '@/components/image/colour-table';

const divided = { compare: 'divider', divider: 0.5, kspaceOf: 'image' } as const;

describe('a pane', () => {
  it('shows both pictures at a divider, and one alone at its ends', () => {
    expect(contentOf('image', divided, 'bad', true)).toBe('both');
    expect(contentOf('image', { ...divided, divider: 1 }, 'bad', true)).toBe('bad');
    expect(contentOf('image', { ...divided, divider: 0 }, 'bad', true)).toBe('simulated');
  });

  it('turns from one picture to the other when it blinks', () => {
    const blinking = { ...divided, compare: 'blink' } as const;
    expect([true, false].map((toBad) => contentOf('image', blinking, 'bad', toBad))).toEqual(['bad', 'simulated']);
  });

  it('never divides or subtracts samples as acquired: the bad image has none', () => {
    const acquired = { ...divided, kspaceOf: 'acquired' } as const;
    expect(contentOf('kspace', acquired, 'bad', true)).toBe('simulated');
    expect(contentOf('kspace', { ...acquired, compare: 'difference' }, 'bad', true)).toBe('simulated');
    expect(contentOf('kspace', { ...acquired, compare: 'side-by-side' }, 'bad', true)).toBe('bad');
  });

  it('calls the k-space of a magnitude image what it is', () => {
    expect(cautionOf('kspace', 'both', divided)).toBe('of the image, not raw data');
    expect(cautionOf('kspace', 'simulated', { kspaceOf: 'acquired' })).toBe('as acquired');
    expect(cautionOf('kspace', 'bad', { kspaceOf: 'acquired' })).toBe('of the image, not raw data');
  });
});

describe('the layers of a pane', () => {
  const plane = {
    name: 'image',
    rows: 1,
    columns: 1,
    spacing: [1, 1],
    origin: [0, 0],
    low: 0,
    high: 1,
    samples: Uint16Array.of(0),
  } as const;
  const shown = { plane, table: greyTable({ width: 1, level: 0.5 }, 0, 1) };
  const all = { bad: shown, simulated: shown, difference: shown };

  it('meet at the divider, the bad picture at the left', () => {
    expect(layersOf('both', 0.3, all).map(({ name, from, to }) => [name, from, to])).toEqual([
      ['bad', 0, 0.3],
      ['simulated', 0.3, 1],
    ]);
  });

  it('leave out what is not there yet', () => {
    expect(layersOf('both', 0.3, { ...all, simulated: null }).map(({ name }) => name)).toEqual(['bad']);
    expect(layersOf('difference', 0.3, { ...all, difference: null })).toEqual([]);
  });
});
