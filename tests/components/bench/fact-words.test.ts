/** Facts with their origin: the words of the look ('from the header', 'worked out', 'doubtful', set by hand). */
import { factText, originWords } from '@/components/bench/fact-words';

describe('a scan fact', () => {
  it('is written as it would be at the console', () => {
    expect([500, 0.9375, true, [0.9375, 0.9375], 'phase', null].map(factText)).toEqual([
      '500',
      '0.9375',
      'yes',
      '0.938 × 0.938',
      'phase',
      '–',
    ]);
  });

  it('says where it came from, unless that is plain', () => {
    expect(originWords({ value: 500, origin: 'header' })).toBeUndefined();
    expect(originWords({ value: 500, origin: 'doubtful', note: 'TR below TE' })).toBe('doubtful: TR below TE');
    expect(originWords({ value: 500, origin: 'member', headerValue: 400 })).toBe('set by hand; the header says 400');
    expect(originWords({ value: 500, origin: 'member', headerValue: null })).toBe('set by hand; the header is silent');
  });
});
