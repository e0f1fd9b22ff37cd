/** The drawing of a slider: ticks, the indigo thread from the starting value to the thumb, the thumb as an aperture. */
import { memo } from 'react';
import { useTheme } from './theme-context';

export const thumbSide = 18;
const nTicks = 20;
const middle = 9.5;

/** Ticks of the thread as path data on a width of `length` pixels; every fifth is long. */
export function threadTicks(length: number): string {
  return Array.from({ length: nTicks + 1 }, (_, i) => {
    const half = i % 5 === 0 ? 4 : 2;
    return `M${Math.floor((i / nTicks) * (length - 1)) + 0.5} ${middle - half}V${middle + half}`;
  }).join('');
}

interface SliderThreadProps {
  length: number;
  /** Fractions of the length. */
  from: number;
  at: number;
  focused: boolean;
  disabled: boolean;
}

export const SliderThread = memo(function SliderThread({ length, from, at, focused, disabled }: SliderThreadProps) {
  const { colours } = useTheme();
  const indigo = disabled ? colours.ruleStrong : colours.indigo;
  const [start, thumb] = [from * length, at * length];
  const left = thumb - thumbSide / 2;
  return (
    <svg width={length} height={24} viewBox={`0 0 ${length} 24`} aria-hidden style={{ display: 'block', overflow: 'visible' }}>
      <path d={`M0 ${middle}H${length}`} stroke={colours.ruleStrong} strokeDasharray={disabled ? '4 3' : undefined} />
      <path d={threadTicks(length)} stroke={colours.ruleStrong} shapeRendering="crispEdges" />
      <path d={`M${start} ${middle}H${thumb}`} stroke={indigo} strokeWidth={3} />
      <path d={`M${start} ${middle - 7}V${middle + 7}`} stroke={indigo} strokeWidth={1.5} />
      {focused ? (
        <rect x={left - 4} y={-3.5} width={thumbSide + 8} height={thumbSide + 8} fill="none" stroke={indigo} strokeWidth={2} />
      ) : null}
      <rect x={left} y={0.5} width={thumbSide} height={thumbSide} fill={colours.cloth} stroke={indigo} strokeWidth={2} />
      <path d={`M${thumb} 5V14`} stroke={indigo} strokeWidth={1.5} />
    </svg>
  );
});
