/** Window and level: common practice on viewing stations; values worked out by hand. */
import { dragWindow, windowOfRange, windowUnderGain } from '@/components/image/window-level';

describe('window and level', () => {
  it('show the two ends of a range as black and white', () => {
    expect(windowOfRange(100, 300)).toEqual({ width: 200, level: 200 });
  });

  it('give an empty range a width, so that a uniform picture can be shown', () => {
    expect(windowOfRange(7, 7)).toEqual({ width: 1, level: 7 });
  });

  it('double the window on a drag across the whole picture to the right', () => {
    expect(dragWindow({ width: 200, level: 200 }, 1, 0)).toEqual({ width: 400, level: 200 });
  });

  it('lower the level by one window on a drag up the whole picture, which brightens it', () => {
    expect(dragWindow({ width: 200, level: 200 }, 0, -1)).toEqual({ width: 200, level: 0 });
  });

  it('never turn the picture inside out', () => {
    expect(dragWindow({ width: 200, level: 200 }, -3, 0).width).toBe(2);
  });

  it('show a simulated picture of half the gain under half the window', () => {
    expect(windowUnderGain({ width: 200, level: 100 }, 2)).toEqual({ width: 100, level: 50 });
  });

  it('stay as they are where no gain is known', () => {
    expect(windowUnderGain({ width: 200, level: 100 }, null)).toEqual({ width: 200, level: 100 });
    expect(windowUnderGain({ width: 200, level: 100 }, 0)).toEqual({ width: 200, level: 100 });
  });
});
