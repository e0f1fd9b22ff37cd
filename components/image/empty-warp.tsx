/** A picture that is not there yet: the warp before the weft. Still; nothing shimmers. */
import { useTheme } from '@/components/ui/theme-context';

interface EmptyWarpProps {
  width: number;
  height: number;
}

const threadGap = 12;

export function EmptyWarp({ width, height }: EmptyWarpProps) {
  const { colours } = useTheme();
  const threads = Array.from({ length: Math.floor(width / threadGap) }, (_, i) => `M${(i + 0.5) * threadGap} 0V${height}`).join('');
  return (
    <svg
      width={width}
      height={height}
      role="img"
      aria-label="not there yet"
      shapeRendering="crispEdges"
      style={{ position: 'absolute', left: 0, top: 0, background: colours.mat }}
    >
      <path d={threads} stroke={colours.matRule} strokeDasharray="4 3" />
    </svg>
  );
}
