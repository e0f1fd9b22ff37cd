/**
 * Vials in a round bath, our own: an inner ring of six that differ in fat, an outer ring of twelve, half a ladder of T1 at one
 * T2 and half a ladder of T2 at one T1. The values are chosen, evenly spaced in their logarithm, and the same at both fields.
 */
import type { Material } from './material';
import { material } from './material';
import { disc } from './outline';
import type { MaterialShape, Phantom } from './phantom';
import { replaces } from './phantom';

const source = 'chosen';

/** Water with a little salt of a metal; dark enough beside the vials in most sequences. */
const bath = material('Bath', { protonDensity: 0.55, t1Ms: [500, 500], t2Ms: [400, 400], source });
const glass = material('Glass', { protonDensity: 0, t1Ms: [1000, 1000], t2Ms: [1, 1], source });

const t1Ladder = [200, 340, 570, 960, 1620, 2740].map((t1) =>
  material(`T1 ${t1} ms`, { protonDensity: 1, t1Ms: [t1, t1], t2Ms: [90, 90], source }),
);
const t2Ladder = [25, 45, 80, 145, 260, 470].map((t2) =>
  material(`T2 ${t2} ms`, { protonDensity: 1, t1Ms: [1100, 1100], t2Ms: [t2, t2], source }),
);
const fatLadder = [0, 0.1, 0.2, 0.35, 0.5, 1].map((fatFraction) =>
  material(`Fat ${Math.round(100 * fatFraction)} %`, { protonDensity: 1, fatFraction, t1Ms: [350, 350], t2Ms: [70, 70], source }),
);

/** Millimetres. */
const wall = 1.2;

function vial(content: Material, radius: number, centre: readonly [number, number]): MaterialShape[] {
  return [
    { outline: disc(radius + wall, centre), adds: replaces(glass, bath) },
    { outline: disc(radius, centre), adds: replaces(content, glass) },
  ];
}

/** Evenly about the centre, the first at the top and on clockwise. */
function ring(contents: readonly Material[], distance: number, radius: number): MaterialShape[] {
  return contents.flatMap((content, i) => {
    const turn = (2 * Math.PI * i) / contents.length - Math.PI / 2;
    return vial(content, radius, [distance * Math.cos(turn), distance * Math.sin(turn)]);
  });
}

/** 200 mm across. */
export const vialPhantom: Phantom = {
  id: 'vials',
  title: 'Vial',
  fieldOfView: 0.24,
  shapes: [
    { outline: disc(100, [0, 0]), adds: [[glass, 1]] },
    { outline: disc(97, [0, 0]), adds: replaces(bath, glass) },
    ...ring([...t1Ladder, ...t2Ladder], 76, 14),
    ...ring(fatLadder, 36, 12),
    // One small vial off the ring, so that no turn or mirror image of the picture is like the picture.
    ...vial(glass, 3, [0, 54.5]),
  ],
};
