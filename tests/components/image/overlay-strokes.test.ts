/** Strokes on a picture: the look's own measures (13-pixel cursor, casing 1 px on both sides). */
import { cursorStroke, dividerStroke, markStrokes } from '@/components/image/overlay-strokes';

describe('strokes on a picture', () => {
  it('draw the cursor as an open square of 13 pixels around the sample', () => {
    expect(cursorStroke({ x: 100, y: 50 }, 1.5).path).toBe('M93.5 43.5H106.5V56.5H93.5Z');
  });

  it('let the cursor grow around a magnified sample', () => {
    expect(cursorStroke({ x: 100, y: 100 }, 20).path).toBe('M87.5 87.5H112.5V112.5H87.5Z');
  });

  it('stitch the divider and give it a casing', () => {
    expect(dividerStroke(224, 400)).toMatchObject({ path: 'M224 0V400', dash: [4, 3], casing: 4 });
  });

  it('close a ruler with bars across its ends', () => {
    const [stroke] = markStrokes('ruler', [
      { x: 10, y: 20 },
      { x: 110, y: 20 },
    ]);
    expect(stroke?.path).toBe('M10 20L110 20M10 13L10 27M110 13L110 27');
  });

  it('put an ellipse into the box between its two points, whichever way it was drawn', () => {
    const box = (points: [number, number][]) =>
      markStrokes(
        'ellipse',
        points.map(([x, y]) => ({ x, y })),
      )[0]?.path;
    expect(
      box([
        [0, 0],
        [20, 10],
      ]),
    ).toBe('M0 5A10 5 0 1 1 20 5A10 5 0 1 1 0 5Z');
    expect(
      box([
        [20, 10],
        [0, 0],
      ]),
    ).toBe('M0 5A10 5 0 1 1 20 5A10 5 0 1 1 0 5Z');
  });

  it('draw nothing for words: they stand beside their point', () => {
    expect(markStrokes('text', [{ x: 1, y: 1 }])).toEqual([]);
  });
});
