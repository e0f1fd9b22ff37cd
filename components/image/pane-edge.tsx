/**
 * An edge of a picture. The phase-encode edge is a ladder (two rails, arrow heads, a rung for every eight lines), any other a plain
 * ruler. The coordinate of the cursor runs out to it as a weld tick. Left of the picture or below it.
 */
import { memo } from 'react';
import { useTheme } from '@/components/ui/theme-context';
import { characterWidth, EdgeNumbers, widestNumber } from './edge-numbers';
import type { Edge } from './edge-scale';
import { numbered, rungsOf, ticksOf, type Tick } from './ticks';

export type EdgeSide = 'left' | 'bottom';

/** Thickness of an edge: a ladder takes a little more than a ruler, above all at the left. */
export const edgeThickness = (side: EdgeSide, isLadder: boolean): number => (side === 'left' ? (isLadder ? 44 : 40) : isLadder ? 34 : 30);

const headLength = 8;
const at = (position: number): number => Math.floor(position) + 0.5;

function ladderPaths(side: EdgeSide, rungs: readonly number[], length: number) {
  const end = length - headLength;
  if (side === 'left') {
    return {
      rungs: rungs.map((rung) => `M34 ${at(rung)}H41`).join(''),
      rails: `M33.5 ${headLength}V${end}M41.5 ${headLength}V${end}`,
      heads: `M37.5 0L32 ${headLength}H43ZM37.5 ${length}L32 ${end}H43Z`,
    };
  }
  return {
    rungs: rungs.map((rung) => `M${at(rung)} 5V12`).join(''),
    rails: `M${headLength} 4.5H${end}M${headLength} 12.5H${end}`,
    heads: `M0 8.5L${headLength} 3V14ZM${length} 8.5L${end} 3V14Z`,
  };
}

function rulerPath(side: EdgeSide, ticks: readonly Tick[]): string {
  const tick = (position: number, isMajor: boolean) =>
    side === 'left' ? `M${isMajor ? 31 : 35} ${at(position)}H40` : `M${at(position)} 0V${isMajor ? 9 : 5}`;
  return ticks.map((each) => tick(each.at, each.isMajor)).join('');
}

const cursorPath = (side: EdgeSide, isLadder: boolean, position: number): string =>
  side === 'left' ? `M${isLadder ? 30 : 28} ${at(position)}H${isLadder ? 44 : 40}` : `M${at(position)} 0V${isLadder ? 14 : 12}`;

interface PaneEdgeProps {
  side: EdgeSide;
  edge: Edge;
  /** Where the cursor is along this edge, pixels; null where it is not on the table. */
  cursorAt: number | null;
}

export const PaneEdge = memo(function PaneEdge({ side, edge, cursorAt }: PaneEdgeProps) {
  const { colours } = useTheme();
  const { length } = edge.scale;
  const thickness = edgeThickness(side, edge.isPhaseEncode);
  const box = side === 'left' ? { width: thickness, height: length } : { width: length, height: thickness };
  const ticks = ticksOf(edge.scale, edge.step);
  const withNumbers = numbered(ticks, length, edge.words.length * characterWidth, side === 'left' ? 14 : widestNumber(ticks));
  const ladder = edge.isPhaseEncode ? ladderPaths(side, rungsOf(edge.firstLine, edge.nVisible, length, headLength), length) : null;
  const spoken = `${edge.words}${edge.isPhaseEncode ? `, ${side === 'left' ? 'up and down' : 'left and right'}` : ''}`;
  return (
    <svg
      {...box}
      viewBox={`0 0 ${box.width} ${box.height}`}
      shapeRendering="crispEdges"
      role="img"
      aria-label={spoken}
      style={{ display: 'block', flex: 'none' }}
    >
      {ladder ? (
        <>
          <path d={ladder.rungs} stroke={colours.matInkSoft} fill="none" />
          <path d={ladder.rails} stroke={colours.matInk} />
          <path d={ladder.heads} fill={colours.matInk} shapeRendering="auto" />
        </>
      ) : (
        <path d={rulerPath(side, ticks)} stroke={colours.matInkSoft} />
      )}
      <EdgeNumbers
        side={side}
        ticks={withNumbers}
        words={edge.words}
        length={length}
        numbersAt={side === 'left' ? thickness - 13 : thickness - 7}
        wordsAt={side === 'left' ? thickness - 20 : thickness - 7}
      />
      {cursorAt === null ? null : (
        <>
          {ladder ? <path d={cursorPath(side, true, cursorAt)} stroke={colours.mat} strokeWidth={5} /> : null}
          <path d={cursorPath(side, edge.isPhaseEncode, cursorAt)} stroke={colours.weldThread} strokeWidth={2} />
        </>
      )}
    </svg>
  );
});
