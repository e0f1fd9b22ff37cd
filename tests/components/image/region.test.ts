/** Zoom, pan and placing one grid on another: plane geometry, worked out by hand. */
import { magnification, panRegion, placement, wholeRegion, zoomRegion } from '@/components/image/region';

const grid = { rows: 200, columns: 100, spacing: [1, 2], origin: [-100, -100] } as const;

describe('the visible region', () => {
  it('keeps the sample under the pointer in its place while it magnifies', () => {
    const zoomed = zoomRegion(wholeRegion(grid), 2, { x: 0.25, y: 0.75 }, grid);
    expect(zoomed).toEqual({ rows: 100, columns: 50, top: 75, left: 12.5 });
    expect(magnification(zoomed, grid)).toBe(2);
  });

  it('never shows anything beside the picture', () => {
    const corner = zoomRegion(wholeRegion(grid), 2, { x: 0, y: 0 }, grid);
    expect(panRegion(corner, 1, 1, grid)).toEqual(corner);
    expect(zoomRegion(corner, 0.1, { x: 1, y: 1 }, grid)).toEqual(wholeRegion(grid));
  });

  it('moves with the hand', () => {
    const middle = zoomRegion(wholeRegion(grid), 2, { x: 0.5, y: 0.5 }, grid);
    expect(panRegion(middle, 0.1, 0, grid).left).toBeCloseTo(middle.left - 5, 12);
  });

  it('stops magnifying at sixteen samples', () => {
    expect(zoomRegion(wholeRegion(grid), 1e6, { x: 0.5, y: 0.5 }, grid).columns).toBe(16);
  });
});

describe('a plane on a picture of another grid', () => {
  it('covers a picture of the same grid', () => {
    expect(placement(grid, grid, wholeRegion(grid))).toEqual({ left: 0, top: 0, width: 1, height: 1 });
  });

  it('lies where its millimetres are: half the lines, centred', () => {
    const half = { ...grid, rows: 100, origin: [-50, -100] } as const;
    const placed = placement(half, grid, wholeRegion(grid));
    expect(placed).toEqual({ left: 0, top: 0.25, width: 1, height: 0.5 });
  });
});
