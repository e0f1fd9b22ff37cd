/** What stands at the cursor, in words and numbers: row, column and millimetres of the image; line, sample and k of its k-space. */
import type { Simulation } from '@/components/api/simulations';
import { kspacePosition, positionMm, type Cursor, type PhaseEncode } from '@/components/image/cursor';
import { valueNear, type DisplayPlane, type PlaneGrid } from '@/components/image/display-plane';
import { kspaceGrid } from '@/components/image/kspace-grid';
import { fixed, significant } from '@/components/ui/number-text';

export interface ReadoutItem {
  readonly label: string;
  readonly value: string;
  readonly unit: string;
  /** The first items of a readout: they name the place, the others say what is there. */
  readonly isPlace?: boolean;
}

const dash = '–';
const item = (label: string, value: string, unit = ''): ReadoutItem => ({ label, value, unit });
const place = (label: string, value: number): ReadoutItem => ({ label, value: fixed(value, 0), unit: '', isPlace: true });
const read = (plane: DisplayPlane | undefined, y: number, x: number): number | null => (plane ? valueNear(plane, y, x) : null);
const words = (value: number | null, write: (value: number) => string): string => (value === null ? dash : write(value));

interface Planes {
  readonly bad: ReadonlyMap<string, DisplayPlane> | undefined;
  readonly simulation: Simulation | null;
}

/** Values are those of the bad image; the simulated one is multiplied by the gain under which the two were compared. */
export function imageReadout(cursor: Cursor, frame: PlaneGrid, { bad, simulation }: Planes): ReadoutItem[] {
  const { x, y } = positionMm(cursor, frame);
  const simulated = read(simulation?.planes.get('image'), y, x);
  const gain = simulation?.metrics?.gain ?? 1;
  return [
    place('row', cursor.row),
    place('column', cursor.column),
    item('x', fixed(x, 1), 'mm'),
    item('y', fixed(y, 1), 'mm'),
    item('bad', words(read(bad?.get('image'), y, x), significant)),
    item('simulated', words(simulated === null ? null : simulated * gain, significant)),
  ];
}

const degrees = (radians: number): string => fixed((radians * 180) / Math.PI, 0);

const axisNames = {
  known: { line: 'line', sample: 'sample', kLine: 'k pe', kSample: 'k ro' },
  unknown: { line: 'row', sample: 'column', kLine: 'ky', kSample: 'kx' },
} as const;

/** Line and sample where the phase-encode axis is known; row and column, which promise nothing, where it is not. */
function kspacePlace(cursor: Cursor, frame: PlaneGrid, phaseEncode: PhaseEncode | null): ReadoutItem[] {
  const names = phaseEncode === null ? axisNames.unknown : axisNames.known;
  // With `column` lines are counted along the rows.
  const { line, sample, kPhaseEncode, kReadout } = kspacePosition(cursor, frame, phaseEncode ?? 'column');
  return [
    place(names.line, line),
    place(names.sample, sample),
    item(names.kLine, fixed(kPhaseEncode, 0), '1/m'),
    item(names.kSample, fixed(kReadout, 0), '1/m'),
  ];
}

/** `name`: which k-space is on the table. Of the bad image it is given only where there is such a one: not of a magnitude as acquired. */
export function kspaceReadout(
  cursor: Cursor,
  frame: PlaneGrid,
  phaseEncode: PhaseEncode | null,
  { bad, simulation }: Planes,
  name: string,
): ReadoutItem[] {
  const { x, y } = positionMm(cursor, kspaceGrid(frame));
  const at = (planes: ReadonlyMap<string, DisplayPlane> | undefined, key: string): number | null => read(planes?.get(key), y, x);
  const isTaken = (log: number | null): boolean => log !== null && log > -8;
  const log = bad ? at(bad, 'kspace.log') : at(simulation?.planes, `${name}.log`);
  const phase = isTaken(log) ? (bad ? at(bad, 'kspace.phase') : at(simulation?.planes, `${name}.phase`)) : null;
  return [
    ...kspacePlace(cursor, frame, phaseEncode),
    item(
      'log K',
      words(isTaken(log) ? log : null, (value) => fixed(value, 2)),
    ),
    item('phase', words(phase, degrees), '°'),
  ];
}
