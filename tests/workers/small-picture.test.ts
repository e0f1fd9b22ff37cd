/** Small pictures: what they show, and that a simulated one says so. */
import { decode } from 'fast-png';
import { smallPicture } from '../../workers/small-picture';

const drawn = (
  values: ArrayLike<number>,
  rows: number,
  columns: number,
  extra: { spacing?: [number, number]; simulated?: boolean } = {},
) => {
  const { spacing = [1, 1], simulated } = extra;
  return decode(smallPicture({ values: Float64Array.from(values), grid: { rows, columns, spacing }, window: [0, 100], simulated }));
};

it('values between the ends of the window become grey levels, those beyond are clipped', () => {
  const { width, height, data } = drawn([-50, 0, 60, 100, 400, 20], 2, 3);
  expect([width, height, ...data]).toEqual([3, 2, 0, 0, 153, 255, 255, 51]);
});

it('a picture is reduced by the mean over the area of a pixel, so that a fine texture becomes an even grey', () => {
  const side = 288;
  const checkerboard = Float64Array.from({ length: side * side }, (_, i) => ((i + Math.floor(i / side)) % 2) * 100);
  const { width, data } = drawn(checkerboard, side, side);
  expect(width).toBe(192);
  // 288/192 = 1.5 samples a pixel, 2.25 in area: of the two tones, 1.25 or 1 of 2.25 each.
  expect([...new Set(data)].sort((a, b) => a - b)).toEqual([Math.round((255 * 1) / 2.25), Math.round((255 * 1.25) / 2.25)]);
});

it('oblong pixels are drawn in the proportions of space', () => {
  const { width, height } = drawn(new Float64Array(100 * 50), 100, 50, { spacing: [1, 2] });
  expect([width, height]).toEqual([100, 100]);
});

describe('a simulated picture', () => {
  const simulated = drawn(new Float64Array(64 * 64).fill(60), 64, 64, { simulated: true });
  const at = (x: number, y: number) => simulated.data[y * simulated.width + x];

  it('carries the word SIMULATED at its foot, white on black', () => {
    const rows = Array.from({ length: 7 }, (_, y) =>
      Array.from({ length: 53 }, (__, x) => (at(5 + x, 64 - 9 + y) === 255 ? '#' : ' ')).join(''),
    );
    expect(rows).toEqual([
      ' ###   ###  #   # #   # #      ###  ##### ##### #### ',
      '#   #   #   ## ## #   # #     #   #   #   #     #   #',
      '#       #   # # # #   # #     #   #   #   #     #   #',
      ' ###    #   # # # #   # #     #####   #   ####  #   #',
      '    #   #   #   # #   # #     #   #   #   #     #   #',
      '#   #   #   #   # #   # #     #   #   #   #     #   #',
      ' ###   ###  #   #  ###  ##### #   #   #   ##### #### ',
    ]);
  });

  it('has a dashed frame, and is as it was inside', () => {
    expect(Array.from({ length: 12 }, (_, x) => at(x, 0))).toEqual([255, 255, 255, 255, 0, 0, 0, 0, 255, 255, 255, 255]);
    expect(at(30, 30)).toBe(153);
  });

  it('that is too small for the word still has the frame', () => {
    const { data } = drawn(new Float64Array(16 * 16).fill(60), 16, 16, { simulated: true });
    expect([...data.slice(0, 6)]).toEqual([255, 255, 255, 255, 0, 0]);
  });
});
