/**
 * What the scan facts imply, worked out for the facts panel: the relations of `encoding.ts` in the units of the console (mT/m, Hz/mm,
 * ms, px), each with its formula and, where a fact is missing, what would be needed.
 */
import type { Acquisition, PhaseEncode } from './acquisition';
import { phaseEncodeAxis } from './acquisition';
import { fatShiftPixels, ghostPosition, hertzPerMetre, readoutGradient, readoutTime } from './encoding';
import type { Grid } from './grid';

/** One line of the panel; `value` is null where a fact is missing, which `because` names. */
export interface Implication {
  id: string;
  label: string;
  value: number | null;
  unit: string;
  formula: string;
  because?: string;
}

type Named = Pick<Implication, 'id' | 'label' | 'unit' | 'formula'>;

interface Fact {
  readonly name: string;
  readonly value: number | undefined;
}

/** The value of a relation of `facts`, or null and the facts that it lacks. */
function worked(named: Named, facts: readonly Fact[], relation: (...values: number[]) => number): Implication {
  const values = facts.map(({ value }) => value).filter((value) => value !== undefined && value > 0) as number[];
  if (values.length === facts.length) return { ...named, value: relation(...values) };
  const missing = facts.filter(({ value }) => value === undefined || !(value > 0)).map(({ name }) => name);
  return { ...named, value: null, because: `needs ${missing.join(' and ')}` };
}

/** Size of the image; its spacing in metres is left out where the header is silent. */
type ImageGrid = Pick<Grid, 'rows' | 'columns'> & { readonly spacing?: Grid['spacing'] | undefined };

type AxisMayBeUnknown = Omit<Acquisition, 'phaseEncode'> & { readonly phaseEncode?: PhaseEncode | undefined };

/** Lines along the phase encoding, and metres of a pixel along the readout; undefined where they hang on an axis not known. */
function alongAxes(
  phaseEncode: PhaseEncode | undefined,
  size: readonly [number, number],
  spacing: Grid['spacing'] | undefined,
): [nLines: number | undefined, pixelSize: number | undefined] {
  const phaseAxis = phaseEncode && phaseEncodeAxis(phaseEncode);
  const pick = (pair: readonly [number, number], axis: 0 | 1 | undefined): number | undefined => {
    if (axis !== undefined) return pair[axis];
    return pair[0] === pair[1] ? pair[0] : undefined;
  };
  const readoutAxis = phaseAxis === undefined ? undefined : phaseAxis === 0 ? 1 : 0;
  return [pick(size, phaseAxis), spacing && pick(spacing, readoutAxis)];
}

function readoutImplications({ bandwidthPerPixel, imagingFrequency }: AxisMayBeUnknown, pixelSize: number | undefined): Implication[] {
  const bandwidth = { name: 'the bandwidth per pixel', value: bandwidthPerPixel };
  const spacing = { name: 'the pixel spacing along the readout', value: pixelSize };
  const frequency = { name: 'the imaging frequency', value: imagingFrequency };
  return [
    worked(
      { id: 'readout-gradient', label: 'Readout gradient', unit: 'mT/m', formula: 'G = BW / (γ̄ · Δx)' },
      [bandwidth, spacing],
      (BW, dx) => 1e3 * readoutGradient(BW, dx),
    ),
    worked(
      { id: 'hertz-per-millimetre', label: 'Along the readout', unit: 'Hz/mm', formula: 'BW / Δx' },
      [bandwidth, spacing],
      (BW, dx) => 1e-3 * hertzPerMetre(BW, dx),
    ),
    worked(
      { id: 'readout-time', label: 'Readout time of a line', unit: 'ms', formula: '1 / BW' },
      [bandwidth],
      (BW) => 1e3 * readoutTime(BW),
    ),
    worked(
      { id: 'fat-shift', label: 'Fat shift along the readout', unit: 'px', formula: '3.5 ppm · f0 / BW' },
      [frequency, bandwidth],
      (f0, BW) => fatShiftPixels(f0, BW),
    ),
  ];
}

function ghostImplications(
  { repetitionTime, averages }: AxisMayBeUnknown,
  nLines: number | undefined,
  ghostFrequency: number | undefined,
): Implication[] {
  const facts = [
    { name: 'TR', value: repetitionTime },
    { name: 'the frequency of the motion', value: ghostFrequency },
  ];
  const assumed = averages === undefined ? { because: 'one average assumed: the header is silent' } : {};
  const position = (TR: number, f: number): number => ghostPosition(TR, averages ?? 1, f);
  const named = { label: 'First ghost', formula: 'frac(TR · averages · f)' };
  return [
    worked({ ...named, id: 'ghost-fraction', unit: 'of phase FOV' }, facts, position),
    worked(
      { ...named, id: 'ghost-pixels', unit: 'px', formula: `N · ${named.formula}` },
      [...facts, { name: 'the phase-encode axis', value: nLines }],
      (TR, f, N) => N * position(TR, f),
    ),
  ].map((implication) => (implication.value === null ? implication : { ...implication, ...assumed }));
}

/** `ghostFrequency` in hertz: the motion whose ghost is looked for. Without a phase-encode axis nothing along an axis is worked out,
 *  unless the image is the same along both. */
export function implications(acquisition: AxisMayBeUnknown, grid: ImageGrid, ghostFrequency?: number): Implication[] {
  const { rows, columns, spacing } = grid;
  const [nLines, pixelSize] = alongAxes(acquisition.phaseEncode, [rows, columns], spacing);
  return [
    ...readoutImplications(acquisition, pixelSize),
    ...ghostImplications(acquisition, nLines, ghostFrequency),
    worked(
      { id: 'echo-trains', label: 'Echo trains for one image', unit: '', formula: 'lines acquired / echo train length' },
      [
        { name: 'the lines acquired', value: acquisition.acquiredPhase },
        { name: 'the echo train length', value: acquisition.echoTrainLength },
      ],
      (lines, echoes) => Math.ceil(lines / echoes),
    ),
  ];
}
