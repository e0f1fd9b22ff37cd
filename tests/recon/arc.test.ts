/** A strip along an arc: distances and directions against places worked out on the circle. */
import { alongArc } from '../../recon/arc';

const arc = { middle: [0.01, -0.02], length: 0.06, thickness: 0.008, direction: 0.4 } as const;

test('Along a straight strip the direction is its own, and distances are those of a rectangle', () => {
  const straight = { ...arc, turn: 0 };
  const at = (forwards: number, sideways: number) =>
    alongArc(straight, [
      0.01 + forwards * Math.cos(0.4) - sideways * Math.sin(0.4),
      -0.02 + forwards * Math.sin(0.4) + sideways * Math.cos(0.4),
    ]);
  expect(at(0, 0).distance).toBeCloseTo(-0.004, 12);
  expect(at(0.02, 0.004).distance).toBeCloseTo(0, 12);
  expect(at(-0.02, -0.006).distance).toBeCloseTo(0.002, 12);
  expect(at(0.035, 0).distance).toBeCloseTo(0.005, 12);
  expect(at(-0.02, 0.001).direction).toBeCloseTo(0.4, 12);
});

test('Along an arc the direction turns evenly, and distances are from its circle', () => {
  const turn = Math.PI / 2;
  const radius = arc.length / turn;
  // The centre of the circle lies a radius to the side towards which it turns.
  const centre = [0.01 - radius * Math.sin(0.4), -0.02 + radius * Math.cos(0.4)] as const;
  for (const part of [-0.45, -0.2, 0, 0.3, 0.5]) {
    for (const off of [-0.003, 0, 0.002]) {
      const angle = 0.4 + part * turn;
      const place = [centre[0] + (radius + off) * Math.sin(angle), centre[1] - (radius + off) * Math.cos(angle)] as const;
      const { distance, direction } = alongArc({ ...arc, turn }, place);
      expect(direction).toBeCloseTo(angle, 11);
      // Within the strip by what is left of its half thickness, but for its end.
      expect(distance).toBeCloseTo(part === 0.5 ? 0 : Math.max(Math.abs(off) - 0.004, (Math.abs(part) - 0.5) * arc.length), 11);
    }
  }
});

test('A slight turn is nearly straight', () => {
  const place = [0.03, -0.01] as const;
  const [bent, straight] = [alongArc({ ...arc, turn: 1e-4 }, place), alongArc({ ...arc, turn: 0 }, place)];
  // A sagitta of length·turn/8 is 7.5e-7 m.
  expect(Math.abs(bent.distance - straight.distance)).toBeLessThan(1e-6);
  expect(Math.abs(bent.direction - straight.direction)).toBeLessThan(1e-4);
});
