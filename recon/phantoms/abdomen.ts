/**
 * A slice through the upper abdomen, our own, seen from the feet: body wall with fat, muscles, ribs, liver with vessels, stomach,
 * bowel, spleen, pancreas, kidneys, the great vessels, spine and cord. No two organs overlap, so that every pixel is filled once.
 */
import type { Material } from './material';
import { closedCurve, disc, mirrored, oval, type Pair } from './outline';
import type { Amounts, MaterialShape, Phantom } from './phantom';
import { replaces } from './phantom';
import { randomOf } from '../random';
import { taper } from './stroke';
import { tissues } from './tissues';

const { skin, fat, muscle, bone, marrow, liver, spleen, pancreas, kidneyCortex, kidneyMedulla, blood, fluid, cord, bile, stomachFluid } =
  tissues;

const shape = (outline: MaterialShape['outline'], adds: Amounts): MaterialShape => ({ outline, adds });
const both = (outline: MaterialShape['outline'], adds: Amounts): MaterialShape[] => [shape(outline, adds), shape(mirrored(outline), adds)];

/** A closed curve from its right half, given as x, y, x, y … from the top down to the bottom. */
function symmetric(right: readonly number[]): MaterialShape['outline'] {
  const left: number[] = [];
  for (let i = right.length - 2; i >= 0; i -= 2) {
    const [x = 0, y = 0] = right.slice(i, i + 2);
    if (x > 0) left.push(-x, y);
  }
  return closedCurve([...right, ...left]);
}

const wall: readonly MaterialShape[] = [
  shape(symmetric([0, -116, 70, -110, 128, -82, 164, -30, 170, 24, 148, 76, 98, 106, 40, 113, 0, 108]), [[skin, 1]]),
  shape(
    symmetric([0, -113.8, 69, -107.8, 126.4, -80.4, 161.8, -29.5, 167.8, 23.7, 146.2, 74.6, 97, 103.9, 39.6, 110.8, 0, 105.8]),
    replaces(fat, skin),
  ),
  shape(symmetric([0, -96, 62, -93, 114, -69, 146, -24, 151, 22, 133, 66, 92, 92, 40, 100, 0, 95]), replaces(muscle, fat)),
  shape(symmetric([0, -88, 58, -86, 106, -64, 136, -22, 141, 20, 125, 58, 84, 70, 58, 52, 34, 34, 0, 28]), replaces(fat, muscle)),
  // The seam of the muscles in front, and fat between the muscles of the back.
  shape(oval([4, 2.6], [0, -92.2]), replaces(fat, muscle)),
  ...both(oval([1.4, 14], [47, 84], 20), replaces(fat, muscle, 0.8)),
  ...both(oval([1.2, 9], [70, 80], 50), replaces(fat, muscle, 0.8)),
];

/** Ribs cut aslant: a rim of bone about marrow, within the muscle of the wall. */
const ribs: readonly MaterialShape[] = (
  [
    [126.5, -50, 55],
    [144.9, -2, 85],
    [141, 40, 110],
    [112, 77.5, 146],
  ] as const
).flatMap(([x, y, degrees]) => [
  ...both(oval([10, 3.7], [x, y], degrees), replaces(bone, muscle)),
  ...both(oval([8.6, 2.3], [x, y], degrees), replaces(marrow, bone)),
]);

const spine: readonly MaterialShape[] = [
  shape(closedCurve([0, 31, 15, 33.5, 22, 43, 20, 55, 10, 60, 0, 58.4, -10, 60, -20, 55, -22, 43, -15, 33.5]), replaces(bone, muscle)),
  shape(
    closedCurve([0, 32.6, 14.2, 35, 20.4, 43.4, 18.5, 54, 9.6, 58.3, 0, 56.8, -9.6, 58.3, -18.5, 54, -20.4, 43.4, -14.2, 35]),
    replaces(marrow, bone),
  ),
  shape(oval([10.6, 8.4], [0, 69.4]), replaces(fluid, muscle)),
  shape(oval([5.2, 4.2], [0, 69.6]), replaces(cord, fluid)),
  ...both(oval([12, 2.8], [23, 70], 16), replaces(bone, muscle)),
  ...both(oval([9.8, 1.2], [23.4, 70], 16), replaces(marrow, bone)),
  shape(oval([3.2, 8], [0, 86]), replaces(bone, muscle)),
  shape(oval([1.7, 6.4], [0, 86]), replaces(marrow, bone)),
];

const organ = (points: readonly number[], content: Material): MaterialShape => shape(closedCurve(points), replaces(content, fat));

const organs: readonly MaterialShape[] = [
  organ(
    [
      -129, -12, -114, -44, -91, -67, -54, -81, -10, -82, 26, -76, 38, -62, 20, -50, -4, -36, -22, -14, -38, 1, -58, 8, -80, 9.5, -97, 14,
      -103, 27, -105, 44, -114, 52, -126, 38, -133, 14,
    ],
    liver,
  ),
  organ([126, -2, 134, 14, 130, 38, 116, 56, 100, 58, 108, 44, 110, 26, 112, 8], spleen),
  organ([48, -70, 74, -74, 104, -56, 118, -30, 112, -10, 92, -8, 76, -22, 56, -34, 42, -48], muscle),
  organ([-16, -6, 2, -20, 26, -24, 52, -18, 80, 0, 96, 8, 92, 15, 72, 12, 48, -4, 24, -8, 4, -2, -10, 6], pancreas),
];

/** Stomach: a wall of muscle about fluid with a bubble of air, which rises to the front of a patient on the back. */
const stomach: readonly MaterialShape[] = [
  shape(
    closedCurve([50, -66, 74, -70, 101, -53.5, 114, -30, 109.5, -13.5, 94, -12, 78, -25.5, 58, -38, 46, -50]),
    replaces(stomachFluid, muscle),
  ),
  shape(oval([21, 7], [75, -58.5], 16), [[stomachFluid, -1]]),
];

const kidney = closedCurve([64, 24, 75, 16, 90, 20, 97, 36, 91, 53, 78, 58, 67, 53, 70, 44, 71, 38, 68, 32]);
const pyramids = (
  [
    [77, 24.5, 105],
    [87, 28, 55],
    [91, 38, 5],
    [87, 47.5, -45],
    [78, 51, -85],
  ] as const
).flatMap(([x, y, degrees]) => both(oval([5, 3.4], [x, y], degrees), replaces(kidneyMedulla, kidneyCortex)));
const kidneys: readonly MaterialShape[] = [...both(kidney, replaces(kidneyCortex, fat)), ...pyramids];

/** Gall bladder, in its bed under the liver. */
const gallBladder = shape(oval([9, 5], [-41, -12], -40), replaces(bile, liver));

/** Loops of bowel between stomach and pancreas: a wall about its content. */
const bowel: readonly MaterialShape[] = (
  [
    [8, 6.6, 30, -45, 0],
    [9, 5.2, 10, -33, 24],
  ] as const
).flatMap(([a, b, x, y, degrees]) => [
  shape(oval([a, b], [x, y], degrees), replaces(muscle, fat)),
  shape(oval([a - 2, b - 2], [x, y], degrees), replaces(stomachFluid, muscle, 0.7)),
]);

/** Crura of the diaphragm on either side of the aorta. */
const crura: readonly MaterialShape[] = [
  shape(oval([2.6, 7.5], [-6.3, 18.6], 6), replaces(muscle, fat)),
  shape(oval([2.4, 7], [20.2, 18.6], -6), replaces(muscle, fat)),
];

const vessels: readonly MaterialShape[] = [
  shape(disc(10, [7, 16]), replaces(muscle, fat)),
  shape(disc(8.6, [7, 16]), replaces(blood, muscle)),
  shape(oval([11, 8], [-21, 18], -12), replaces(blood, fat)),
  shape(disc(3.6, [14, -1]), replaces(blood, fat)),
  shape(oval([2.6, 1.9], [62, 14]), replaces(blood, fat)),
];

/** A vessel through points given as x, y, x, y …, from one half width to another. */
function vessel(from: number, to: number, [x = 0, y = 0, ...further]: readonly number[]): MaterialShape['outline'] {
  const rest = Array.from({ length: further.length / 2 }, (_, i): Pair => [further[2 * i] ?? 0, further[2 * i + 1] ?? 0]);
  return taper([[x, y], ...rest], from, to);
}

/** Branches of the portal vein from the hilum, and veins of the liver; each begins beside its parent, so that none overlaps. */
const liverVessels: readonly MaterialShape[] = [
  vessel(3.4, 2.8, [-46, -27, -54, -30, -63, -31]),
  vessel(2.3, 0.9, [-67.5, -34.5, -77, -45, -88, -50]),
  vessel(2.4, 0.8, [-69, -28.5, -82, -24, -97, -25, -109, -20]),
  vessel(2.4, 0.9, [-38, -31, -30, -43, -15, -55, 3, -63]),
  vessel(2.7, 0.9, [-62, 1, -78, -6, -98, -6, -115, -11]),
  vessel(2, 0.8, [-92, 2.5, -104, 11, -112, 24, -116, 37]),
  vessel(2.1, 0.9, [-57, -45, -64, -57, -66, -69]),
  vessel(1.8, 0.9, [-40, -52, -42, -63, -39, -73]),
  disc(1.5, [-101, -38]),
  disc(1.2, [-91, -36]),
  disc(1.4, [-121, 4]),
  disc(1.3, [-19, -69]),
  disc(1.5, [-80, -15]),
  disc(1.2, [-83, 1.5]),
].map((outline) => shape(outline, replaces(blood, liver)));

/** Faint blotches of the liver, a part in fifty. */
function texture(): MaterialShape[] {
  const random = randomOf(11, 'abdomen');
  return Array.from({ length: 90 }, () => {
    const turn = 2 * Math.PI * random.uniform();
    const radius = 38 * Math.sqrt(random.uniform());
    const outline = oval(
      [1.5 + 4 * random.uniform(), 1.5 + 4 * random.uniform()],
      [-88 + radius * Math.cos(turn), -18 + 1.2 * radius * Math.sin(turn)],
    );
    return shape(outline, [[liver, 0.02 * random.normal()]]);
  });
}

/** 340 mm wide and 229 mm deep. */
export const abdomenPhantom: Phantom = {
  id: 'abdomen',
  title: 'Abdomen',
  fieldOfView: 0.38,
  shapes: [
    ...wall,
    ...ribs,
    ...spine,
    ...organs,
    ...stomach,
    ...bowel,
    ...kidneys,
    ...crura,
    ...vessels,
    gallBladder,
    ...liverVessels,
    ...texture(),
  ],
};
