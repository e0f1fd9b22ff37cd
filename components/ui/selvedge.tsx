/** The woven edge of a picture that is not a measurement: stitched on both sides, its words run along the right edge. */
import { fonts } from './theme';
import { useTheme } from './theme-context';

interface SelvedgeProps {
  height: number;
  kind?: 'SIMULATED' | 'CORRECTED' | 'REMOVED';
}

export const selvedgeWidth = 18;

/** As much of the sentence as the edge can hold at 11 pixels (6.6 a letter). */
export function selvedgeWords(kind: string, height: number): string {
  const whole = `${kind} · NOT FOR DIAGNOSIS`;
  return whole.length * 6.6 + 8 <= height ? whole : kind;
}

export function Selvedge({ height, kind = 'SIMULATED' }: SelvedgeProps) {
  const { colours } = useTheme();
  return (
    <svg
      width={selvedgeWidth}
      height={height}
      viewBox={`0 0 ${selvedgeWidth} ${height}`}
      shapeRendering="crispEdges"
      role="img"
      aria-label={`${kind} · NOT FOR DIAGNOSIS`}
      style={{ display: 'block', flex: 'none' }}
    >
      <rect width={selvedgeWidth} height={height} fill={colours.matRaised} />
      <path d={`M.5 0V${height}M17.5 0V${height}`} stroke={colours.matInk} strokeDasharray="6 4" />
      <text
        transform={`translate(13 ${height / 2}) rotate(-90)`}
        textAnchor="middle"
        fill={colours.matInk}
        fontFamily={fonts.monoSemiBold}
        fontSize={11}
      >
        {selvedgeWords(kind, height)}
      </text>
    </svg>
  );
}
