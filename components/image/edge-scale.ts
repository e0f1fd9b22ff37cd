/**
 * What stands along an edge of a picture: millimetres beside an image; beside k-space lines along the phase encoding and cycles per
 * metre along the readout. Where the phase-encode axis is not known, the edges say x and y and promise nothing.
 */
import type { PhaseEncode } from './cursor';
import type { PlaneGrid } from './display-plane';
import type { Region } from './region';
import { binaryStep, decimalStep, type EdgeScale, type TickStep } from './ticks';

export type Domain = 'image' | 'kspace';
export type Axis = 'rows' | 'columns';

export interface Edge {
  readonly scale: EdgeScale;
  readonly step: TickStep;
  readonly words: string;
  readonly isPhaseEncode: boolean;
  /** First visible line and how many are visible, for the rungs. */
  readonly firstLine: number;
  readonly nVisible: number;
}

const numberGap = { decimal: 56, binary: 44 } as const;

interface Placed {
  readonly domain: Domain;
  readonly axis: Axis;
  /** Millimetres for an image, cycles per metre for k-space. */
  readonly grid: PlaneGrid;
  readonly region: Region;
  readonly phaseEncode: PhaseEncode | null;
  /** Length of the edge, pixels. */
  readonly length: number;
}

const phaseEncodeAxisOf = (phaseEncode: PhaseEncode): Axis => (phaseEncode === 'column' ? 'rows' : 'columns');

function wordsOf(domain: Domain, axis: Axis, role: 'phase' | 'readout' | 'unknown'): string {
  const unit = domain === 'image' ? 'mm' : '1/m';
  if (role === 'unknown') return `${domain === 'kspace' ? 'k' : ''}${axis === 'rows' ? 'y' : 'x'} ${unit}`;
  if (role === 'readout') return `readout ${unit}`;
  return domain === 'image' ? 'phase encode mm' : 'phase-encode line';
}

/** The scale of one edge. Its ends are the outer edges of the first and the last visible sample. */
export function edgeOf({ domain, axis, grid, region, phaseEncode, length }: Placed): Edge {
  const i = axis === 'rows' ? 0 : 1;
  const n = axis === 'rows' ? grid.rows : grid.columns;
  const firstLine = axis === 'rows' ? region.top : region.left;
  const nVisible = axis === 'rows' ? region.rows : region.columns;
  const isPhaseEncode = phaseEncode !== null && phaseEncodeAxisOf(phaseEncode) === axis;
  const valueAtEdge = (index: number): number => {
    const asLine = domain === 'kspace' && isPhaseEncode;
    return asLine ? index - 0.5 - Math.floor(n / 2) : grid.origin[i] + (index - 0.5) * grid.spacing[i];
  };
  const scale = { first: valueAtEdge(firstLine), last: valueAtEdge(firstLine + nVisible), length };
  const span = scale.last - scale.first;
  const inLines = domain === 'kspace' && isPhaseEncode;
  return {
    scale,
    step: inLines ? binaryStep(span, length, numberGap.binary) : decimalStep(span, length, numberGap.decimal),
    words: wordsOf(domain, axis, phaseEncode === null ? 'unknown' : isPhaseEncode ? 'phase' : 'readout'),
    isPhaseEncode,
    firstLine,
    nVisible,
  };
}
