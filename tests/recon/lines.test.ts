/** Lines of a plane: where they lie in memory, and that what is made of a plane is a copy. */
import { fullyTaken, keepLines, linesAlong, linesOf, takenOrder } from '../../recon/lines';
import { noisePlane } from './planes';

test('Lines are rows where the row index is phase encoded, columns where the column index is; the centre line is floor(n/2)', () => {
  expect(linesOf({ rows: 7, columns: 4 }, { phaseEncode: 'column' })).toEqual({
    nLines: 7,
    centre: 3,
    samplesPerLine: 4,
    lineStride: 4,
    sampleStride: 1,
  });
  expect(linesOf({ rows: 7, columns: 4 }, { phaseEncode: 'row' })).toEqual({
    nLines: 4,
    centre: 2,
    samplesPerLine: 7,
    lineStride: 1,
    sampleStride: 4,
  });
});

test('Along the readout lines are those of the other axis', () => {
  const grid = { rows: 7, columns: 4 };
  expect(linesAlong(grid, { phaseEncode: 'row' }, 'readout')).toEqual(linesOf(grid, { phaseEncode: 'column' }));
  expect(linesAlong(grid, { phaseEncode: 'row' }, 'phase-encode')).toEqual(linesOf(grid, { phaseEncode: 'row' }));
});

test('A plane of which all is taken is a copy: what is done to it leaves the plane as it was', () => {
  const plane = noisePlane(4, 3);
  const taken = fullyTaken(plane);
  expect(taken.re).not.toBe(plane.re);
  expect(taken.im).not.toBe(plane.im);
  expect([taken.re, taken.im]).toEqual([plane.re, plane.im]);
});

test('The order of lines passes over those that are not taken', () => {
  const lines = linesOf({ rows: 6, columns: 2 }, { phaseEncode: 'column' });
  const kept = keepLines(fullyTaken(noisePlane(6, 2)), lines, (line) => line % 2 === 1);
  expect(Array.from(takenOrder(kept, lines))).toEqual([-1, 0, -1, 1, -1, 2]);
});
