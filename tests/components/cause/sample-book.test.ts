/** Where swatches stand, and what is said about them. */
import { bookColumns, nameLine, pictureWidth, swatchEdges, swatchPitch } from '@/components/cause/book-columns';
import { movedWords } from '@/components/cause/moved-words';
import { causesByStage } from '@/components/cause/stage-words';
import { causeWith } from './causes';

test('The columns of the book share the width that there is, and never fall under one swatch', () => {
  const total = (room: number) => Object.values(bookColumns(room)).reduce((sum, n) => sum + n, 0);
  expect(total(0)).toBe(5);
  expect(total(9 * swatchPitch + 20)).toBe(9);
  // 1440 less the rail of 88, two gutters of 24 and 190 for the names of the stages leaves 1114.
  expect(bookColumns(1114)).toEqual({ 'phase-encode': 3, readout: 2, both: 2, none: 2 });
});

test('On a phone of 390 pixels three swatches stand beside each other, and fill the line', () => {
  // 390 less two gutters of 16 and 24 for the warp.
  const room = 390 - 2 * 16 - 24;
  const width = pictureWidth(room);
  expect(3 * (width + swatchEdges) + 2 * 8).toBeLessThanOrEqual(room);
  expect(4 * (84 + swatchEdges) + 3 * 8).toBeGreaterThan(room);
});

test('A stage without a cause has no row, and causes keep the order of the catalogue', () => {
  const causes = [
    causeWith({ id: 'c', stage: 'receive' }),
    causeWith({ id: 'a', stage: 'object' }),
    causeWith({ id: 'b', stage: 'receive' }),
  ];
  expect(causesByStage(causes).map(({ stage, causes: of }) => [stage, of.map(({ id }) => id)])).toEqual([
    ['object', ['a']],
    ['receive', ['c', 'b']],
  ]);
});

test('The line of names has small letters after the first, but not in an abbreviation', () => {
  const causes = ['Noise', 'Wrap-around', 'RF line', 'N/2 ghost'].map((title) => causeWith({ id: title, title }));
  expect(nameLine(causes)).toBe('Noise, wrap-around, RF line, N/2 ghost');
});

test('The slider says what it moves: on the step, in units, with a real minus sign', () => {
  const cause = causeWith({
    id: 'shift',
    strength: [{ label: 'Shift', unit: 'mm', min: -20, max: 20, step: 0.5, mild: -1, strong: -8 }],
  });
  expect(movedWords(cause, 0)).toBe('shift −1.0 mm');
  expect(movedWords(cause, 0.5)).toBe('shift −4.5 mm');
});
