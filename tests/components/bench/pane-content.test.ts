/** What a pane shows under each compare mode; the words that keep k-space of an image apart from raw data. */
import { cautionOf, contentOf } from '@/components/bench/pane-content';
import { layersOf } from '@/components/image/layers';
import { greyTable } from '@/components/image/colour-table';

const divided = { compare: 'divider', divider: 0.5, kspaceOf: 'image' } as const;
const magnitude = { component: 'magnitude', kspace: 'derived', frameFacts: [] } as const;
const frameFacts = ['combined', 'coil 1'].map((label) => ({
  positionMm: null,
  timeOfDay: null,
  triggerDelayMs: null,
  echoTimeMs: null,
  label,
}));
const raw = { component: 'complex', kspace: 'raw', frameFacts } as const;

describe('a pane', () => {
  it('shows both pictures at a divider, and one alone at its ends', () => {
    expect(contentOf('image', divided, 'bad', true, magnitude)).toBe('both');
    expect(contentOf('image', { ...divided, divider: 1 }, 'bad', true, magnitude)).toBe('bad');
    expect(contentOf('image', { ...divided, divider: 0 }, 'bad', true, magnitude)).toBe('simulated');
  });

  it('turns from one picture to the other when it blinks', () => {
    const blinking = { ...divided, compare: 'blink' } as const;
    expect([true, false].map((toBad) => contentOf('image', blinking, 'bad', toBad, magnitude))).toEqual(['bad', 'simulated']);
  });

  it('never divides or subtracts samples as acquired: the bad image has none', () => {
    const acquired = { ...divided, kspaceOf: 'acquired' } as const;
    expect(contentOf('kspace', acquired, 'bad', true, magnitude)).toBe('simulated');
    expect(contentOf('kspace', { ...acquired, compare: 'difference' }, 'bad', true, magnitude)).toBe('simulated');
    expect(contentOf('kspace', { ...acquired, compare: 'side-by-side' }, 'bad', true, magnitude)).toBe('bad');
  });

  it('calls the k-space of a magnitude image what it is', () => {
    const acquired = { kspaceOf: 'acquired', badFrame: 0 } as const;
    expect(cautionOf('kspace', 'both', { kspaceOf: 'image', badFrame: 0 }, magnitude)).toBe('of the image, not raw data');
    expect(cautionOf('kspace', 'simulated', acquired, magnitude)).toBe('as acquired');
    expect(cautionOf('kspace', 'bad', acquired, magnitude)).toBe('of the image, not raw data');
    expect(cautionOf('kspace', 'bad', acquired, { ...magnitude, component: 'complex' })).toBe('of the complex image, not raw data');
  });

  it('calls samples raw data, all coils together worked out of them, and the transform of a magnitude neither', () => {
    expect(cautionOf('kspace', 'bad', { kspaceOf: 'acquired', badFrame: 1 }, raw)).toBe('the scanner’s raw data');
    expect(cautionOf('kspace', 'bad', { kspaceOf: 'acquired', badFrame: 0 }, raw)).toBe('all coils, of raw data');
    expect(cautionOf('kspace', 'bad', { kspaceOf: 'image', badFrame: 1 }, raw)).toBe('of the image, not raw data');
  });

  it('divides samples as acquired where the bad image is complex', () => {
    expect(contentOf('kspace', { ...divided, kspaceOf: 'acquired' }, 'bad', true, raw)).toBe('both');
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
