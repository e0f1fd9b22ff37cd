/**
 * The phase-encode edge of a picture: two rails with arrow heads and a rung for every 8 lines. Lying below the picture where
 * phase is encoded left and right, standing at its left where it is encoded up and down; the word lies along it.
 */
import { fonts } from './theme';
import { useTheme } from './theme-context';

interface LadderProps {
  /** Length of the edge, pixels. */
  length: number;
  /** Lines of k-space along it. */
  lines: number;
  upright?: boolean;
  word?: string;
}

export const ladderThickness = 30;

/** Rungs no closer than 4 pixels, so that they never run into a grey band. */
export function rungsOf(length: number, lines: number): string {
  const inner = length - 16;
  const n = Math.max(1, Math.min(Math.round(lines / 8), Math.floor(inner / 4)));
  return Array.from({ length: n + 1 }, (_, rung) => `M${Math.round(8 + (rung * inner) / n) + 0.5} 5V12`).join('');
}

export function Ladder({ length, lines, upright = false, word = 'phase encode' }: LadderProps) {
  const { colours } = useTheme();
  const box = upright ? { width: ladderThickness, height: length } : { width: length, height: ladderThickness };
  // Upright is the lying ladder turned a quarter to the left, with its rails next to the picture.
  const turn = upright ? `translate(${ladderThickness} 0) rotate(90)` : undefined;
  return (
    <svg
      {...box}
      viewBox={`0 0 ${box.width} ${box.height}`}
      shapeRendering="crispEdges"
      role="img"
      aria-label={`phase encoding ${upright ? 'up and down' : 'left and right'}`}
      style={{ display: 'block', flex: 'none' }}
    >
      <g transform={turn}>
        <path d={rungsOf(length, lines)} stroke={colours.matInkSoft} fill="none" />
        <path d={`M8 4.5H${length - 8}M8 12.5H${length - 8}`} stroke={colours.matInk} />
        <path d={`M0 8.5L8 3V14ZM${length} 8.5L${length - 8} 3V14Z`} fill={colours.matInk} shapeRendering="auto" />
        <text
          x={length / 2}
          y={26}
          textAnchor="middle"
          fill={colours.matInk}
          fontFamily={fonts.mono}
          fontSize={11}
          transform={upright ? `rotate(180 ${length / 2} 22)` : undefined}
        >
          {word}
        </text>
      </g>
    </svg>
  );
}
