/** The cursor. k = line / (N · Δ) is the discrete Fourier relation; numbers are worked out by hand. */
import { cursorAfterKey, cursorAt, cursorOnGrid, kspacePosition, positionMm } from '@/components/image/cursor';
import { wholeRegion } from '@/components/image/region';

const grid = { rows: 256, columns: 320, spacing: [0.9, 0.8], origin: [-115.2, -128] } as const;
const size = { width: 400, height: 320 };

describe('the cursor', () => {
  it('reads the sample under the pointer', () => {
    expect(cursorAt({ x: 200, y: 160 }, size, wholeRegion(grid), grid)).toEqual({ row: 128, column: 160 });
    expect(cursorAt({ x: 0, y: 319.9 }, size, wholeRegion(grid), grid)).toEqual({ row: 255, column: 0 });
  });

  it('stays on the picture when the pointer leaves it', () => {
    expect(cursorAt({ x: -5, y: 900 }, size, wholeRegion(grid), grid)).toEqual({ row: 255, column: 0 });
  });

  it('reads through a magnified region', () => {
    const region = { top: 64, left: 80, rows: 128, columns: 160 };
    expect(cursorAt({ x: 200, y: 160 }, size, region, grid)).toEqual({ row: 128, column: 160 });
    expect(cursorAt({ x: 0, y: 0 }, size, region, grid)).toEqual({ row: 64, column: 80 });
  });

  it('has its origin in millimetres at floor(N/2)', () => {
    const { x, y } = positionMm({ row: 128, column: 160 }, grid);
    // Decimal fractions in binary: exact to the last bits only.
    expect(x).toBeCloseTo(0, 10);
    expect(y).toBeCloseTo(0, 10);
    expect(positionMm({ row: 0, column: 161 }, grid).x).toBeCloseTo(0.8, 10);
  });

  it('counts lines along the phase encoding and gives cycles per metre', () => {
    const up = kspacePosition({ row: 100, column: 200 }, grid, 'column');
    expect([up.line, up.sample]).toEqual([-28, 40]);
    // −28 lines of a field of view of 0.2304 m, 40 samples of one of 0.256 m.
    expect(up.kPhaseEncode).toBeCloseTo(-28 / 0.2304, 9);
    expect(up.kReadout).toBeCloseTo(40 / 0.256, 9);
  });

  it('swaps line and sample where phase is encoded left to right', () => {
    const across = kspacePosition({ row: 100, column: 200 }, grid, 'row');
    expect([across.line, across.sample]).toEqual([40, -28]);
  });

  it('walks by arrows, ten samples with shift, and stops at the edge', () => {
    const at = { row: 3, column: 5 };
    expect(cursorAfterKey(at, 'ArrowRight', false, grid)).toEqual({ row: 3, column: 6 });
    expect(cursorAfterKey(at, 'ArrowUp', true, grid)).toEqual({ row: 0, column: 5 });
    expect(cursorAfterKey(at, 'Home', false, grid)).toEqual({ row: 128, column: 160 });
    expect(cursorAfterKey(at, 'Enter', false, grid)).toBeNull();
  });

  it('keeps its distance from the centre on a picture with fewer lines', () => {
    const reduced = { ...grid, rows: 128 };
    expect(cursorOnGrid({ row: 128, column: 160 }, grid, reduced)).toEqual({ row: 64, column: 160 });
    expect(cursorOnGrid({ row: 0, column: 160 }, grid, reduced)).toEqual({ row: 0, column: 160 });
  });
});
