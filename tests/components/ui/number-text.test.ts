/** Numbers of the bench: SI practice (a real minus sign), worked out by hand. */
import { decimalsOf, fixed, parseNumber, significant } from '@/components/ui/number-text';

describe('numbers on the bench', () => {
  it('carry a real minus sign, and none before zero', () => {
    expect(fixed(-51.2, 1)).toBe('\u221251.2');
    expect(fixed(-0.001, 1)).toBe('0.0');
  });

  it('show as many decimals as the step of their control', () => {
    expect([1, 5, 0.5, 0.05, 0.001, 0.25].map(decimalsOf)).toEqual([0, 0, 1, 2, 3, 2]);
  });

  it('keep three digits of a measured value', () => {
    expect([0.3514, 38.64, 1204.4, 0, -0.00123].map((value) => significant(value))).toEqual([
      '0.351',
      '38.6',
      '1204',
      '0',
      '\u22120.00123',
    ]);
  });

  it('are read with hyphen, minus sign or decimal comma, and refused otherwise', () => {
    expect([' -1.5', '\u22121.5', '0,25', '.5', '1e2'].map(parseNumber)).toEqual([-1.5, -1.5, 0.25, 0.5, 100]);
    expect(['', '1.2.3', 'five', '-', '1 000'].map(parseNumber)).toEqual([null, null, null, null, null]);
  });
});
