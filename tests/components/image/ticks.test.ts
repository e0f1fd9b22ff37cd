/** Ticks and rungs: 1-2-5 steps are common practice of every ruler; positions are worked out by hand. */
import { binaryStep, decimalStep, numbered, rungsOf, ticksOf } from '@/components/image/ticks';

describe('rulers', () => {
  it('number every 50 mm of a 230 mm field on 400 pixels, with a tick every 10 mm', () => {
    expect(decimalStep(230, 400, 60)).toEqual({ major: 50, nMinor: 5 });
  });

  it('go to 100 mm when there is room for few numbers', () => {
    expect(decimalStep(230, 192, 60).major).toBe(100);
  });

  it('divide a step of two into four', () => {
    expect(decimalStep(1100, 400, 60)).toEqual({ major: 200, nMinor: 4 });
  });

  it('count lines of k-space in powers of two', () => {
    expect(binaryStep(256, 400, 48)).toEqual({ major: 32, nMinor: 4 });
  });

  it('place the value of zero in the middle of a symmetric edge', () => {
    const ticks = ticksOf({ first: -115, last: 115, length: 400 }, { major: 50, nMinor: 5 });
    expect(ticks.find(({ value }) => value === 0)).toMatchObject({ at: 200, isMajor: true });
    expect(ticks.filter(({ isMajor }) => isMajor).map(({ value }) => value)).toEqual([-100, -50, 0, 50, 100]);
    expect(ticks).toHaveLength(23);
  });

  it('leave out numbers that would run into the words or over the end', () => {
    const ticks = ticksOf({ first: -100, last: 100, length: 200 }, { major: 50, nMinor: 5 });
    expect(numbered(ticks, 200, 40, 20).map(({ value }) => value)).toEqual([-50, 50]);
  });
});

describe('the ladder', () => {
  it('has a rung for every eighth line, clear of the arrow heads', () => {
    // 256 lines on 400 pixels: every 12.5 pixels, 33 positions of which the first and the last lie under a head.
    const rungs = rungsOf(0, 256, 400, 8);
    expect(rungs).toHaveLength(31);
    expect(rungs[0]).toBe(12.5);
  });

  it('keeps its rungs on the lines while the picture is magnified', () => {
    expect(rungsOf(60, 32, 320, 8)).toEqual([40, 120, 200, 280]);
  });
});
