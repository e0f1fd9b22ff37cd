/** What is on the table and how: compare mode, windows, cursor, zoom. Nothing of it is stored; it belongs to the hand, not to the case. */
import type { Cursor } from '@/components/image/cursor';
import type { PlaneGrid } from '@/components/image/display-plane';
import type { Domain } from '@/components/image/edge-scale';
import type { MarkKind } from '@/components/image/overlay-strokes';
import { wholeRegion, type Region } from '@/components/image/region';
import { windowOfRange, type Window } from '@/components/image/window-level';

export type Compare = 'side-by-side' | 'divider' | 'blink' | 'difference';
export type KspaceLook = 'log' | 'phase';
/** `image`: the transform of the magnitude that is shown. `acquired`: samples before reconstruction, phase
 *  included; a simulation has them, and a complex image, but no magnitude. */
export type KspaceOf = 'image' | 'acquired';
/** The object, a step by its index in the recipe, or the reconstruction. */
export type Knot = 'object' | 'reconstruction' | number;
export type EyeTab = 'recipe' | 'numbers' | 'marks' | 'facts';

/** Frames of the two images that lie on the table, counted from 0. */
export interface ChosenFrames {
  readonly badFrame: number;
  readonly sourceFrame: number;
}

export interface BenchView extends ChosenFrames {
  readonly compare: Compare;
  /** Fraction of the picture's width, from the left: bad before it, simulated behind it. */
  readonly divider: number;
  readonly kspaceLook: KspaceLook;
  readonly kspaceOf: KspaceOf;
  readonly imageWindow: Window;
  readonly logWindow: Window;
  /** Difference shown in full colour: in values of the bad image, and in decades of k-space. */
  readonly differenceSpan: number;
  readonly logDifferenceSpan: number;
  readonly cursor: Cursor;
  readonly regions: Readonly<Record<Domain, Region>>;
  /** What a pane shows where there is room for one domain only. */
  readonly domain: Domain;
  readonly phonePanes: Domain | 'both';
  readonly tool: MarkKind | null;
  /** Words for the mark that is drawn next. */
  readonly markText: string;
  readonly knot: Knot;
  readonly tab: EyeTab;
}

/** log10 of the magnitude over its maximum: wide enough that the noise of a usual image is dark grey and the centre is not white all over. */
const logRange = [-4, -0.3] as const;

export function startView(frame: PlaneGrid, range: readonly [number, number], knot: Knot, frames: ChosenFrames): BenchView {
  const imageWindow = windowOfRange(range[0], range[1]);
  return {
    ...frames,
    compare: 'divider',
    divider: 0.5,
    kspaceLook: 'log',
    kspaceOf: 'image',
    imageWindow,
    logWindow: windowOfRange(...logRange),
    differenceSpan: imageWindow.width / 4,
    logDifferenceSpan: 1,
    cursor: { row: Math.floor(frame.rows / 2), column: Math.floor(frame.columns / 2) },
    regions: { image: wholeRegion(frame), kspace: wholeRegion(frame) },
    domain: 'image',
    phonePanes: 'image',
    tool: null,
    markText: '',
    knot,
    tab: 'recipe',
  };
}
